import { addDays } from '#domain/time/calendar-day';
import { dayOf, formatTime } from '../../lib/format';

const minuteMs = 60_000;

/** A time of day as people type it, "14:30", "9.05" or "1430", as HH:MM; null for what is none. */
export function timeOfText(text: string): string | null {
  const [, hour, minute] = /^([01]?\d|2[0-3])[:. ]?([0-5]\d)$/.exec(text.trim()) ?? [];
  return hour === undefined || minute === undefined ? null : `${hour.padStart(2, '0')}:${minute}`;
}

/** What a wall clock in that zone shows, counted as if it stood in Greenwich. */
function wallMs(at: Date, timeZone: string): number {
  return Date.parse(`${dayOf(at, timeZone)}T${formatTime(at, timeZone)}:00Z`);
}

/**
 * The next instant at which a wall clock in the zone shows this time: later today, or tomorrow when it is past.
 * A time that the clocks skip on the day they go forward is taken as the one an hour later.
 * @param time HH:MM
 * @returns an ISO instant
 */
export function wantedAtOf(time: string, now: Date, timeZone: string): string {
  const onDay = (day: string) => {
    const wanted = Date.parse(`${day}T${time}:00Z`);
    // Once for the zone's distance from Greenwich, once more where the clocks change in between.
    let at = new Date(wanted);
    for (let turn = 0; turn < 2; turn += 1) at = new Date(at.getTime() + wanted - wallMs(at, timeZone));
    return at;
  };
  const today = onDay(dayOf(now, timeZone));
  if (today.getTime() >= now.getTime() - minuteMs) return today.toISOString();
  return onDay(addDays(dayOf(now, timeZone), 1)).toISOString();
}
