/** What a clock on a wall in some time zone shows: a calendar day YYYY-MM-DD and a time HH:MM:SS, 24 hours. */
export type WallClock = { readonly day: string; readonly time: string };

/**
 * What the wall clock shows at an instant.
 * @param instant ISO 8601 instant in UTC, with Z.
 * @param timeZone name from the IANA time zone database, for example America/Chicago.
 * @throws RangeError for an unreadable instant or an unknown zone: both are parsed where they enter.
 */
export function wallClock(instant: string, timeZone: string): WallClock {
  // hourCycle h23, because with plain `hour12: false` midnight can read 24:00.
  const formatter = new Intl.DateTimeFormat('en-US', {
    calendar: 'gregory',
    numberingSystem: 'latn',
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  });
  const parts = new Map(formatter.formatToParts(new Date(instant)).map((part) => [part.type, part.value]));
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.get(type) ?? '';
  return {
    day: `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`,
    time: `${part('hour')}:${part('minute')}:${part('second')}`,
  };
}
