import type { Knex } from 'knex';
import { seedFacilities } from './demonstration-facilities';
import { seedPeople } from './demonstration-people';

/** Lays out the whole demonstration around the given instant, which becomes its today. All of it or nothing. */
export async function seedDemonstration(db: Knex, now: Date): Promise<void> {
  await db.transaction(async (trx) => {
    await seedFacilities(trx, now);
    await seedPeople(trx, now);
  });
}
