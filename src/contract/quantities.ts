import type { Quantity } from '#domain/units/quantity';
import { z } from 'zod';

type Bounds = { readonly least: number; readonly greatest: number; readonly unit: string };

function bounded({ least, greatest, unit }: Bounds) {
  return z
    .number({ error: 'Please write a number.' })
    .min(least, `At least ${least} ${unit}.`.replace(' .', '.'))
    .max(greatest, `At most ${greatest} ${unit}.`.replace(' .', '.'));
}

/** A quantity as a person states it, with bounds that catch a wrong unit or a slipped digit. */
function stated<Unit extends string>(_unit: Unit, check: z.ZodNumber) {
  return check.transform((value) => value as Quantity<Unit>);
}

export const statedSizeSchema = stated('mm', bounded({ least: 1, greatest: 3_000, unit: 'mm' }));
export const statedDistanceSchema = stated('mm', bounded({ least: 0, greatest: 3_000, unit: 'mm' }));
export const statedPositionSchema = stated('mm', bounded({ least: -3_000, greatest: 3_000, unit: 'mm' }));
export const statedMassSchema = stated('kg', bounded({ least: 0.001, greatest: 500, unit: 'kg' }));
export const statedMassOrNoneSchema = stated('kg', bounded({ least: 0, greatest: 500, unit: 'kg' }));
/** Saturated steam above the pressure of the surroundings, and below what chambers are built for. */
export const statedTemperatureSchema = stated('degC', bounded({ least: 100, greatest: 150, unit: '°C' }));
export const statedDurationSchema = stated('s', wholeNumber({ least: 0, greatest: 86_400, unit: 's' }));
export const statedExposureSchema = stated('s', wholeNumber({ least: 1, greatest: 86_400, unit: 's' }));

function wholeNumber(bounds: Bounds) {
  return bounded(bounds).int('Please write a whole number.');
}

export function countSchema(least: number, greatest: number) {
  return wholeNumber({ least, greatest, unit: '' });
}
