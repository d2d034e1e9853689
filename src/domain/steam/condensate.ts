import type { Metal } from '../load/model';
import { kg, type Celsius, type Kilogram } from '../units/quantity';
import { latentHeat } from './latent-heat';

/** Specific heat in kJ/kgK: austenitic stainless steel, aluminium, titanium. Data handbooks, read. */
const specificHeat: Readonly<Record<Metal, number>> = { 'stainless-steel': 0.5, aluminium: 0.897, titanium: 0.52 };

/**
 * Water in kg that steam leaves while it heats this metal: m c dT / L, with the latent heat at the cycle's temperature.
 * Air, wraps and heat lost to the chamber are left out, so it is the least there is.
 */
export function condensateOf(
  metal: Metal,
  metalMassKg: Kilogram,
  from: { readonly startC: Celsius; readonly cycleC: Celsius },
): Kilogram {
  const rise = Math.max(from.cycleC - from.startC, 0);
  return kg((metalMassKg * specificHeat[metal] * rise) / latentHeat(from.cycleC));
}
