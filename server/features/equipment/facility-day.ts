import { productionDay } from '#domain/time/production-day';
import type { Db, Transaction } from '../../platform/db';

export type FacilityDay = { readonly day: string; readonly timeZone: string };

/** The facility's day at an instant, by its own midnight rule: what "of the day" means for a test. */
export async function facilityDay(trx: Transaction | Db, facilityId: string, at: Date): Promise<FacilityDay> {
  const row = await trx('facilities').where('facilities.id', facilityId).first<
    | {
        readonly time_zone: string;
        readonly day_rule: 'calendar-day' | 'production-day';
        readonly production_day_starts_at: string;
      }
    | undefined
  >('facilities.time_zone', 'facilities.day_rule', 'facilities.production_day_starts_at');
  if (!row) throw new Error('the session names a facility that is not there');
  const startsAt = row.day_rule === 'calendar-day' ? '00:00' : row.production_day_starts_at;
  return { day: productionDay(at.toISOString(), row.time_zone, startsAt), timeZone: row.time_zone };
}
