import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';

/** Secrets of a demo installation: random, made at the first start, good for nothing but this folder. */
export interface DemoKeys {
  databasePassword: string;
  storeKeyId: string;
  storeSecret: string;
  clientSecret: string;
  sessionSecret: string;
  codePepper: string;
}

/** New random keys. */
export function makeDemoKeys(): DemoKeys {
  const secret = () => randomBytes(32).toString('hex');
  return {
    databasePassword: secret(),
    storeKeyId: randomBytes(10).toString('hex').toUpperCase(),
    storeSecret: secret(),
    clientSecret: secret(),
    sessionSecret: secret(),
    codePepper: secret(),
  };
}

/** The keys in this file, readable by its owner alone; made when the file is missing. */
export function keepDemoKeys(path: string): DemoKeys {
  if (!existsSync(path)) {
    writeFileSync(`${path}.making`, `${JSON.stringify(makeDemoKeys(), null, 2)}\n`, {
      mode: 0o600,
    });
    renameSync(`${path}.making`, path);
  }
  return JSON.parse(readFileSync(path, 'utf8')) as DemoKeys;
}
