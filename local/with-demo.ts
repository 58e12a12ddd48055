import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';

/**
 * Runs a command of the server, `node --import tsx local/with-demo.ts server/….ts`, with the settings
 * of the demo that `npm start` runs; settings that are in the environment already come first.
 */
const settings = join(process.env.DATA_DIR ?? '.data', 'environment.json');
const command = resolve(process.argv[2] ?? '');

if (process.env.DATABASE_URL === undefined && !existsSync(settings)) {
  console.error('There is no demo here and DATABASE_URL is not set. Run npm start first.');
  process.exit(1);
}
const demo = existsSync(settings)
  ? (JSON.parse(readFileSync(settings, 'utf8')) as Record<string, string>)
  : {};
for (const [name, value] of Object.entries(demo)) process.env[name] ??= value;
process.argv.splice(1, 2, command);
await import(pathToFileURL(command).href);
