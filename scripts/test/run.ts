import { mkdirSync, rmSync } from 'node:fs';
import { holdTestServer } from '../../tests/support/test-server';
import { top } from '../setup/checkout.mjs';
import { ensureChromium } from '../setup/chromium';
import { runCommand } from '../setup/run-command';
import { listenForStop, type StopRequest } from '../setup/stop-request';
import type { Count } from './count';
import * as steps from './steps';
import { reportFileOf, reportFolder, type Step } from './steps';

/** Exit code of a command that Ctrl-C ended, by the shells' convention of 128 and the signal's number. */
const interrupted = 130;

/** Everything there is, cheap first. Sets up what it needs and ends with one line "N passed, N failed". */
export async function runEverything(): Promise<number> {
  const stop = listenForStop();
  const chromium = ensureChromium();
  const server = await holdTestServer();
  try {
    const env = { ...process.env, TEST_DATABASE_URL: server.url, CHROMIUM: chromium };
    return await run(
      [
        // The checks use one core each, so two go side by side; tests measure time and get the machine to themselves.
        ...[[steps.format, steps.types], [steps.lint, steps.imports, steps.unused], [steps.unit], [steps.client]],
        ...[[steps.server], [steps.build], [steps.commands], [steps.e2e]],
      ],
      env,
      stop,
    );
  } finally {
    await server.release();
  }
}

/** What needs neither database nor browser. */
export async function runFastPart(): Promise<number> {
  const stages = [[steps.format, steps.types], [steps.lint, steps.imports], [steps.unit]];
  return run(stages, process.env, listenForStop());
}

async function run(stages: readonly (readonly Step[])[], env: NodeJS.ProcessEnv, stop: StopRequest): Promise<number> {
  mkdirSync(reportFolder, { recursive: true });
  console.log('');
  const counts: Count[] = [];
  for (const stage of stages) {
    for (const step of stage) rmSync(reportFileOf(step.name), { force: true });
    counts.push(...(await Promise.all(stage.map((step) => runStep(step, env, stop)))));
    if (stop.isMade()) return interrupted;
  }
  const passed = sum(counts.map((count) => count.passed));
  const failed = sum(counts.map((count) => count.failed));
  console.log(`\n${passed} passed, ${failed} failed`);
  return failed === 0 ? 0 : 1;
}

async function runStep(step: Step, env: NodeJS.ProcessEnv, stop: StopRequest): Promise<Count> {
  const begun = performance.now();
  const { exitCode, output, hasTimedOut } = await runCommand({
    args: step.args,
    cwd: top,
    env: { ...env, NO_COLOR: '1', FORCE_COLOR: '0' },
    limitMs: step.limitMinutes * 60_000,
    stop: stop.made,
  });
  if (stop.isMade()) return { passed: 0, failed: 1 };
  const counted = step.count({ exitCode, output, reportFile: reportFileOf(step.name) });
  const count = hasTimedOut
    ? { ...counted, failed: Math.max(1, counted.failed), remark: `ended at its limit of ${step.limitMinutes} minutes` }
    : counted;
  if (count.failed > 0) console.log(`\n--- ${step.name} ---\n${output.trim()}\n`);
  const seconds = `${((performance.now() - begun) / 1000).toFixed(1)} s`;
  const cells = [step.name.padEnd(9), `${count.passed} passed`.padStart(12), `${count.failed} failed`.padStart(10)];
  console.log(`  ${cells.join('')}${seconds.padStart(10)}${count.remark === undefined ? '' : `   ${count.remark}`}`);
  return count;
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((total, number) => total + number, 0);
}
