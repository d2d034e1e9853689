import type { Knex } from 'knex';
import { seedCatalogue } from './demonstration-catalogue';
import { seedEquipment, seedMorningTests, seedSurgeryCenterEquipment } from './demonstration-equipment';
import { hospitalId, seedFacilities, surgeryCenterId } from './demonstration-facilities';
import { seedPackages } from './demonstration-packages';
import { demonstrationPersonId, seedPeople } from './demonstration-people';
import { seedPolicies } from './demonstration-policies';

/** What a surgery center of a few cases a day packs. */
const surgeryCenterCodes = [
  'P-01',
  'P-02',
  'P-03',
  'P-04',
  'P-05',
  'P-06',
  'P-07',
  'P-08',
  'W-01',
  'W-02',
  'C-01',
  'PCD-01',
];

/** Lays out the whole demonstration around the given instant, which becomes its today. All of it or nothing. */
export async function seedDemonstration(db: Knex, now: Date): Promise<void> {
  await db.transaction(async (trx) => {
    await seedFacilities(trx, now);
    await seedPeople(trx, now);
    await seedCatalogue(trx, { facilityId: hospitalId });
    await seedCatalogue(trx, { facilityId: surgeryCenterId, codes: surgeryCenterCodes });
    await seedEquipment(trx, { facilityId: hospitalId });
    await seedSurgeryCenterEquipment(trx, { facilityId: surgeryCenterId });
    await seedPolicies(trx, now);
    await seedMorningTests(trx, { facilityId: hospitalId, now, readBy: demonstrationPersonId('LM') });
    await seedPackages(trx, now);
  });
}
