import { describe, expect, it } from 'vitest';
import { shiftAt } from '../../../src/domain/today/shift-at';

// The demonstration hospital's three shifts: they overlap by half an hour, and the night runs past midnight.
const shifts = [
  { name: 'Day', startsAt: '06:30', endsAt: '15:00' },
  { name: 'Evening', startsAt: '14:30', endsAt: '23:00' },
  { name: 'Night', startsAt: '22:30', endsAt: '07:00' },
];

describe('the shift that is on', () => {
  it.each([
    { time: '06:29', name: 'Night' },
    { time: '06:30', name: 'Day' },
    { time: '06:59', name: 'Day' },
    { time: '14:29', name: 'Day' },
    { time: '14:30', name: 'Evening' },
    { time: '22:29', name: 'Evening' },
    { time: '22:30', name: 'Night' },
    { time: '00:00', name: 'Night' },
    { time: '03:00', name: 'Night' },
  ])('is $name at $time', ({ time, name }) => {
    expect(shiftAt(shifts, time)?.name).toBe(name);
    expect(shiftAt([...shifts].reverse(), time)?.name).toBe(name);
  });

  it('is none where nobody works', () => {
    expect(shiftAt(shifts.slice(0, 1), '15:00')).toBeNull();
    expect(shiftAt([], '12:00')).toBeNull();
  });
});
