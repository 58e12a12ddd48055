import type { DemoKeys } from './demo-keys.ts';

/** Where the stand-ins are, as they said when they were ready. */
export interface Services {
  databaseUrl: string;
  storeEndpoint: string;
  bucket: string;
  smtpUrl: string;
  issuer: string;
}

export const clientId = 'witnessmark';
export const callbackPath = '/sign-in/callback';

/** The environment of the server for these stand-ins: the same variables that name real services elsewhere. */
export function serverEnvironment(
  services: Services,
  keys: DemoKeys,
  { port, keysFolder }: { port: number; keysFolder: string },
) {
  return {
    DATABASE_URL: services.databaseUrl,
    S3_ENDPOINT: services.storeEndpoint,
    S3_REGION: 'local',
    S3_BUCKET: services.bucket,
    S3_ACCESS_KEY_ID: keys.storeKeyId,
    S3_SECRET_ACCESS_KEY: keys.storeSecret,
    SMTP_URL: services.smtpUrl,
    MAIL_FROM: 'Wrenfield Instrument Repair <bench@witnessmark.example>',
    OAUTH_ISSUER: services.issuer,
    OAUTH_CLIENT_ID: clientId,
    OAUTH_CLIENT_SECRET: keys.clientSecret,
    PUBLIC_URL: `http://127.0.0.1:${port}`,
    PORT: String(port),
    HOST: '127.0.0.1',
    SESSION_SECRET: keys.sessionSecret,
    CODE_PEPPER: keys.codePepper,
    KEYS_DIR: keysFolder,
    DEMO: '1',
    TRUST_PROXY: '0',
    NODE_ENV: 'production',
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
  };
}
