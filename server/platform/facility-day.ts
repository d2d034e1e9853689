import { productionDay } from '#domain/time/production-day';
import type { Shift } from '#domain/today/shift-at';
import { z } from 'zod';
import type { Db, Transaction } from './db';

const shiftSchema = z.object({ name: z.string(), startsAt: z.string(), endsAt: z.string() });

export type FacilityDay = {
  readonly name: string;
  readonly timeZone: string;
  readonly loadNumberPattern: string;
  readonly shifts: readonly Shift[];
  /** The facility's day at the asked instant, by its own midnight rule, YYYY-MM-DD. */
  readonly day: string;
};

type FacilityRow = {
  readonly name: string;
  readonly time_zone: string;
  readonly load_number_pattern: string;
  readonly day_rule: 'calendar-day' | 'production-day';
  readonly production_day_starts_at: string;
  readonly shifts: unknown;
};

/** What the facility calls today, how it numbers its loads, and when its people work. */
export async function facilityDay(trx: Transaction | Db, facilityId: string, at: Date): Promise<FacilityDay> {
  const row = await trx('facilities')
    .where({ id: facilityId })
    .first<FacilityRow | undefined>(
      'name',
      'time_zone',
      'load_number_pattern',
      'day_rule',
      'production_day_starts_at',
      'shifts',
    );
  if (!row) throw new Error('the session names a facility that is not there');
  const dayStartsAt = row.day_rule === 'calendar-day' ? '00:00' : row.production_day_starts_at;
  return {
    name: row.name,
    timeZone: row.time_zone,
    loadNumberPattern: row.load_number_pattern,
    shifts: z.array(shiftSchema).parse(row.shifts),
    day: productionDay(at.toISOString(), row.time_zone, dayStartsAt),
  };
}
