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
    expect(Math.abs(latentHeat(celsius(temperature)) - expected)).toBeLessThan(0.01);
  });

  it('falls with the temperature, and stays at the ends of what a sterilizer can do', () => {
    expect(latentHeat(celsius(133))).toBeGreaterThan(latentHeat(celsius(134)));
    expect(latentHeat(celsius(-300))).toBe(latentHeat(celsius(50)));
    expect(latentHeat(celsius(900))).toBe(latentHeat(celsius(200)));
  });
});
