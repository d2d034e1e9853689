import type { Knex } from 'knex';
import { seedDemonstration } from '../../seeds/demonstration';
import { demonstrationSignIns } from '../../seeds/demonstration-people';
import { openDb } from '../../server/platform/db';
import { setUpLock } from '../setup/application-database';

/**
 * Lays out the demonstration hospital in a database without any facility: all of it or nothing, and never twice.
 * @returns whether it did
 */
export async function layOutDemonstration(databaseUrl: string, now: Date): Promise<boolean> {
  return withDb(databaseUrl, (db) =>
    db.transaction(async (transaction) => {
      // A second command waits here and then finds the facility.
      await transaction.raw('select pg_advisory_xact_lock(?)', [setUpLock]);
      if ((await transaction('facilities').first('id')) !== undefined) return false;
      await seedDemonstration(transaction, now);
      return true;
    }),
  );
}

/** Who can sign in for a look round; nobody where a real hospital works. */
export async function listDemonstrationSignIns(databaseUrl: string): Promise<typeof demonstrationSignIns> {
  const numbers = demonstrationSignIns.map((person) => person.staffNumber);
  const present = await withDb(databaseUrl, (db) =>
    db('people').whereIn('staff_number', numbers).where({ is_disabled: false }).pluck<string[]>('staff_number'),
  );
  return demonstrationSignIns.filter((person) => present.includes(person.staffNumber));
}

async function withDb<T>(databaseUrl: string, work: (db: Knex) => Promise<T>): Promise<T> {
  const db = openDb(databaseUrl, 2);
  try {
    return await work(db);
  } finally {
    await db.destroy();
  }
}
