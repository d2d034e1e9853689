import knex, { type Knex } from 'knex';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { migrationSource, migrationTable } from '../../migrations/source';
import { freshDatabase } from '../support/fresh-database';

const database = freshDatabase();
const settings = { migrationSource, tableName: migrationTable };
const name = '20261201180000_add_policy_versions';

let db: Knex;

beforeAll(async () => {
  db = knex({ client: 'pg', connection: database.url, pool: { min: 0, max: 1 } });
  await db.migrate.rollback(settings, true);
  await db.migrate.up({ ...settings, name: '20261201090000_create_first_tables' });
});

afterAll(() => db.destroy());

async function addPolicy(timeZone: string, day: object): Promise<string> {
  const facilityId = randomUUID();
  const at = '2026-03-03T05:30:00.000Z';
  await db('facilities').insert({
    id: facilityId,
    name: 'Alder Hospital',
    time_zone: timeZone,
    unit_system: 'metric',
    load_number_pattern: '{nn}',
    created_at: at,
    ...day,
  });
  const id = randomUUID();
  await db('policies').insert({
    id,
    facility_id: facilityId,
    number: 1,
    settings: JSON.stringify({ packageClearanceMm: 25 }),
    reason: 'As delivered',
    effective_at: at,
    created_at: at,
  });
  return id;
}

it('gives each version the day its facility called that instant, and goes down and up again without losing one', async () => {
  // 05:30 in London; 23:30 of the evening before in Chicago; before a day that begins at 06:00.
  const london = await addPolicy('Europe/London', { day_rule: 'calendar-day' });
  const chicago = await addPolicy('America/Chicago', { day_rule: 'calendar-day' });
  const early = await addPolicy('Europe/London', { day_rule: 'production-day', production_day_starts_at: '06:00' });
  const before = await db('policies').orderBy('id').select();

  const daysOf = () =>
    db('policies')
      .whereIn('id', [london, chicago, early])
      .select<{ id: string; day: string }[]>('id', db.raw('effective_on::text as day'))
      .then((rows) => Object.fromEntries(rows.map(({ id, day }) => [id, day])));

  await db.migrate.up({ ...settings, name });
  expect(await daysOf()).toEqual({ [london]: '2026-03-03', [chicago]: '2026-03-02', [early]: '2026-03-02' });

  await db.migrate.down({ ...settings, name });
  expect(await db('policies').orderBy('id').select()).toEqual(before);

  await db.migrate.up({ ...settings, name });
  expect(await daysOf()).toEqual({ [london]: '2026-03-03', [chicago]: '2026-03-02', [early]: '2026-03-02' });
});
