import type { Metal } from '../load/model';
import type { Celsius } from '../units/quantity';
import { latentHeat } from './latent-heat';

/** Specific heat in kJ/kgK: austenitic stainless steel, aluminium, titanium. Data handbooks, read. */
export const specificHeat: Readonly<Record<Metal, number>> = {
  'stainless-steel': 0.5,
  aluminium: 0.897,
  titanium: 0.52,
};

export type Heating = {
  readonly startC: Celsius;
  readonly cycleC: Celsius;
};

/**
 * Water in kg that steam leaves on each kg of a metal while it heats it: c dT / L, with the latent heat at the cycle's
 * temperature. Air, wraps and heat lost to the chamber are left out, so it is the least there is.
 */
export function condensatePerKg({ startC, cycleC }: Heating): Readonly<Record<Metal, number>> {
  const perHeat = Math.max(cycleC - startC, 0) / latentHeat(cycleC);
  return {
    'stainless-steel': specificHeat['stainless-steel'] * perHeat,
    aluminium: specificHeat.aluminium * perHeat,
    titanium: specificHeat.titanium * perHeat,
  };
}
