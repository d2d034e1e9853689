import { wallClock } from './wall-clock';

const dayMs = 86_400_000;

/** How far the wall clock of a zone is ahead of UTC at an instant, in milliseconds. */
function aheadMs(atMs: number, timeZone: string): number {
  const { day, time } = wallClock(new Date(atMs).toISOString(), timeZone);
  return Date.parse(`${day}T${time}Z`) - Math.floor(atMs / 1000) * 1000;
}

/**
 * The instant at which a clock on the wall shows this day and time. Where the clock is put back it shows some times twice:
 * this is the first. Where it is put forward it never shows some: this is as long after the change as the time is.
 * @param wall day YYYY-MM-DD and time HH:MM or HH:MM:SS.
 * @param timeZone name from the IANA time zone database.
 * @returns ISO 8601 instant in UTC, with Z.
 * @throws RangeError for what is no day, time or zone.
 */
export function instantAt(wall: { readonly day: string; readonly time: string }, timeZone: string): string {
  const asIfUtcMs = Date.parse(`${wall.day}T${wall.time}Z`);
  if (Number.isNaN(asIfUtcMs)) throw new RangeError(`Not a day and time: ${wall.day} ${wall.time}`);
  // No zone changes its clock twice within two days.
  const before = asIfUtcMs - aheadMs(asIfUtcMs - dayMs, timeZone);
  const after = asIfUtcMs - aheadMs(asIfUtcMs + dayMs, timeZone);
  const shown = [before, after]
    .filter((atMs) => atMs + aheadMs(atMs, timeZone) === asIfUtcMs)
    .sort((one, other) => one - other);
  return new Date(shown[0] ?? before).toISOString();
}
