import type { Millimetre } from '../units/quantity';

/** Beyond these no package, shelf or chamber of the trade lies; a number beyond is a slip. Ours, no source. */
export const greatestSensibleLengthMm = 5_000;
export const greatestSensibleMassKg = 1_000;

export function isSensibleLength(lengthMm: Millimetre): boolean {
  return lengthMm > 0 && lengthMm <= greatestSensibleLengthMm;
}

export function isSensiblePosition(positionMm: Millimetre): boolean {
  return Math.abs(positionMm) <= 2 * greatestSensibleLengthMm;
}

export function isSensibleMass(massKg: number): boolean {
  return massKg >= 0 && massKg <= greatestSensibleMassKg;
}

/** For sums: a mass that makes no sense is a finding of its own and counts as nothing here. */
export function massOrNothing(massKg: number): number {
  return isSensibleMass(massKg) ? massKg : 0;
}
