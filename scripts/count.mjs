/** Counts the tests of a vitest JSON report. Only Node's own modules here. */
import { existsSync, readFileSync } from 'node:fs';

/**
 * How many tests passed and failed. A file that could not be loaded, a test that was left out, and a run that ended
 * badly without any failed test each count as failed: none of them may look like success.
 * @param {string} path the report
 * @param {boolean} endedWell whether vitest's exit code was 0
 * @returns {{ passed: number, failed: number }}
 */
export function countReport(path, endedWell) {
  if (!existsSync(path)) return { passed: 0, failed: 1 };
  /** @type {{ testResults: { status: string, assertionResults: { status: string }[] }[] }} */
  const { testResults } = JSON.parse(readFileSync(path, 'utf8'));
  const statuses = testResults.flatMap(({ status, assertionResults }) =>
    status === 'failed' && !assertionResults.some((test) => test.status === 'failed')
      ? ['failed', ...assertionResults.map((test) => test.status)]
      : assertionResults.map((test) => test.status),
  );
  const passed = statuses.filter((status) => status === 'passed').length;
  const failed = statuses.length - passed;
  return { passed, failed: failed === 0 && !endedWell ? 1 : failed };
}
