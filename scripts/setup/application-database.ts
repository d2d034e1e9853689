import knex from 'knex';
import pg from 'pg';
import { migrationSource, migrationTable } from '../../migrations/source';
import { Refusal } from './refusal.mjs';

/** Any number that only this program uses; it keeps two commands from migrating one database at once. */
export const setUpLock = 7_041_921;

/** Makes the database an address names, if its server lacks it. */
export async function createDatabaseIfMissing(url: string): Promise<void> {
  const name = decodeURIComponent(new URL(url).pathname.slice(1));
  if (name === '') throw new Refusal('DATABASE_URL names no database: it ends like postgres://…/paperside.');
  const wanted = new pg.Client({ connectionString: url });
  try {
    await wanted.connect();
    return;
  } catch (error) {
    if (!isPostgresError(error, 'invalid_catalog_name')) throw cannotReach(url, error);
  } finally {
    await wanted.end();
  }
  const admin = new pg.Client({ connectionString: withDatabase(url, 'postgres') });
  try {
    await admin.connect();
    await admin.query(`create database ${pg.escapeIdentifier(name)} encoding 'UTF8' template template0`);
  } catch (error) {
    if (!isPostgresError(error, 'duplicate_database')) throw cannotReach(url, error);
  } finally {
    await admin.end();
  }
}

/** Runs the migrations that have not run yet and says which. */
export async function migrate(url: string): Promise<readonly string[]> {
  const db = knex({ client: 'pg', connection: url, pool: { min: 0, max: 2 } });
  try {
    const [, ran] = (await db.migrate.latest({ migrationSource, tableName: migrationTable })) as [number, string[]];
    return ran;
  } finally {
    await db.destroy();
  }
}

/** The same server, another database. */
export function withDatabase(url: string, database: string): string {
  const other = new URL(url);
  other.pathname = `/${encodeURIComponent(database)}`;
  return other.href;
}

/** Names of the conditions as PostgreSQL's appendix "Error Codes" has them. */
const conditions = { invalid_catalog_name: '3D000', duplicate_database: '42P04' } as const;

function isPostgresError(error: unknown, condition: keyof typeof conditions): boolean {
  return error instanceof pg.DatabaseError && error.code === conditions[condition];
}

function cannotReach(url: string, error: unknown): Refusal {
  const { host, pathname } = new URL(url);
  const said = error instanceof AggregateError ? error.errors.map(String).join('; ') : String(error);
  return new Refusal(`The database ${pathname.slice(1)} at ${host} cannot be used: ${said}`);
}
