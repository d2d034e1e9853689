import { celsius, kg, kilogramsPerMinute, seconds } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

/** 10 kg and 5 kg of steel: 15 × 0.5 × 112 / 2167.89 = 0.38747 kg of water at 132 °C from 20 °C; two thirds of it below. */
const load = aLoad()
  .withItemChanged('C-01', { metalMassKg: kg(10) })
  .withItemChanged('W-03', { metalMassKg: kg(5) })
  .withPackage('C-01', onLower(0, 0))
  .withPackage('W-03', onUpper(0, 0));

const drying = (kgPerMinute: number) => ({ waterPerDryMinute: kilogramsPerMinute(kgPerMinute) });

describe('the load can dry', () => {
  it('says nothing where the drying time is reckoned to be enough', () => {
    expect(titlesOf('water', load)).toEqual([]);
    // 30 minutes of 0.01292 kg are 0.3876 kg.
    expect(titlesOf('water', load, drying(0.01292))).toEqual([]);
  });

  it('is worth a note beyond, with its arithmetic and the wettest shelf', () => {
    const [finding] = findingsOf('water', load, drying(0.01));
    expect(finding).toMatchObject({
      severity: 'advice',
      title: '15.0 kg of metal will leave about 0.39 kg of water, 30 min of drying is reckoned to remove 0.30 kg',
      places: [{ on: 'load' }, { on: 'shelf', shelfId: 'lower' }],
    });
    expect(finding?.figure?.measured).toBeCloseTo(0.38747, 4);
    expect(finding?.reason).toContain('Lower shelf (0.26 kg)');
    expect(finding?.reason).toContain('15.0 kg steel × 0.50 kJ/kgK × 112 K ÷ 2168 kJ/kg = 0.39 kg');
    expect(finding?.reason).toContain('30 min × 0.01 kg of water a minute = 0.30 kg');
  });

  it('adds up different metals, the heaviest first', () => {
    // 5 × 0.897 × 112 / 2167.89 = 0.2317 and 10 kg of steel 0.2583.
    const mixed = load.withItemChanged('W-03', { metal: 'aluminium' });
    const [finding] = findingsOf('water', mixed, drying(0.01));
    expect(finding?.reason).toContain(
      '(10.0 kg steel × 0.50 kJ/kgK + 5.0 kg aluminium × 0.897 kJ/kgK) × 112 K ÷ 2168 kJ/kg = 0.49 kg',
    );
  });

  it('takes a longer drying program where one is enough', () => {
    expect(fixesOf('water', load, drying(0.01))).toEqual(['Change the program to W4-40']);
    expect(fixesOf('water', load, drying(0.005))).toEqual([null]);
  });

  it('counts from the temperature the load has when it goes in', () => {
    const warm = { ...drying(0.01), startTemperatureC: celsius(60) };
    // 15 × 0.5 × 72 / 2167.89 = 0.249
    expect(titlesOf('water', load, warm)).toEqual([]);
  });

  it('any metal is too much for a program that does not dry', () => {
    const wet = load.with({ program: { ...load.build().program, dryS: seconds(0) } });
    expect(titlesOf('water', wet)).toHaveLength(1);
  });
});
