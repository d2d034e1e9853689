import { addDays } from './calendar-day';
import { wallClock, type WallClock } from './wall-clock';

/** No clock change known to the time zone database since 1970 sets a clock back by more than this. From memory. */
const longestSetBackMs = 3 * 3_600_000;

/**
 * The production day an instant belongs to, named after the calendar day on which it starts: with a start of 06:30,
 * Sunday's night load of 01:20 still belongs to Saturday. A start of 00:00 gives the calendar day.
 *
 * When the clocks are set back and the start comes twice, the day starts at the first of the two, so that no instant
 * falls back into the day before. When the start is skipped, the day starts at the first moment after the gap.
 * @param instant ISO 8601 instant in UTC, with Z.
 * @param timeZone name from the IANA time zone database.
 * @param startsAt wall-clock time HH:MM.
 */
export function productionDay(instant: string, timeZone: string, startsAt: string): string {
  const now = wallClock(instant, timeZone);
  if (now.time >= `${startsAt}:00` || hasStartedBeforeClocksWentBack(instant, timeZone, startsAt, now)) return now.day;
  return addDays(now.day, -1);
}

function hasStartedBeforeClocksWentBack(instant: string, timeZone: string, startsAt: string, now: WallClock): boolean {
  const nowMs = new Date(instant).getTime();
  const earlierMs = nowMs - longestSetBackMs;
  const earlierOffsetMs = wallAsUtc(wallClock(new Date(earlierMs).toISOString(), timeZone)) - wholeSecond(earlierMs);
  const offsetMs = wallAsUtc(now) - wholeSecond(nowMs);
  if (earlierOffsetMs <= offsetMs) return false;
  const firstStartMs = wallAsUtc({ day: now.day, time: `${startsAt}:00` }) - earlierOffsetMs;
  return firstStartMs <= nowMs;
}

function wallAsUtc(clock: WallClock): number {
  return Date.parse(`${clock.day}T${clock.time}Z`);
}

function wholeSecond(ms: number): number {
  return Math.floor(ms / 1000) * 1000;
}
