import { addDays } from '#domain/time/calendar-day';
import { instantAt } from '#domain/time/instant-at';
import { dayOf, formatWeekdayDate } from '../../lib/format';

const minuteMs = 60_000;

/** A time of day as people type it, "14:30", "9.05" or "1430", as HH:MM; null for what is none. */
export function timeOfText(text: string): string | null {
  const [, hour, minute] = /^([01]?\d|2[0-3])[:. ]?([0-5]\d)$/.exec(text.trim()) ?? [];
  return hour === undefined || minute === undefined ? null : `${hour.padStart(2, '0')}:${minute}`;
}

/**
 * The next instant at which a wall clock in the zone shows this time: later today, or tomorrow when it is past.
 * @param time HH:MM
 * @returns an ISO instant
 */
export function wantedAtOf(time: string, now: Date, timeZone: string): string {
  const today = dayOf(now, timeZone);
  const at = instantAt({ day: today, time }, timeZone);
  return isPast(at, now) ? instantAt({ day: addDays(today, 1), time }, timeZone) : at;
}

/** The minute that is on the clock now is not past. */
export function isPast(at: string, now: Date): boolean {
  return Date.parse(at) < now.getTime() - minuteMs;
}

/** As far ahead as a department plans its sterilizers. */
const daysAhead = 7;

/** Days a run may be wanted for: today, the week after it, and the day it is wanted for already. */
export function wantedDays(
  wantedAt: string | null,
  now: Date,
  timeZone: string,
): { readonly value: string; readonly label: string }[] {
  const today = dayOf(now, timeZone);
  const ahead = Array.from({ length: daysAhead + 1 }, (_, days) => addDays(today, days));
  const own = wantedAt === null ? today : dayOf(wantedAt, timeZone);
  const names = new Map([
    [today, 'Today'],
    [addDays(today, 1), 'Tomorrow'],
  ]);
  return [...new Set([...ahead, own])].sort().map((day) => ({
    value: day,
    label: names.get(day) ?? formatWeekdayDate(`${day}T12:00:00Z`, 'UTC'),
  }));
}
