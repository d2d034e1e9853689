import { readFileSync } from 'node:fs';

export type StepResult = {
  readonly exitCode: number;
  readonly output: string;
  /** Where Vitest wrote its report, if the step is one of its projects. */
  readonly reportFile: string;
};

export type Count = {
  readonly passed: number;
  readonly failed: number;
  /** What the step's own output does not say. */
  readonly remark?: string;
};

/** A step that is no test counts as one. */
export function countExitCode({ exitCode }: StepResult): Count {
  return exitCode === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

type VitestReport = {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numPendingTests: number;
  readonly numTodoTests: number;
  readonly testResults: readonly { readonly status: string; readonly assertionResults: readonly unknown[] }[];
};

/** From Vitest's JSON report. A file that did not load, and a test that was left out, count as failed. */
export function countVitest({ exitCode, reportFile }: StepResult): Count {
  const report = readReport(reportFile);
  if (report === undefined) return { passed: 0, failed: 1, remark: 'Vitest wrote no report' };
  const unloaded = report.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  ).length;
  const leftOut = report.numPendingTests + report.numTodoTests;
  const failed = report.numFailedTests + unloaded + leftOut;
  const count = {
    passed: report.numPassedTests,
    failed,
    ...(leftOut > 0 ? { remark: `${leftOut} tests were left out` } : {}),
  };
  if (failed === 0 && exitCode !== 0) return { ...count, failed: 1, remark: 'Vitest itself failed' };
  if (failed === 0 && count.passed === 0) return { ...count, failed: 1, remark: 'no test ran' };
  return count;
}

function readReport(file: string): VitestReport | undefined {
  try {
    // Vitest's own JSON, whose shape its documentation gives.
    return JSON.parse(readFileSync(file, 'utf8')) as VitestReport;
  } catch {
    return undefined;
  }
}

/** From the journeys' last line, "e2e: 12 passed, 0 failed". */
export function countE2e({ exitCode, output }: StepResult): Count {
  const lines = [...output.matchAll(/^e2e: (\d+) passed, (\d+) failed$/gm)];
  const last = lines.at(-1);
  if (last === undefined) return { passed: 0, failed: 1, remark: 'the journeys did not reach their last line' };
  const count = { passed: Number(last[1]), failed: Number(last[2]) };
  if (count.failed === 0 && exitCode !== 0) return { ...count, failed: 1, remark: 'the journeys themselves failed' };
  if (count.failed === 0 && count.passed === 0) return { ...count, failed: 1, remark: 'no journey ran' };
  return count;
}
