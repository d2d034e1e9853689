import { elapsedSeconds, isTimeZone, wallClock } from '#domain/time/wall-clock';
import { describe, expect, it } from 'vitest';

const chicago = 'America/Chicago';

describe('wallClock', () => {
  it('skips from 02:00 to 03:00 where Chicago sets its clocks forward on 8 March 2026', () => {
    // IANA time zone database: Chicago goes from UTC-6 to UTC-5 on the second Sunday of March at 02:00.
    expect(wallClock('2026-03-08T07:59:59Z', chicago)).toEqual({ day: '2026-03-08', time: '01:59:59' });
    expect(wallClock('2026-03-08T08:00:00Z', chicago)).toEqual({ day: '2026-03-08', time: '03:00:00' });
  });

  it('shows 01:30 twice where Chicago sets its clocks back on 1 November 2026', () => {
    expect(wallClock('2026-11-01T06:30:00Z', chicago)).toEqual({ day: '2026-11-01', time: '01:30:00' });
    expect(wallClock('2026-11-01T07:30:00Z', chicago)).toEqual({ day: '2026-11-01', time: '01:30:00' });
  });

  it('writes midnight as 00:00 of the new day', () => {
    expect(wallClock('2026-03-02T06:00:00Z', chicago)).toEqual({ day: '2026-03-02', time: '00:00:00' });
  });

  it('knows zones with odd offsets', () => {
    // Nepal is 5 h 45 min ahead of UTC (IANA time zone database).
    expect(wallClock('2026-03-17T18:15:00Z', 'Asia/Kathmandu')).toEqual({ day: '2026-03-18', time: '00:00:00' });
  });

  it('throws for an instant nobody can read', () => {
    expect(() => wallClock('yesterday', chicago)).toThrow(RangeError);
  });
});

describe('elapsedSeconds', () => {
  it('gives 75 minutes for a load from 01:20 to 03:35 across the clock change of 8 March 2026', () => {
    const start = '2026-03-08T07:20:00Z';
    const end = '2026-03-08T08:35:00Z';
    expect(wallClock(start, chicago)).toEqual({ day: '2026-03-08', time: '01:20:00' });
    expect(wallClock(end, chicago)).toEqual({ day: '2026-03-08', time: '03:35:00' });
    expect(elapsedSeconds(start, end)).toBe(75 * 60);
  });

  it('is negative when the second instant comes first', () => {
    expect(elapsedSeconds('2026-03-08T08:00:01Z', '2026-03-08T08:00:00Z')).toBe(-1);
  });
});

describe('isTimeZone', () => {
  it('tells a zone of the time zone database from any other word', () => {
    expect(isTimeZone('America/Chicago')).toBe(true);
    expect(isTimeZone('UTC')).toBe(true);
    expect(isTimeZone('Tarnquill')).toBe(false);
    expect(isTimeZone('')).toBe(false);
  });
});
