import { createHash, randomBytes } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { migrate, setUpLock, withDatabase } from '../../scripts/setup/application-database';
import { localFolder, top } from '../../scripts/setup/checkout.mjs';
import { holdCluster } from '../../scripts/setup/postgres-cluster';

/** A PostgreSQL server that tests may fill with databases of their own. */
export type TestServer = {
  /** Address of its maintenance database. */
  readonly url: string;
  readonly release: () => Promise<void>;
};

/** The server TEST_DATABASE_URL names, else the checkout's own test cluster, apart from the one `npm start` keeps. */
export async function holdTestServer(): Promise<TestServer> {
  const given = process.env.TEST_DATABASE_URL;
  if (given !== undefined && given !== '') return { url: given, release: () => Promise.resolve() };
  const cluster = await holdCluster(path.join(localFolder, 'test-postgres'), path.join(tmpdir(), 'paperside-test'));
  return { url: cluster.url('postgres'), release: cluster.release };
}

/**
 * Builds the empty, migrated database that tests copy, unless an earlier run has built it from the same migrations.
 * @returns its name
 */
export async function ensureTemplate(serverUrl: string): Promise<string> {
  const name = `template_${hashMigrations()}`;
  await asAdmin(serverUrl, async (admin) => {
    // Two runs may start at once: one builds, the other finds it built.
    await admin.query('select pg_advisory_lock($1)', [setUpLock]);
    const found = await admin.query<{ datistemplate: boolean }>(
      'select datistemplate from pg_database where datname = $1',
      [name],
    );
    if (found.rows[0]?.datistemplate === true) return;
    const quoted = pg.escapeIdentifier(name);
    await admin.query(`drop database if exists ${quoted} with (force)`);
    await admin.query(`create database ${quoted} template template0`);
    await migrate(withDatabase(serverUrl, name));
    // Copying needs a template without connections, so nobody may connect to it from here on.
    await admin.query(`alter database ${quoted} with is_template true allow_connections false`);
  });
  return name;
}

/**
 * Copies a template into a new database of the caller's own. Nobody drops it: dropping forces a checkpoint, which takes
 * longer than many a test. `sweepOldDatabases` clears it away in a later run.
 * @returns its address
 */
export async function copyDatabase(serverUrl: string, template: string): Promise<string> {
  const name = `${copyPrefix}${Date.now()}_${randomBytes(4).toString('hex')}`;
  await asAdmin(serverUrl, async (admin) => {
    await admin.query(`create database ${pg.escapeIdentifier(name)} template ${pg.escapeIdentifier(template)}`);
  });
  return withDatabase(serverUrl, name);
}

const copyPrefix = 'test_';
const oldMs = 60 * 60 * 1000;

/** Drops copies that runs of more than an hour ago left, and templates of other migrations that nobody builds on now. */
export async function sweepOldDatabases(serverUrl: string, template: string): Promise<void> {
  await asAdmin(serverUrl, async (admin) => {
    const { rows } = await admin.query<{ name: string }>(
      `select datname as name from pg_database
        where (datname like 'test\\_%' or datname like 'template\\_%' and datname <> $1)
          and not exists (select from pg_stat_activity where pg_stat_activity.datname = pg_database.datname)`,
      [template],
    );
    for (const { name } of rows) {
      const madeAt = Number(name.split('_')[1]);
      const isTemplate = name.startsWith('template_');
      if (!isTemplate && Date.now() - madeAt < oldMs) continue;
      const quoted = pg.escapeIdentifier(name);
      if (isTemplate) await admin.query(`alter database ${quoted} with is_template false`);
      await admin.query(`drop database if exists ${quoted} with (force)`);
    }
  });
}

async function asAdmin(serverUrl: string, work: (admin: pg.Client) => Promise<void>): Promise<void> {
  const admin = new pg.Client({ connectionString: serverUrl, application_name: 'paperside tests' });
  await admin.connect();
  try {
    await work(admin);
  } finally {
    await admin.end();
  }
}

function hashMigrations(): string {
  const folder = path.join(top, 'migrations');
  const hash = createHash('sha256');
  for (const file of readdirSync(folder).sort()) {
    if (file.endsWith('.ts')) hash.update(file).update(readFileSync(path.join(folder, file)));
  }
  return hash.digest('hex').slice(0, 12);
}
