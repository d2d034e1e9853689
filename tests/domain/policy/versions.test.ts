import { standingOf, versionInForce } from '#domain/policy/versions';
import { describe, expect, it } from 'vitest';

const first = { number: 1, effectiveOn: '2026-03-01', confirmedOn: '2026-03-01' };
const second = { number: 2, effectiveOn: '2026-03-20', confirmedOn: '2026-03-05' };
const third = { number: 3, effectiveOn: '2026-03-10', confirmedOn: '2026-03-08' };

describe('the version in force', () => {
  it('is the newest whose day has come, from the beginning of that day on', () => {
    expect(versionInForce([first, second], '2026-03-19')?.number).toBe(1);
    expect(versionInForce([first, second], '2026-03-20')?.number).toBe(2);
    expect(versionInForce([first, second], '2027-01-01')?.number).toBe(2);
  });

  it('is the newest of two that begin on one day, in whatever order they are read', () => {
    const again = { number: 3, effectiveOn: '2026-03-20' };
    expect(versionInForce([again, second, first], '2026-03-20')?.number).toBe(3);
    expect(versionInForce([first, second, again], '2026-03-20')?.number).toBe(3);
  });

  it('stays the newest when a planned one’s day comes after all', () => {
    expect(versionInForce([first, second, third], '2026-03-09')?.number).toBe(1);
    expect(versionInForce([first, second, third], '2026-03-10')?.number).toBe(3);
    expect(versionInForce([first, second, third], '2026-03-20')?.number).toBe(3);
  });

  it('is none before the first day', () => {
    expect(versionInForce([first], '2026-02-28')).toBeUndefined();
    expect(versionInForce<typeof first>([], '2026-03-01')).toBeUndefined();
  });
});

describe('how a version stands', () => {
  const standings = (versions: readonly (typeof first)[], today: string) =>
    versions.map((version) => standingOf(version, versions, today));

  it('is planned until its day, then in force until the next', () => {
    expect(standings([first, second], '2026-03-19')).toEqual(['in-force', 'planned']);
    expect(standings([first, second], '2026-03-20')).toEqual(['past', 'in-force']);
  });

  it('is overtaken where a newer one came before its day', () => {
    expect(standings([first, second, third], '2026-03-09')).toEqual(['in-force', 'overtaken', 'planned']);
    expect(standings([first, second, third], '2026-04-01')).toEqual(['past', 'overtaken', 'in-force']);
  });

  it('is past where it held for a part of the day on which the next came', () => {
    const sameDay = { number: 3, effectiveOn: '2026-03-20', confirmedOn: '2026-03-20' };
    expect(standings([first, second, sameDay], '2026-03-20')).toEqual(['past', 'past', 'in-force']);
  });
});
