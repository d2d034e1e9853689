import type { LoadEdit } from '#domain/load/finding';
import type { CatalogueItem, LoadView, Placement } from '#domain/load/model';
import type { Quantity } from '#domain/units/quantity';
import { z } from 'zod';
import { dateSchema, idSchema, instantSchema } from './common';

/** A finite number that becomes a quantity of the named unit. */
function quantity<Unit extends string>(_unit: Unit, check: z.ZodNumber = z.number()) {
  return check.transform((value) => value as Quantity<Unit>);
}

export const lengthSchema = quantity('mm', z.number().min(0).max(10_000));
/** A position: may be a little outside of its shelf, which is then a finding. */
export const positionSchema = quantity('mm', z.number().min(-5_000).max(10_000));
export const massSchema = quantity('kg', z.number().min(0).max(1_000));
export const temperatureSchema = quantity('degC', z.number().min(0).max(200));
export const durationSchema = quantity('s', z.number().int().min(0).max(360_000));

export const poseSchema = z.enum(['flat', 'on-edge', 'tilted']);
export const paperSchema = z.enum(['left', 'right', 'up', 'down']);
export const turnSchema = z.union([z.literal(0), z.literal(90)]);
export const cycleTypeSchema = z.enum(['dynamic-air-removal', 'gravity', 'immediate-use']);

const freePlacement = {
  xMm: positionSchema,
  yMm: positionSchema,
  turn: turnSchema,
  pose: poseSchema,
  paper: paperSchema.nullable(),
};

export const placementSchema: z.ZodType<Placement> = z.discriminatedUnion('at', [
  z.strictObject({ at: z.literal('shelf'), shelfId: idSchema, ...freePlacement }),
  z.strictObject({
    at: z.literal('slot'),
    holderId: idSchema,
    slot: z.number().int().min(1).max(200),
    pose: poseSchema,
    paper: paperSchema.nullable(),
  }),
  z.strictObject({ at: z.literal('basket'), holderId: idSchema, ...freePlacement }),
  z.strictObject({ at: z.literal('package'), belowPackageId: idSchema, ...freePlacement }),
]);

export const loadEditSchema: z.ZodType<LoadEdit> = z.discriminatedUnion('edit', [
  z.strictObject({ edit: z.literal('place'), packageId: idSchema, placement: placementSchema }),
  z.strictObject({ edit: z.literal('turn-paper'), packageId: idSchema, paper: paperSchema }),
  z.strictObject({ edit: z.literal('set-pose'), packageId: idSchema, pose: poseSchema }),
  z.strictObject({ edit: z.literal('take-off'), packageId: idSchema }),
  z.strictObject({
    edit: z.literal('place-holder'),
    holderId: idSchema,
    shelfId: idSchema,
    xMm: positionSchema,
    yMm: positionSchema,
    turn: turnSchema,
  }),
  z.strictObject({ edit: z.literal('take-holder-off'), holderId: idSchema }),
  z.strictObject({ edit: z.literal('change-program'), programId: idSchema }),
]);

export const cycleNeedSchema = z.object({
  type: cycleTypeSchema,
  temperatureC: temperatureSchema,
  leastExposureS: durationSchema,
  greatestExposureS: durationSchema.nullable(),
  leastDryS: durationSchema,
});

export const filterZoneSchema = z.object({
  face: z.enum(['lid', 'base']),
  xMm: lengthSchema,
  yMm: lengthSchema,
  lengthMm: lengthSchema,
  widthMm: lengthSchema,
});

export const catalogueItemSchema: z.ZodType<CatalogueItem> = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  kind: z.enum(['pouch', 'rigid-container', 'wrapped-tray', 'basin', 'textile-pack', 'challenge-device']),
  packaging: z.enum(['paper-film-pouch', 'double-pouch', 'wrap', 'rigid-container', 'none']),
  lengthMm: lengthSchema,
  widthMm: lengthSchema,
  heightMm: lengthSchema,
  massKg: massSchema,
  metalMassKg: massSchema,
  textileMassKg: massSchema,
  metal: z.enum(['stainless-steel', 'aluminium', 'titanium']),
  isImplant: z.boolean(),
  pose: poseSchema,
  isPerforated: z.boolean(),
  clearanceMm: lengthSchema.nullable(),
  standsOn: z.array(z.string()),
  greatestStackHeightMm: lengthSchema.nullable(),
  filterZones: z.array(filterZoneSchema),
  cycleNeeds: z.array(cycleNeedSchema),
  preferredHolder: z.string().nullable(),
  facing: z.enum(['one-way', 'alternating']).nullable(),
  massLimitKg: massSchema.nullable(),
  ifuReference: z.string().nullable(),
  isRetired: z.boolean(),
});

export const packageStateSchema = z.enum([
  'packed',
  'staged',
  'in-load',
  'processed',
  'sterile',
  'quarantined',
  'stored',
  'on-case-cart',
  'used',
  'returned',
  'recalled',
  'discarded',
]);

export const loadPackageSchema = z.object({
  packageId: idSchema,
  code: z.string(),
  itemId: idSchema,
  isScanned: z.boolean(),
  placement: placementSchema.nullable(),
  state: packageStateSchema,
  heldReason: z.string().nullable(),
  expiresOn: dateSchema.nullable(),
  hasExternalIndicator: z.boolean(),
  hasInternalIndicator: z.boolean(),
});

export const holderKindViewSchema = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  form: z.enum(['rack', 'basket', 'wedge', 'spacer']),
  slots: z.number().int().nullable(),
  pitchMm: lengthSchema.nullable(),
  greatestHeightMm: lengthSchema.nullable(),
  greatestLengthMm: lengthSchema.nullable(),
  greatestThicknessMm: lengthSchema.nullable(),
  acrossMm: lengthSchema,
  alongMm: lengthSchema,
  massKg: massSchema,
});

export const loadHolderSchema = z.object({
  holderId: idSchema,
  name: z.string(),
  placeCode: z.string(),
  kindId: idSchema,
  shelfId: idSchema,
  xMm: positionSchema,
  yMm: positionSchema,
  turn: turnSchema,
});

export const shelfSchema = z.object({
  id: idSchema,
  level: z.number().int(),
  name: z.string(),
  placeCode: z.string(),
  widthMm: lengthSchema,
  depthMm: lengthSchema,
  clearHeightMm: lengthSchema,
  surface: z.enum(['wire', 'solid']),
  greatestMassKg: massSchema,
  isUsable: z.boolean(),
});

export const cartViewSchema = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  shelves: z.array(shelfSchema).readonly(),
});

export const sterilizerViewSchema = z.object({
  id: idSchema,
  code: z.string(),
  number: z.string(),
  name: z.string(),
  chamberWidthMm: lengthSchema,
  chamberDepthMm: lengthSchema,
  chamberHeightMm: lengthSchema,
  drainXMm: positionSchema,
  drainYMm: positionSchema,
  greatestLoadMassKg: massSchema,
  needsAirRemovalTest: z.boolean(),
  serviceState: z.enum(['in-service', 'out-of-service', 'awaiting-requalification']),
});

export const programViewSchema = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  type: cycleTypeSchema,
  temperatureC: temperatureSchema,
  exposureS: durationSchema,
  dryS: durationSchema,
  greatestLoadMassKg: massSchema.nullable(),
});

export const acceptanceSchema = z.object({ findingKey: z.string(), ruleId: z.string(), reason: z.string() });

export const loadViewSchema: z.ZodType<LoadView> = z.object({
  loadId: idSchema,
  sterilizer: sterilizerViewSchema,
  program: programViewSchema,
  qualifiedPrograms: z.array(programViewSchema),
  cart: cartViewSchema,
  holders: z.array(loadHolderSchema),
  holderKinds: z.array(holderKindViewSchema),
  items: z.array(catalogueItemSchema),
  packages: z.array(loadPackageSchema),
  counts: z.array(z.object({ shelfId: idSchema, counted: z.number().int() })),
  acceptances: z.array(acceptanceSchema),
  airRemoval: z.object({ result: z.enum(['passed', 'failed']), testedAt: instantSchema }).nullable(),
  today: dateSchema,
});
