import { latentHeat } from '#domain/steam/latent-heat';
import { celsius } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

describe('latent heat of saturated steam', () => {
  // IAPWS-IF97 regions 1 and 2 on the saturation line, computed with the open-source iapws package.
  it.each([
    [100, 2256.47],
    [121, 2199.35],
    [132, 2167.89],
    [134, 2162.04],
    [135, 2159.1],
    [137, 2153.19],
  ])('at %d °C is %d kJ/kg', (temperature, expected) => {
    expect(latentHeat(celsius(temperature))).toBeCloseTo(expected, 2);
  });

  it('between the rows lies between their values, on a straight line', () => {
    expect(latentHeat(celsius(133))).toBeCloseTo((2167.89 + 2162.04) / 2, 6);
  });

  it('beyond the table stays at its end, and for no number too', () => {
    expect(latentHeat(celsius(20))).toBe(2256.47);
    expect(latentHeat(celsius(200))).toBe(2153.19);
    expect(latentHeat(celsius(NaN))).toBe(2153.19);
  });
});
