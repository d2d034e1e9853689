import { describe, expect, it } from 'vitest';
import { cycleChanges } from '../../../src/domain/catalogue/cycle-change';
import { celsius, seconds } from '../../../src/domain/units/quantity';

const before = {
  type: 'dynamic-air-removal',
  temperatureC: celsius(132),
  exposureS: seconds(240),
  dryS: seconds(1200),
} as const;

describe('what makes the cycle of a program another one', () => {
  it('is nothing while all four are the same or not stated', () => {
    expect(cycleChanges(before, before)).toEqual([]);
    expect(cycleChanges(before, {})).toEqual([]);
    expect(cycleChanges(before, { dryS: seconds(1200) })).toEqual([]);
  });

  it.each([
    ['type', { type: 'gravity' }],
    ['temperatureC', { temperatureC: celsius(132.5) }],
    ['exposureS', { exposureS: seconds(241) }],
    ['dryS', { dryS: seconds(0) }],
  ] as const)('is its %s', (field, after) => {
    expect(cycleChanges(before, { ...before, ...after })).toEqual([field]);
  });

  it('names each of several', () => {
    expect(cycleChanges(before, { exposureS: seconds(180), dryS: seconds(960) })).toEqual(['exposureS', 'dryS']);
  });
});
