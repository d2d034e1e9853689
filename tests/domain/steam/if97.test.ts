import { saturationPressureMPa, steamEnthalpy, waterEnthalpy } from '#domain/steam/if97';
import { describe, expect, it } from 'vitest';

function expectDigits(actual: number, expected: number, digits: number): void {
  expect(Number(actual.toPrecision(digits))).toBe(expected);
}

describe('IF97', () => {
  // IAPWS R7-97, Table 35: verification values of equation 30.
  it.each([
    [300, 0.00353658941],
    [500, 2.63889776],
    [600, 12.3443146],
  ])('has steam of %d K saturated at %d MPa', (temperature, expected) => {
    expectDigits(saturationPressureMPa(temperature), expected, 9);
  });

  // Computed from equation 30 by an independent program, in kPa.
  it.each([
    [100, 101.418],
    [110, 143.376],
    [121, 205.039],
    [134, 304.199],
    [137, 331.852],
  ])('has steam of %d °C saturated at %d kPa', (temperature, expected) => {
    expect(saturationPressureMPa(temperature + 273.15) * 1000).toBeCloseTo(expected, 3);
  });

  // IAPWS R7-97, Table 5: verification values of region 1.
  it.each([
    [300, 3, 115.331273],
    [300, 80, 184.142828],
    [500, 3, 975.542239],
  ])('gives water of %d K at %d MPa an enthalpy of %d kJ/kg', (temperature, pressure, expected) => {
    expectDigits(waterEnthalpy(temperature, pressure), expected, 9);
  });

  // IAPWS R7-97, Table 15: verification values of region 2.
  it.each([
    [300, 0.0035, 2549.91145],
    [700, 0.0035, 3335.68375],
    [700, 30, 2631.49474],
  ])('gives steam of %d K at %d MPa an enthalpy of %d kJ/kg', (temperature, pressure, expected) => {
    expectDigits(steamEnthalpy(temperature, pressure), expected, 9);
  });
});
