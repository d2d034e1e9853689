import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { countE2e, countExitCode, countVitest, type Count } from '../../scripts/test/count';

const folder = mkdtempSync(path.join(tmpdir(), 'paperside-count-'));
const reportFile = path.join(folder, 'report.json');

afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('a step that is no test', () => {
  it('counts as one, by its exit code', () => {
    expect(countExitCode({ exitCode: 0, output: '', reportFile })).toEqual({ passed: 1, failed: 0 });
    expect(countExitCode({ exitCode: 2, output: '', reportFile })).toEqual({ passed: 0, failed: 1 });
  });
});

describe('a Vitest report', () => {
  const clean = { numPassedTests: 7, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] };

  function count(report: object, exitCode: number): Count {
    writeFileSync(reportFile, JSON.stringify({ ...clean, ...report }));
    return countVitest({ exitCode, output: '', reportFile });
  }

  it('gives the tests that passed and failed', () => {
    expect(count({}, 0)).toEqual({ passed: 7, failed: 0 });
    expect(count({ numFailedTests: 2 }, 1)).toEqual({ passed: 7, failed: 2 });
  });

  it('counts a file that did not load as a failure', () => {
    const testResults = [{ status: 'failed', assertionResults: [] }];
    expect(count({ testResults }, 1)).toEqual({ passed: 7, failed: 1 });
  });

  it('counts tests that were left out as failures', () => {
    expect(count({ numPendingTests: 1, numTodoTests: 1 }, 0)).toMatchObject({ passed: 7, failed: 2 });
  });

  it('counts an error outside every test as a failure', () => {
    expect(count({}, 1)).toMatchObject({ passed: 7, failed: 1 });
  });

  it('does not take a run without tests for a clean one', () => {
    expect(count({ numPassedTests: 0 }, 0)).toMatchObject({ passed: 0, failed: 1 });
  });

  it('counts a missing report as a failure', () => {
    rmSync(reportFile, { force: true });
    expect(countVitest({ exitCode: 0, output: '', reportFile })).toMatchObject({ passed: 0, failed: 1 });
  });
});

describe('the end-to-end journeys', () => {
  function count(output: string, exitCode: number): Count {
    return countE2e({ exitCode, output, reportFile });
  }

  it('are counted from their last line', () => {
    expect(count('journey one\ne2e: 3 passed, 0 failed\n', 0)).toEqual({ passed: 3, failed: 0 });
    expect(count('e2e: 2 passed, 1 failed\n', 1)).toEqual({ passed: 2, failed: 1 });
  });

  it('have failed when they did not reach that line', () => {
    expect(count('journey one\n', 0)).toMatchObject({ passed: 0, failed: 1 });
  });

  it('have failed when they end badly after it or ran none', () => {
    expect(count('e2e: 3 passed, 0 failed\n', 1)).toMatchObject({ passed: 3, failed: 1 });
    expect(count('e2e: 0 passed, 0 failed\n', 0)).toMatchObject({ passed: 0, failed: 1 });
  });
});
