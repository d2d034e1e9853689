import { policyParameters, type LoadPolicy, type QuantityParameter } from '#domain/load/policy';
import type { Quantity } from '#domain/units/quantity';
import { z } from 'zod';

function rangeOf(id: QuantityParameter['id']): QuantityParameter['range'] {
  const parameter = policyParameters.find((candidate) => candidate.id === id);
  if (parameter?.form !== 'quantity') throw new Error(`No range is known for ${id}`);
  return parameter.range;
}

function setting<Unit extends string>(id: QuantityParameter['id'], _unit: Unit) {
  const { least, greatest } = rangeOf(id);
  return z
    .number()
    .min(least, `At least ${least}.`)
    .max(greatest, `At most ${greatest}.`)
    .transform((value) => value as Quantity<Unit>);
}

export const loadPolicySchema: z.ZodType<LoadPolicy> = z.strictObject({
  facing: z.enum(['one-way', 'alternating', 'not-set']),
  challengeDevice: z.enum(['not-asked', 'implant-loads', 'every-load']),
  challengeDeviceMissing: z.enum(['stop', 'accept', 'advice']),
  challengeDeviceReachMm: setting('challengeDeviceReachMm', 'mm'),
  pouchGapMm: setting('pouchGapMm', 'mm'),
  greatestLeanDeg: setting('greatestLeanDeg', 'deg'),
  labelReadingGapMm: setting('labelReadingGapMm', 'mm'),
  packageClearanceMm: setting('packageClearanceMm', 'mm'),
  wallClearanceMm: setting('wallClearanceMm', 'mm'),
  headroomMm: setting('headroomMm', 'mm'),
  greatestShelfCoverPercent: setting('greatestShelfCoverPercent', '%'),
  greatestSetMassKg: setting('greatestSetMassKg', 'kg'),
  greatestTextilePackMassKg: setting('greatestTextilePackMassKg', 'kg'),
  greatestPouchMassKg: setting('greatestPouchMassKg', 'kg'),
  massMarginPercent: setting('massMarginPercent', '%'),
  metalOverTextileKg: setting('metalOverTextileKg', 'kg'),
  waterPerDryMinute: setting('waterPerDryMinute', 'kg/min'),
  startTemperatureC: setting('startTemperatureC', 'degC'),
});
