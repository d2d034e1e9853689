import { condensatePerKg } from '#domain/steam/condensate';
import { celsius } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

describe('water that hot metal leaves', () => {
  // m c dT / L, worked out apart from the code: 10 kg from 20 to 134 °C with 2162.04 kJ/kg.
  it.each([
    ['stainless-steel', 0.26364],
    ['aluminium', 0.47297],
    ['titanium', 0.27418],
  ] as const)('of 10 kg of %s at 134 °C is %d kg', (metal, expected) => {
    expect(10 * condensatePerKg({ startC: celsius(20), cycleC: celsius(134) })[metal]).toBeCloseTo(expected, 4);
  });

  it('of a 15 lb tray from 70 to 270 °F is about three quarters of a US cup', () => {
    // Published rule of thumb "about a cup"; the formula gives 0.1744 kg, a US cup holds 0.2366 kg of water.
    const perKg = condensatePerKg({ startC: celsius(21.111), cycleC: celsius(132.222) })['stainless-steel'];
    expect((6.80389 * perKg) / 0.2366).toBeCloseTo(0.74, 2);
  });

  it('is none where the metal is as warm as the steam', () => {
    expect(condensatePerKg({ startC: celsius(140), cycleC: celsius(134) }).titanium).toBe(0);
  });
});
