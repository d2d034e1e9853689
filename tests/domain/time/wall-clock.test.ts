import { wallClock } from '#domain/time/wall-clock';
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
