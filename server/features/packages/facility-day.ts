import { productionDay } from '#domain/time/production-day';
import type { Shift } from '#domain/today/shift-at';
import { z } from 'zod';
import type { Db, Transaction } from '../../platform/db';

const shiftSchema = z.object({ name: z.string(), startsAt: z.string(), endsAt: z.string() });

export type FacilityDay = {
  readonly name: string;
  readonly timeZone: string;
  readonly shifts: readonly Shift[];
  /** The facility's day at the asked instant, by its own midnight rule, YYYY-MM-DD. */
  readonly day: string;
};

/** What the facility calls today, and when its people work. */
export async function facilityDay(trx: Transaction | Db, facilityId: string, at: Date): Promise<FacilityDay> {
  const row = await trx('facilities').where({ id: facilityId }).first<
    | {
        name: string;
        time_zone: string;
        day_rule: 'calendar-day' | 'production-day';
        production_day_starts_at: string;
        shifts: unknown;
      }
    | undefined
  >('name', 'time_zone', 'day_rule', 'production_day_starts_at', 'shifts');
  if (!row) throw new Error('the session names a facility that is not there');
  const dayStartsAt = row.day_rule === 'calendar-day' ? '00:00' : row.production_day_starts_at;
  return {
    name: row.name,
    timeZone: row.time_zone,
    shifts: z.array(shiftSchema).parse(row.shifts),
    day: productionDay(at.toISOString(), row.time_zone, dayStartsAt),
  };
}
