/** Beyond these no package, shelf or chamber of the trade lies; a number beyond is a slip. Ours, no source. */
export const greatestSensibleLengthMm = 5_000;
export const greatestSensibleMassKg = 1_000;

export function isSensibleLength(lengthMm: number): boolean {
  return lengthMm > 0 && lengthMm <= greatestSensibleLengthMm;
}

export function isSensiblePosition(positionMm: number): boolean {
  return Math.abs(positionMm) <= 2 * greatestSensibleLengthMm;
}

export function isSensibleMass(massKg: number): boolean {
  return massKg >= 0 && massKg <= greatestSensibleMassKg;
}

/** No steam sterilizer works outside of these, in degrees C. Ours, no source. */
export function isSensibleTemperature(temperatureC: number): boolean {
  return temperatureC >= 100 && temperatureC <= 150;
}

/** From nothing to a day, in seconds. Ours, no source. */
export function isSensibleDuration(durationS: number): boolean {
  return durationS >= 0 && durationS <= 86_400;
}

/** For sums: a mass that makes no sense is a finding of its own and counts as nothing here. */
export function massOrNothing(massKg: number): number {
  return isSensibleMass(massKg) ? massKg : 0;
}
