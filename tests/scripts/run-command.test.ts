import { setTimeout as sleep } from 'node:timers/promises';
import { expect, it } from 'vitest';
import { isRunning } from '../../scripts/setup/processes';
import { runCommand } from '../../scripts/setup/run-command';

const cwd = process.cwd();

it('returns what a command printed and how it ended', async () => {
  const result = await runCommand({ args: ['sh', '-c', 'echo one; echo two >&2; exit 3'], cwd, limitMs: 10_000 });
  expect(result).toMatchObject({ exitCode: 3, hasTimedOut: false });
  expect(result.output).toContain('one');
  expect(result.output).toContain('two');
});

it('says so when there is no such program', async () => {
  const result = await runCommand({ args: ['no-such-program'], cwd, limitMs: 10_000 });
  expect(result.exitCode).not.toBe(0);
  expect(result.output).toContain('no-such-program could not be started');
});

it('ends a command at its limit together with everything that it started', async () => {
  const script = 'trap "" TERM; sleep 600 & echo $!; wait; sleep 600';
  const result = await runCommand({ args: ['sh', '-c', script], cwd, limitMs: 500 });
  expect(result.hasTimedOut).toBe(true);
  expect(result.exitCode).not.toBe(0);
  const grandchild = Number(result.output.trim());
  expect(grandchild).toBeGreaterThan(0);
  await sleep(200);
  expect(isRunning(grandchild)).toBe(false);
});

it('ends what a command left running when it ended itself', async () => {
  const script = 'sleep 600 >/dev/null 2>&1 & echo $!';
  const result = await runCommand({ args: ['sh', '-c', script], cwd, limitMs: 10_000 });
  expect(result.exitCode).toBe(0);
  await sleep(200);
  expect(isRunning(Number(result.output.trim()))).toBe(false);
});
