import { spawn } from 'node:child_process';
import { cp, mkdir, mkdtemp, rm, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';

vi.setConfig({ testTimeout: 120_000 });

// The test command in a project of its own: the real script and the real vitest, with small programs in the place
// of the other tools, whose exit codes are theirs to choose.
const tools = {
  'node_modules/@react-router/dev/bin.js': `
    const { mkdirSync } = await import('node:fs');
    if (process.argv[2] === 'build') mkdirSync('build', { recursive: true });
    process.exitCode = Number(process.env[\`EXIT_\${process.argv[2].toUpperCase()}\`] ?? 0);`,
  'node_modules/typescript/bin/tsc': 'process.exitCode = Number(process.env.EXIT_TSC ?? 0);',
  'node_modules/eslint/bin/eslint.js': 'process.exitCode = Number(process.env.EXIT_LINT ?? 0);',
};

let root = '';

async function write(path: string, text: string) {
  await mkdir(dirname(join(root, path)), { recursive: true });
  await writeFile(join(root, path), text);
}

const test = (name: string, body = '') =>
  `import { expect, it } from 'vitest';\nit('${name}', () => { ${body} });\n`;

beforeEach(async () => {
  root = await mkdtemp(join(tmpdir(), 'witnessmark-test-'));
  await cp('scripts', join(root, 'scripts'), {
    recursive: true,
    filter: (path) => !path.endsWith('.test.ts'),
  });
  await write('package.json', '{ "type": "module" }');
  await write('package-lock.json', '{ "packages": {} }');
  await write('node_modules/.package-lock.json', '{ "packages": {} }');
  for (const [path, code] of Object.entries(tools)) await write(path, code);
  await symlink(join(process.cwd(), 'node_modules/vitest'), join(root, 'node_modules/vitest'));
  await write(
    'vitest.config.js',
    `export default { test: { projects: ['pure', 'machine', 'services', 'journeys', 'soak'].map(
      (name) => ({ test: { name, include: [name + '/**/*.test.js'] } })) } };`,
  );
  await write('pure/a.test.js', test('adds', 'expect(1 + 1).toBe(2);'));
  await write('services/b.test.js', test('reads') + test('writes'));
  await write('journeys/c.test.js', test('walks'));
  await write('soak/d.test.js', test('lasts'));
});

afterEach(() => rm(root, { recursive: true }));

/** Runs the command; gives its exit code, its last line and all that it printed. */
async function npmTest(env: Record<string, string> = {}, ...args: string[]) {
  const child = spawn(process.execPath, ['scripts/test.mjs', ...args], {
    cwd: root,
    env: { PATH: process.env.PATH, CI: 'true', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  child.stdout.on('data', (chunk) => (output += String(chunk)));
  child.stderr.on('data', (chunk) => (output += String(chunk)));
  const code = await new Promise((resolve) => child.once('close', resolve));
  return { code, last: output.trimEnd().split('\n').at(-1), output };
}

it('counts types, lint, build and every test', async () => {
  expect(await npmTest()).toMatchObject({ code: 0, last: '7 passed, 0 failed' });
});

it('runs the long tests alone when asked to', async () => {
  const { code, last, output } = await npmTest({}, '--soak');
  expect({ code, last }).toEqual({ code: 0, last: '2 passed, 0 failed' });
  expect(output).toContain('soak/d.test.js');
});

it('counts each check that does not hold, and goes on', async () => {
  const exits = { EXIT_TSC: '1', EXIT_LINT: '1', EXIT_BUILD: '1' };
  expect(await npmTest(exits)).toMatchObject({ code: 1, last: '4 passed, 3 failed' });
});

it('counts a test that fails and one that is left out as failed', async () => {
  await write('pure/e.test.js', test('fails', 'expect(1).toBe(2);'));
  await write('services/f.test.js', "import { it } from 'vitest';\nit.skip('later', () => {});\n");
  expect(await npmTest()).toMatchObject({ code: 1, last: '7 passed, 2 failed' });
});

it('counts a file that does not load as failed', async () => {
  await write('journeys/g.test.js', "import './nowhere.js';\n");
  expect(await npmTest()).toMatchObject({ code: 1, last: '7 passed, 1 failed' });
});
