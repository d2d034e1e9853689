import type { Celsius } from '../units/quantity';

/**
 * Latent heat of saturated steam in kJ/kg at temperatures in degrees C.
 * Source: IAPWS-IF97 regions 1 and 2 on the saturation line, computed with the open-source iapws package.
 * Between two rows a straight line is within 0.5 kJ/kg, which is far finer than the mass of any set is known.
 */
const table = [
  [100, 2256.47],
  [121, 2199.35],
  [132, 2167.89],
  [134, 2162.04],
  [135, 2159.1],
  [137, 2153.19],
] as const;

/** kJ/kg, from 100 to 137 degrees C; outside of that the value of the nearer end. */
export function latentHeat(temperatureC: Celsius): number {
  let [lowerT, lowerL]: readonly [number, number] = table[0];
  if (temperatureC <= lowerT) return lowerL;
  for (const [upperT, upperL] of table) {
    if (temperatureC <= upperT) {
      return lowerL + ((upperL - lowerL) * (temperatureC - lowerT)) / (upperT - lowerT);
    }
    [lowerT, lowerL] = [upperT, upperL];
  }
  return lowerL;
}
