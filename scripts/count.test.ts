import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { countReport } from './count.mjs';

let folder = '';

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'witnessmark-count-'));
});

afterAll(() => rm(folder, { recursive: true }));

/** A report with one file per list of test statuses, as vitest writes it. */
async function report(...files: { status: string; tests: string[] }[]): Promise<string> {
  const path = join(folder, 'report.json');
  const testResults = files.map(({ status, tests }) => ({
    status,
    assertionResults: tests.map((test) => ({ status: test })),
  }));
  await writeFile(path, JSON.stringify({ testResults }));
  return path;
}

it('adds up what passed and failed', async () => {
  const path = await report(
    { status: 'passed', tests: ['passed', 'passed'] },
    { status: 'failed', tests: ['passed', 'failed'] },
  );
  expect(countReport(path, false)).toEqual({ passed: 3, failed: 1 });
});

it('counts a file that could not be loaded as failed', async () => {
  const path = await report({ status: 'failed', tests: [] });
  expect(countReport(path, false)).toEqual({ passed: 0, failed: 1 });
});

it.each(['skipped', 'pending', 'todo', 'disabled'])(
  'counts a %s test as failed',
  async (status) => {
    const path = await report({ status: 'passed', tests: ['passed', status] });
    expect(countReport(path, true)).toEqual({ passed: 1, failed: 1 });
  },
);

it('counts a run that ended badly without a failed test as failed', async () => {
  const path = await report({ status: 'passed', tests: ['passed'] });
  expect(countReport(path, false)).toEqual({ passed: 1, failed: 1 });
});

it('counts a run without a report as failed', () => {
  expect(countReport(join(folder, 'none.json'), true)).toEqual({ passed: 0, failed: 1 });
});
