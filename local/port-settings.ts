import { Failure, portInUseSentence } from '../scripts/sentences.mjs';
import { portIsFree } from './ports.ts';
import type { Ports } from './stand-ins.ts';

const settings: Record<keyof Ports, { variable: string; standard: number; what: string }> = {
  web: { variable: 'PORT', standard: 3000, what: 'Witnessmark' },
  mailPage: { variable: 'MAIL_PAGE_PORT', standard: 3001, what: 'The mail page' },
  identity: { variable: 'IDENTITY_PORT', standard: 3002, what: 'The identity provider' },
  store: { variable: 'STORE_PORT', standard: 3003, what: 'The object store' },
  smtp: { variable: 'SMTP_PORT', standard: 3004, what: 'The mail catcher' },
  database: { variable: 'DATABASE_PORT', standard: 3005, what: 'The database' },
};

/**
 * The ports to use, each from its variable or by default.
 * Throws a sentence that names the variable when one is no port number, chosen twice, or taken.
 */
export async function choosePorts(env: Record<string, string | undefined>): Promise<Ports> {
  const chosen = new Map<number, string>();
  const ports = {} as Ports;
  for (const [name, { variable, standard, what }] of Object.entries(settings)) {
    const port = Number(env[variable] ?? standard);
    if (!Number.isInteger(port) || port < 1024 || port > 65_535)
      throw new Failure(`${variable} must be a port number from 1024 to 65535.`);
    const other = chosen.get(port);
    if (other) throw new Failure(`${variable} and ${other} are both ${port}. Choose two ports.`);
    if (!(await portIsFree(port))) throw new Failure(portInUseSentence(port, what, variable));
    chosen.set(port, variable);
    ports[name as keyof Ports] = port;
  }
  return ports;
}
