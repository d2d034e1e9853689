import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import net from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';
import { afterEach, beforeAll, afterAll, describe, expect, it } from 'vitest';
import { demonstrationSignIns } from '../../seeds/demonstration-people';
import { findFreePort, isPortFree } from '../../scripts/setup/ports';
import { killGroup } from '../../scripts/setup/run-command';
import { holdTestServer } from '../support/test-server';

const top = path.resolve(import.meta.dirname, '../..');
const local = mkdtempSync(path.join(tmpdir(), 'paperside-start-'));
const pidFile = path.join(local, 'postgres', 'data', 'postmaster.pid');
const [person] = demonstrationSignIns;
const goodbye = 'Stopped; the data is kept';

type Started = {
  readonly child: ChildProcess;
  readonly port: number;
  readonly output: () => string;
  /** Resolves to the exit code once it ended. */
  readonly ended: Promise<number | null>;
  /** Until it listens; rejects with what it printed if it ends before. */
  readonly ready: Promise<void>;
};

const running = new Set<ChildProcess>();

/** In a process group of its own, as a terminal would start it. */
function run(args: readonly [string, ...string[]], env: NodeJS.ProcessEnv, port: number): Started {
  const [program, ...rest] = args;
  const child = spawn(program, rest, {
    cwd: top,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, LOCAL_DIR: local, PORT: String(port), ...env },
  });
  running.add(child);
  let output = '';
  const ended = new Promise<number | null>((resolve) => {
    child.once('exit', (code) => {
      running.delete(child);
      resolve(code);
    });
  });
  const ready = new Promise<void>((resolve, reject) => {
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (chunk: string) => {
        output += chunk;
        if (output.includes('Ctrl-C stops')) resolve();
      });
    }
    child.once('close', () => {
      reject(new Error(output));
    });
  });
  ready.catch(() => undefined);
  return { child, port, output: () => output, ended, ready };
}

async function start(env: NodeJS.ProcessEnv = {}): Promise<Started> {
  return run([process.execPath, 'scripts/start.mjs'], env, await findFreePort());
}

async function waitUntil(isTrue: () => boolean | Promise<boolean>): Promise<void> {
  const until = Date.now() + 60_000;
  while (!(await isTrue())) {
    if (Date.now() > until) throw new Error('It did not come about within a minute.');
    await sleep(50);
  }
}

beforeAll(() => {
  chmodSync(local, 0o755);
});

afterEach(() => {
  for (const child of running) if (child.pid !== undefined) killGroup(child.pid, 'SIGTERM');
});

afterAll(async () => {
  await waitUntil(() => !existsSync(pidFile));
  rmSync(local, { recursive: true });
});

describe('npm start', () => {
  it('serves the program on one port and names the address and the people to sign in as', async () => {
    const started = await start();
    await started.ready;
    expect(started.output()).toContain(`Open http://localhost:${started.port}`);
    for (const { name, password } of demonstrationSignIns) {
      expect(started.output()).toContain(name);
      expect(started.output()).toContain(password);
    }

    const health = await fetch(`http://127.0.0.1:${started.port}/api/health`);
    expect(health.status).toBe(200);
    expect(await health.json()).toEqual({ status: 'ok' });
    const page = await fetch(`http://127.0.0.1:${started.port}/`);
    expect(await page.text()).toContain('<div id="root">');

    started.child.kill('SIGINT');
    expect(await started.ended).toBe(0);
    expect(started.output().split(goodbye)).toHaveLength(2);
    expect(existsSync(pidFile)).toBe(false);
    expect(await isPortFree(started.port, '127.0.0.1')).toBe(true);
  });

  it('keeps what it laid out and does nothing twice when run again', async () => {
    const started = await start();
    await started.ready;
    expect(started.output()).toContain('up to date');
    expect(started.output()).not.toContain('laid out');
    expect(started.output()).toContain('as built before');
    expect(started.output()).toContain(person?.name ?? 'nobody');
  });

  it('stops once, however often it is asked to', async () => {
    const started = await start();
    await started.ready;
    for (const signal of ['SIGINT', 'SIGINT', 'SIGTERM'] as const) {
      started.child.kill(signal);
      await sleep(20);
    }
    expect(await started.ended).toBe(0);
    expect(started.output().split(goodbye)).toHaveLength(2);
    expect(existsSync(pidFile)).toBe(false);
  });

  it.each(['SIGINT', 'SIGTERM', 'SIGKILL'] as const)('stops server and database when npm gets %s', async (signal) => {
    const started = run(['npm', 'start'], {}, await findFreePort());
    await started.ready;
    started.child.kill(signal);
    await waitUntil(() => !existsSync(pidFile));
    expect(await isPortFree(started.port, '127.0.0.1')).toBe(true);
  });

  it('leaves no server behind when it is killed itself, and starts again after it', async () => {
    const started = await start();
    await started.ready;
    started.child.kill('SIGKILL');
    await waitUntil(() => isPortFree(started.port, '127.0.0.1'));

    const again = await start();
    await again.ready;
    again.child.kill('SIGINT');
    expect(await again.ended).toBe(0);
    expect(existsSync(pidFile)).toBe(false);
  });

  it('stops in order while it is still setting up', async () => {
    const started = await start();
    await waitUntil(() => started.output().includes('Database'));
    started.child.kill('SIGINT');
    expect(await started.ended).toBe(0);
    expect(existsSync(pidFile)).toBe(false);
  });

  it('uses the database that DATABASE_URL names and starts none', async () => {
    const server = await holdTestServer();
    const url = new URL(server.url);
    url.pathname = `/test_${Date.now()}_start`;
    try {
      const started = await start({ DATABASE_URL: url.href });
      await started.ready;
      expect(existsSync(pidFile)).toBe(false);
      const client = new pg.Client({ connectionString: url.href });
      await client.connect();
      const { rows } = await client.query<{ count: number }>('select count(*)::int as count from people');
      await client.end();
      expect(rows[0]?.count).toBeGreaterThanOrEqual(demonstrationSignIns.length);
      started.child.kill('SIGINT');
      expect(await started.ended).toBe(0);
    } finally {
      await server.release();
    }
  });

  it('leaves an empty database empty where DEMONSTRATION is no', async () => {
    const server = await holdTestServer();
    const url = new URL(server.url);
    url.pathname = `/test_${Date.now()}_empty`;
    try {
      const started = await start({ DATABASE_URL: url.href, DEMONSTRATION: 'no' });
      await started.ready;
      expect(started.output()).not.toContain('laid out');
      expect(started.output()).not.toContain(person?.password ?? '');
      started.child.kill('SIGINT');
      expect(await started.ended).toBe(0);
    } finally {
      await server.release();
    }
  });
});

describe('npm start refuses in a plain sentence', () => {
  async function refusal(port: string, env: NodeJS.ProcessEnv = {}): Promise<string> {
    const started = run([process.execPath, 'scripts/start.mjs'], { ...env, PORT: port }, 0);
    await once(started.child, 'close');
    expect(started.child.exitCode).toBe(1);
    expect(started.output()).not.toMatch(/\n\s+at /);
    return started.output();
  }

  it('a port that another program has taken', async () => {
    const squatter = net.createServer();
    await new Promise<void>((resolve) => squatter.listen(0, '127.0.0.1', resolve));
    const address = squatter.address();
    const port = address !== null && typeof address === 'object' ? address.port : 0;
    try {
      const output = await refusal(String(port));
      expect(output).toContain(`Port ${port} is already taken by another program.`);
      expect(output).toMatch(/choose another port: PORT=\d+ npm start/);
      expect(output).not.toContain('Database');
    } finally {
      squatter.close();
    }
  });

  it.each(['http', '70000', '-1', '30.5'])('PORT=%s', async (port) => {
    expect(await refusal(port)).toContain(`PORT is "${port}". It has to be a whole number from 0 to 65535`);
  });

  it('a DATABASE_URL that is no address', async () => {
    expect(await refusal('0', { DATABASE_URL: 'paperside' })).toContain('DATABASE_URL is not an address of the form');
  });

  it('a DATABASE_URL where nobody answers', async () => {
    const port = await findFreePort();
    const output = await refusal('0', { DATABASE_URL: `postgres://a:b@127.0.0.1:${port}/paperside` });
    expect(output).toContain(`The database paperside at 127.0.0.1:${port} cannot be used`);
  });
});
