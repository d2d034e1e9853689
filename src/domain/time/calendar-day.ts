import { wallClock } from './wall-clock';

const dayMs = 86_400_000;

/**
 * The calendar day, YYYY-MM-DD, on the wall calendar of a time zone at an instant.
 * @param instant ISO 8601 instant in UTC, with Z.
 * @param timeZone name from the IANA time zone database.
 */
export function calendarDay(instant: string, timeZone: string): string {
  return wallClock(instant, timeZone).day;
}

/** The calendar day so many days later, or earlier when negative. */
export function addDays(day: string, days: number): string {
  return new Date(midnightUtc(day) + days * dayMs).toISOString().slice(0, 10);
}

/** Day of the year, 1 January being 1: the DDD of an ordinal date (ISO 8601:2000, 5.2.2). */
export function ordinalDay(day: string): number {
  return (midnightUtc(day) - midnightUtc(`${day.slice(0, 4)}-01-01`)) / dayMs + 1;
}

/** A calendar day counted as if in UTC, where every day has 24 hours: clock changes cannot enter day arithmetic. */
function midnightUtc(day: string): number {
  const ms = Date.parse(`${day}T00:00:00Z`);
  // Date.parse takes 30 February for 2 March.
  if (Number.isNaN(ms) || new Date(ms).toISOString().slice(0, 10) !== day) {
    throw new RangeError(`Not a calendar day: ${day}`);
  }
  return ms;
}
