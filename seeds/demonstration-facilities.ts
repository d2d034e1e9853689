import type { Knex } from 'knex';
import { defaultLoadNumberPattern } from '../src/domain/label/load-number';

/* Two invented facilities, so that it shows that neither sees anything of the other. */

/** Tarnquill Regional Hospital. */
export const hospitalId = '0198a000-0000-7000-8000-000000000001';
/** Quenby Vale Surgery Center. */
export const surgeryCenterId = '0198a000-0000-7000-8000-000000000002';

/** Days before the demonstration's today on which both were set up. */
export const setUpDaysAgo = 60;

export async function seedFacilities(trx: Knex.Transaction, now: Date): Promise<void> {
  const setUpAt = new Date(now.getTime() - setUpDaysAgo * 24 * 3_600_000);
  await trx('facilities').insert([
    {
      id: hospitalId,
      name: 'Tarnquill Regional Hospital',
      time_zone: 'America/Chicago',
      unit_system: 'metric',
      load_number_pattern: defaultLoadNumberPattern,
      day_rule: 'calendar-day',
      shifts: JSON.stringify([
        { name: 'Day', startsAt: '06:30', endsAt: '15:00' },
        { name: 'Evening', startsAt: '14:30', endsAt: '23:00' },
        { name: 'Night', startsAt: '22:30', endsAt: '07:00' },
      ]),
      created_at: setUpAt,
    },
    {
      id: surgeryCenterId,
      name: 'Quenby Vale Surgery Center',
      time_zone: 'America/New_York',
      unit_system: 'us-customary',
      load_number_pattern: defaultLoadNumberPattern,
      day_rule: 'production-day',
      production_day_starts_at: '06:00',
      shifts: JSON.stringify([{ name: 'Day', startsAt: '06:00', endsAt: '18:00' }]),
      created_at: setUpAt,
    },
  ]);
}
