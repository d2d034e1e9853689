import { fits, matchCycle } from '#domain/load/cycle-match';
import type { CycleNeed } from '#domain/load/model';
import { celsius, seconds } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad, aProgram, gravityProgram, nowhere, programs } from '../../support/load-builder';

const need: CycleNeed = {
  type: 'dynamic-air-removal',
  temperatureC: celsius(132),
  leastExposureS: seconds(240),
  greatestExposureS: seconds(600),
  leastDryS: seconds(1200),
};

describe('whether a program fits what instructions permit', () => {
  it.each([
    ['the same setting', {}, true],
    ['longer drying', { dryS: seconds(3000) }, true],
    ['shorter drying', { dryS: seconds(1199) }, false],
    ['the longest exposure permitted', { exposureS: seconds(600) }, true],
    ['a longer exposure', { exposureS: seconds(601) }, false],
    ['a shorter exposure', { exposureS: seconds(239) }, false],
    ['a hotter program', { temperatureC: celsius(134) }, false],
    ['another way to remove air', { type: 'gravity' }, false],
  ] as const)('%s', (_name, changes, expected) => {
    expect(fits(aProgram('X', { exposureS: seconds(240), dryS: seconds(1200), ...changes }), [need])).toBe(expected);
  });

  it('one of several permitted cycles is enough, and none is not', () => {
    const other = { ...need, temperatureC: celsius(134) };
    expect(fits(aProgram('X', {}), [other, need])).toBe(true);
    expect(fits(aProgram('X', {}), [])).toBe(false);
  });

  it('no upper end of the exposure means none', () => {
    expect(fits(aProgram('X', { exposureS: seconds(1e5) }), [{ ...need, greatestExposureS: null }])).toBe(true);
  });
});

function match(codes: readonly string[], qualified = programs) {
  let load = aLoad();
  for (const code of codes) load = load.withPackage(code, nowhere);
  const { packages, items } = load.build();
  const { fitting, matches } = matchCycle(packages, items, qualified);
  return {
    fitting: fitting.map((program) => program.code),
    least: matches.map(({ program, takeOut }) => [program.code, takeOut.map((one) => one.packageId)]),
  };
}

describe('programs for a load', () => {
  it('the longest drying that any package asks for wins, and no longer one comes before it', () => {
    expect(match(['W-03', 'W-01']).fitting).toEqual(['W4-30', 'W4-40', 'W4-50']);
    expect(match(['W-03', 'C-07', 'W-01']).fitting).toEqual(['W4-50']);
  });

  it('where none fits all, the fewest to take out come first with the program that buys', () => {
    const { fitting, least } = match(['C-13', 'W-01', 'W-03', 'C-01']);
    expect(fitting).toEqual([]);
    expect(least[0]).toEqual(['W4-30', ['C-13']]);
    expect(least.find(([code]) => code === 'P18-30')).toEqual(['P18-30', ['W-01', 'W-03', 'C-01']]);
  });

  it('gravity goods ride only where gravity is qualified', () => {
    expect(match(['G-01']).fitting).toEqual([]);
    expect(match(['G-01'], [...programs, gravityProgram]).fitting).toEqual(['G121-30']);
  });

  it('packages whose instructions name no cycle, or that nobody knows, are not judged', () => {
    expect(match(['PCD']).fitting).toHaveLength(programs.length);
    const { packages, programs: none } = { packages: [{ itemId: 'no such' }], programs };
    expect(matchCycle(packages as never, [], none).fitting).toHaveLength(programs.length);
  });

  it('have the smallest set to take out, as trying every set shows', () => {
    const codes = fc.array(fc.constantFrom('W-01', 'W-03', 'C-07', 'C-12', 'C-13', 'G-01'), {
      minLength: 1,
      maxLength: 6,
    });
    fc.assert(
      fc.property(codes, (some) => {
        let load = aLoad();
        for (const code of some) load = load.withPackage(code, nowhere);
        const { packages, items } = load.build();
        let smallest = packages.length;
        for (let mask = 0; mask < 2 ** packages.length; mask += 1) {
          const kept = packages.filter((_, index) => (mask & (1 << index)) !== 0);
          if (matchCycle(kept, items, programs).fitting.length > 0) {
            smallest = Math.min(smallest, packages.length - kept.length);
          }
        }
        expect(matchCycle(packages, items, programs).matches[0]?.takeOut.length).toBe(smallest);
      }),
      { numRuns: 40 },
    );
  });
});
