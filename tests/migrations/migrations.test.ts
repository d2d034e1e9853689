import knex from 'knex';
import { expect, it } from 'vitest';
import { migrationSource, migrationTable } from '../../migrations/source';
import { freshDatabase } from '../support/fresh-database';

const database = freshDatabase();

async function listTables(): Promise<string[]> {
  const { rows } = await database.db.raw<{ rows: { name: string }[] }>(
    `select table_name as name from information_schema.tables
      where table_schema = 'public' and table_name not like 'schema_migrations%' order by 1`,
  );
  return rows.map((row) => row.name);
}

it('goes all the way down and up again to the same tables', async () => {
  const settings = { migrationSource, tableName: migrationTable };
  const db = knex({ client: 'pg', connection: database.url, pool: { min: 0, max: 1 } });
  try {
    const before = await listTables();
    expect(before.length).toBeGreaterThan(0);

    await db.migrate.rollback(settings, true);
    expect(await listTables()).toEqual([]);

    await db.migrate.latest(settings);
    expect(await listTables()).toEqual(before);
  } finally {
    await db.destroy();
  }
});
