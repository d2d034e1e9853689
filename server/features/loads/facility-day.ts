import { productionDay } from '#domain/time/production-day';
import type { Db, Transaction } from '../../platform/db';

export type FacilityFacts = {
  readonly id: string;
  readonly name: string;
  readonly timeZone: string;
  readonly loadNumberPattern: string;
  /** The facility's day at the asked instant, by its own midnight rule. */
  readonly day: string;
};

/** What the facility calls today: calendar day or production day, as it has settled. */
export async function facilityAt(db: Db | Transaction, facilityId: string, at: Date): Promise<FacilityFacts> {
  const row = await db('facilities').where({ id: facilityId }).first<
    | {
        id: string;
        name: string;
        time_zone: string;
        load_number_pattern: string;
        day_rule: 'calendar-day' | 'production-day';
        production_day_starts_at: string;
      }
    | undefined
  >('id', 'name', 'time_zone', 'load_number_pattern', 'day_rule', 'production_day_starts_at');
  if (!row) throw new Error('the session names a facility that is not there');
  const dayStartsAt = row.day_rule === 'calendar-day' ? '00:00' : row.production_day_starts_at;
  return {
    id: row.id,
    name: row.name,
    timeZone: row.time_zone,
    loadNumberPattern: row.load_number_pattern,
    day: productionDay(at.toISOString(), row.time_zone, dayStartsAt),
  };
}
