import { spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findPostmaster } from '../../scripts/setup/postmaster';
import { holdCluster, type Cluster } from '../../scripts/setup/postgres-cluster';

const parent = mkdtempSync(path.join(tmpdir(), 'paperside-cluster-'));
const folder = path.join(parent, 'postgres');
const data = path.join(folder, 'data');
const pidFile = path.join(data, 'postmaster.pid');
const held = new Set<Cluster>();

async function hold(): Promise<Cluster> {
  const cluster = await holdCluster(folder, path.join(parent, 'elsewhere'));
  held.add(cluster);
  return cluster;
}

async function release(cluster: Cluster): Promise<void> {
  held.delete(cluster);
  await cluster.release();
}

async function query<Row extends pg.QueryResultRow>(cluster: Cluster, sql: string): Promise<Row[]> {
  const client = new pg.Client({ connectionString: cluster.url('postgres') });
  await client.connect();
  try {
    return (await client.query<Row>(sql)).rows;
  } finally {
    await client.end();
  }
}

beforeAll(async () => {
  // The folder has to let PostgreSQL's user through, as a checkout does.
  chmodSync(parent, 0o755);
  const cluster = await hold();
  await query(cluster, `create table kept (word text); insert into kept values ('pouch')`);
  await release(cluster);
});

afterAll(async () => {
  for (const cluster of [...held]) await release(cluster);
  rmSync(parent, { recursive: true });
});

describe('the private cluster', () => {
  it('is durable, listens on the loopback address alone and asks for a password', async () => {
    const cluster = await hold();
    const rows = await query<{ name: string; setting: string }>(
      cluster,
      `select name, setting from pg_settings where name in
        ('fsync', 'synchronous_commit', 'full_page_writes', 'listen_addresses', 'data_checksums', 'TimeZone')`,
    );
    expect(Object.fromEntries(rows.map(({ name, setting }) => [name, setting]))).toEqual({
      fsync: 'on',
      synchronous_commit: 'on',
      full_page_writes: 'on',
      listen_addresses: '127.0.0.1',
      data_checksums: 'on',
      TimeZone: 'UTC',
    });
    const wrong = new URL(cluster.url('postgres'));
    wrong.password = 'guessed';
    await expect(new pg.Client({ connectionString: wrong.href }).connect()).rejects.toThrow('password authentication');
    await release(cluster);
  });

  it('keeps its data from one start to the next and leaves nothing running between', async () => {
    expect(findPostmaster(data)).toBeUndefined();
    expect(existsSync(pidFile)).toBe(false);
    const cluster = await hold();
    expect(await query(cluster, 'select word from kept')).toEqual([{ word: 'pouch' }]);
    await release(cluster);
    expect(existsSync(pidFile)).toBe(false);
  });

  it('goes on running while another process holds it', async () => {
    const other = spawn(
      process.execPath,
      [
        ...['--import', 'tsx', '--input-type=module', '--eval'],
        `const { holdCluster } = await import('./scripts/setup/postgres-cluster.ts');
         const cluster = await holdCluster(${JSON.stringify(folder)}, '/nowhere');
         console.log('held');
         process.stdin.once('data', () => { void cluster.release().then(() => process.exit(0)); });`,
      ],
      { cwd: process.cwd(), stdio: ['pipe', 'pipe', 'inherit'] },
    );
    const ended = new Promise((resolve) => other.once('exit', resolve));
    try {
      await new Promise((resolve) => other.stdout.once('data', resolve));
      const cluster = await hold();
      await release(cluster);
      expect(findPostmaster(data)?.state).toBe('ready');
      other.stdin.write('\n');
      expect(await ended).toBe(0);
      expect(findPostmaster(data)).toBeUndefined();
    } finally {
      other.kill('SIGKILL');
    }
  });

  it('recovers what was committed when the server was killed', async () => {
    const cluster = await hold();
    await query(cluster, `insert into kept values ('basin')`);
    const postmaster = findPostmaster(data);
    if (postmaster === undefined) throw new Error('The server is not running.');
    process.kill(postmaster.pid, 'SIGKILL');
    while (findPostmaster(data) !== undefined) await new Promise((resolve) => setTimeout(resolve, 20));
    expect(existsSync(pidFile)).toBe(true);

    const again = await hold();
    expect(await query(again, 'select word from kept order by 1')).toEqual([{ word: 'basin' }, { word: 'pouch' }]);
    await release(again);
  });

  it('starts although a stale lock names a living process that is something else', async () => {
    // As after a power cut, when the process id went to a process of the same user.
    writeFileSync(pidFile, [process.pid, data, '1', '5432', '', '127.0.0.1', '', 'ready', ''].join('\n'));
    const cluster = await hold();
    expect(await query(cluster, 'select 1 as one')).toEqual([{ one: 1 }]);
    await release(cluster);
  });

  it('takes another port when its own has been taken meanwhile', async () => {
    const port = Number(readFileSync(path.join(folder, 'port'), 'utf8'));
    const squatter = net.createServer();
    await new Promise<void>((resolve) => squatter.listen(port, '127.0.0.1', resolve));
    try {
      const cluster = await hold();
      expect(Number(new URL(cluster.url('postgres')).port)).not.toBe(port);
      expect(await query(cluster, 'select 1 as one')).toEqual([{ one: 1 }]);
      await release(cluster);
    } finally {
      squatter.close();
    }
  });

  it('is made anew when making it was broken off', async () => {
    const other = path.join(parent, 'broken-off');
    mkdirSync(path.join(other, 'data.unfinished', 'base'), { recursive: true });
    writeFileSync(path.join(other, 'password-for-initdb'), 'of the first try');
    const cluster = await holdCluster(other, path.join(parent, 'elsewhere'));
    held.add(cluster);
    expect(await query(cluster, 'select 1 as one')).toEqual([{ one: 1 }]);
    expect(existsSync(path.join(other, 'data.unfinished'))).toBe(false);
    expect(existsSync(path.join(other, 'password-for-initdb'))).toBe(false);
    await release(cluster);
  });

  it('refuses damaged data and leaves it as it is', async () => {
    const file = path.join(data, 'PG_VERSION');
    const version = readFileSync(file, 'utf8');
    rmSync(file);
    await expect(hold()).rejects.toThrow('is damaged: its file PG_VERSION is missing');
    expect(existsSync(path.join(data, 'base'))).toBe(true);
    writeFileSync(file, version);
  });

  it('says which version made the data when that one is gone', async () => {
    const file = path.join(data, 'PG_VERSION');
    const version = readFileSync(file, 'utf8');
    writeFileSync(file, '9\n');
    await expect(hold()).rejects.toThrow('was made by PostgreSQL 9, which is no longer installed');
    writeFileSync(file, version);
  });
});
