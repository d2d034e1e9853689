import { spawn } from 'node:child_process';
import { setTimeout as sleep } from 'node:timers/promises';

export type CommandResult = {
  readonly exitCode: number;
  /** What it printed on both streams, in order. */
  readonly output: string;
  readonly hasTimedOut: boolean;
};

export type Command = {
  readonly args: readonly [string, ...string[]];
  readonly limitMs: number;
  readonly env?: NodeJS.ProcessEnv;
  readonly cwd: string;
  /** Shows the output while it comes instead of only returning it. */
  readonly isShown?: boolean;
  /** Ends it early. */
  readonly stop?: Promise<void>;
};

/** Process groups of commands that run now, so that a dying parent can end them. */
const running = new Set<number>();

process.on('exit', () => {
  for (const group of running) killGroup(group, 'SIGKILL');
});

/** Runs a command in a process group of its own; at its time limit, or when stopped, the whole group is ended. */
export async function runCommand({ args, limitMs, env, cwd, isShown, stop }: Command): Promise<CommandResult> {
  const [program, ...rest] = args;
  const child = spawn(program, rest, {
    cwd,
    env: env ?? process.env,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const group = child.pid;
  if (group !== undefined) running.add(group);
  let output = '';
  for (const [stream, shown] of [
    [child.stdout, process.stdout],
    [child.stderr, process.stderr],
  ] as const) {
    stream.setEncoding('utf8').on('data', (chunk: string) => {
      output += chunk;
      if (isShown === true) shown.write(chunk);
    });
  }
  const ended = new Promise<number>((resolve) => {
    child.once('error', (error) => {
      output += `${program} could not be started: ${error.message}\n`;
      resolve(127);
    });
    child.once('exit', (code, signal) => {
      resolve(code ?? (signal === null ? 1 : 128));
    });
  });
  const limit = new AbortController();
  const outcome = await Promise.race([
    ended,
    sleep(limitMs, 'late' as const, { signal: limit.signal }).catch(() => 'late' as const),
    ...(stop === undefined ? [] : [stop.then(() => 'stopped' as const)]),
  ]);
  limit.abort();
  if (group !== undefined) {
    // Also after an ordinary end: whatever it left running would outlive the run.
    if (typeof outcome === 'string') {
      killGroup(group, 'SIGTERM');
      await Promise.race([ended, sleep(3_000)]);
    }
    killGroup(group, 'SIGKILL');
    running.delete(group);
  }
  const exitCode = typeof outcome === 'number' ? outcome : 1;
  return { exitCode, output, hasTimedOut: outcome === 'late' };
}

/** True while the group had a member to receive the signal. */
export function killGroup(group: number, signal: NodeJS.Signals): boolean {
  try {
    process.kill(-group, signal);
    return true;
  } catch {
    return false;
  }
}
