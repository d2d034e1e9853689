import { describe, expect, it } from 'vitest';
import { timeOfText, wantedAtOf, wantedDays } from '../../../src/features/runs/wanted-at';

describe('a time of day as people type it', () => {
  it.each([
    ['14:30', '14:30'],
    ['1430', '14:30'],
    ['9.05', '09:05'],
    ['0:00', '00:00'],
    [' 23 59 ', '23:59'],
  ])('%j is %s', (text, time) => {
    expect(timeOfText(text)).toBe(time);
  });

  it.each(['', '24:00', '14:60', '14', '2:3', 'noon', '14:30:00', '-1:30'])('%j is none', (text) => {
    expect(timeOfText(text)).toBeNull();
  });
});

describe('the instant a wall clock shows it next', () => {
  const chicago = 'America/Chicago';

  it('is later today', () => {
    // 07:30 in Chicago, which is six hours behind Greenwich in winter.
    expect(wantedAtOf('14:30', new Date('2026-03-03T13:30:00Z'), chicago)).toBe('2026-03-03T20:30:00.000Z');
  });

  it('is tomorrow when it is past', () => {
    expect(wantedAtOf('06:00', new Date('2026-03-03T13:30:00Z'), chicago)).toBe('2026-03-04T12:00:00.000Z');
  });

  it('is now, not in 24 hours, when it is this very minute', () => {
    expect(wantedAtOf('07:30', new Date('2026-03-03T13:30:40Z'), chicago)).toBe('2026-03-03T13:30:00.000Z');
  });

  it('keeps to the wall clock over the night the clocks go forward', () => {
    // 22:00 on 7 March; on the 8th Chicago goes to five hours behind Greenwich.
    expect(wantedAtOf('06:00', new Date('2026-03-08T04:00:00Z'), chicago)).toBe('2026-03-08T11:00:00.000Z');
  });

  it('keeps to the wall clock over the night they go back', () => {
    // 22:00 on 31 October 2026; on 1 November Chicago goes to six hours behind.
    expect(wantedAtOf('06:00', new Date('2026-11-01T03:00:00Z'), chicago)).toBe('2026-11-01T12:00:00.000Z');
  });

  it('is tomorrow also on the day of 25 hours', () => {
    // 00:30 on 1 November 2026: 24 hours later it is still that day.
    expect(wantedAtOf('00:15', new Date('2026-11-01T05:30:00Z'), chicago)).toBe('2026-11-02T06:15:00.000Z');
  });

  it('is an instant also when the clocks skip that time', () => {
    const at = Date.parse(wantedAtOf('02:30', new Date('2026-03-08T06:00:00Z'), chicago));
    expect(at).toBeGreaterThanOrEqual(Date.parse('2026-03-08T07:30:00Z'));
    expect(at).toBeLessThanOrEqual(Date.parse('2026-03-08T08:30:00Z'));
  });

  it('knows zones with half hours', () => {
    expect(wantedAtOf('12:00', new Date('2026-03-03T00:00:00Z'), 'Asia/Kolkata')).toBe('2026-03-03T06:30:00.000Z');
  });
});

describe('the days a run may be wanted for', () => {
  // 23:30 on Tuesday 3 March in Chicago; in Greenwich it is the 4th.
  const now = new Date('2026-03-04T05:30:00Z');

  it('are today and the week after it, by the wall calendar', () => {
    const days = wantedDays(null, now, 'America/Chicago');
    expect(days).toHaveLength(8);
    expect(days.slice(0, 3)).toEqual([
      { value: '2026-03-03', label: 'Today' },
      { value: '2026-03-04', label: 'Tomorrow' },
      { value: '2026-03-05', label: 'Thursday 5 March' },
    ]);
  });

  it('hold the day it is wanted for, also when that is past', () => {
    expect(wantedDays('2026-03-02T20:00:00Z', now, 'America/Chicago')[0]).toEqual({
      value: '2026-03-02',
      label: 'Monday 2 March',
    });
  });
});
