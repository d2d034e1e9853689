import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cycleTypes, readCycleNeeds, writeCycleNeeds } from '../../../src/domain/catalogue/cycle-need-text';
import { celsius, seconds } from '../../../src/domain/units/quantity';

describe('permitted cycles in a cell', () => {
  it('are read with and without a greatest exposure', () => {
    const text = 'dynamic-air-removal 132 C 240 s dry 1800 s | Gravity 121,1°C 1800 - 2700 s dry 0 s';
    expect(readCycleNeeds(text, 'point')).toEqual({
      ok: true,
      value: [
        {
          type: 'dynamic-air-removal',
          temperatureC: 132,
          leastExposureS: 240,
          greatestExposureS: null,
          leastDryS: 1800,
        },
        { type: 'gravity', temperatureC: 121.1, leastExposureS: 1800, greatestExposureS: 2700, leastDryS: 0 },
      ],
    });
  });

  it.each([
    'W4-30',
    'dynamic-air-removal 132 C 4 min dry 30 min',
    'dynamic-air-removal 132 240 1800',
    'vacuum 132 C 240 s dry 1800 s',
    'dynamic-air-removal 132 C 240 s dry 1800 s |',
    'dynamic-air-removal 132 C 240 s dry 1800 s; gravity 121 C 1800 s dry 0 s',
  ])('refuses “%s” and shows how to write it', (text) => {
    const read = readCycleNeeds(text, 'point');
    expect(read.ok || read.refusal.sentence).toContain('Write it like “dynamic-air-removal 132 C 240 s dry 1800 s”.');
  });

  it('come back from the file as they went out', () => {
    const need = fc.record({
      type: fc.constantFrom(...cycleTypes),
      temperatureC: fc.integer({ min: 1000, max: 1500 }).map((tenths) => celsius(tenths / 10)),
      leastExposureS: fc.nat(9_000).map(seconds),
      greatestExposureS: fc.option(fc.nat(9_000).map(seconds)),
      leastDryS: fc.nat(9_000).map(seconds),
    });
    fc.assert(
      fc.property(fc.array(need, { minLength: 1, maxLength: 4 }), (needs) => {
        expect(readCycleNeeds(writeCycleNeeds(needs), 'point')).toEqual({ ok: true, value: needs });
      }),
    );
  });
});
