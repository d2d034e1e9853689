import { cycleTypes } from '#domain/catalogue/cycle-need-text';
import { expiryRules, itemKinds, metals, packagings, poses, pouchFacings } from '#domain/catalogue/item-fields';
import { z } from 'zod';
import {
  codeSchema,
  lineSchema,
  listQuery,
  nameSchema,
  oneOf,
  pageOfList,
  versionSchema,
  yesNoSchema,
} from './catalogue-common';
import { idSchema, requestIdSchema, textSchema } from './common';
import {
  countSchema,
  statedDistanceSchema,
  statedDurationSchema,
  statedExposureSchema,
  statedMassOrNoneSchema,
  statedMassSchema,
  statedSizeSchema,
  statedTemperatureSchema,
} from './quantities';

export const itemCycleNeedSchema = z.strictObject({
  type: oneOf(cycleTypes),
  temperatureC: statedTemperatureSchema,
  leastExposureS: statedExposureSchema,
  greatestExposureS: statedExposureSchema.nullable(),
  leastDryS: statedDurationSchema,
});

export const itemFilterZoneSchema = z.strictObject({
  face: oneOf(['lid', 'base']),
  xMm: statedDistanceSchema,
  yMm: statedDistanceSchema,
  lengthMm: statedSizeSchema,
  widthMm: statedSizeSchema,
});

/** What a person states about an item. How the parts hold together is the core's to check. */
export const itemFieldsSchema = z.strictObject({
  code: codeSchema,
  name: nameSchema,
  kind: oneOf(itemKinds),
  packaging: oneOf(packagings),
  lengthMm: statedSizeSchema,
  widthMm: statedSizeSchema,
  heightMm: statedSizeSchema,
  massKg: statedMassSchema,
  metalMassKg: statedMassOrNoneSchema,
  textileMassKg: statedMassOrNoneSchema,
  metal: oneOf(metals),
  isImplant: yesNoSchema,
  pose: oneOf(poses),
  isPerforated: yesNoSchema,
  clearanceMm: statedDistanceSchema.nullable(),
  standsOn: z.array(codeSchema).max(100, 'At most 100 codes.'),
  greatestStackHeightMm: statedSizeSchema.nullable(),
  filterZones: z.array(itemFilterZoneSchema).max(8, 'At most 8 filters.'),
  cycleNeeds: z.array(itemCycleNeedSchema).max(12, 'At most 12 cycles.'),
  preferredHolder: codeSchema.nullable(),
  facing: oneOf(pouchFacings).nullable(),
  massLimitKg: statedMassSchema.nullable(),
  coolS: statedDurationSchema,
  expiryRule: oneOf(expiryRules),
  expiryDays: countSchema(1, 3_650).nullable(),
  deviceIdentifier: textSchema(40).nullable(),
  ifuReference: textSchema(80).nullable(),
  ifuRevision: textSchema(40).nullable(),
  service: lineSchema,
  note: lineSchema,
  isRetired: yesNoSchema,
});
export type ItemFieldsInput = z.input<typeof itemFieldsSchema>;

export const addItemRequestSchema = itemFieldsSchema.extend({ requestId: requestIdSchema });
export type AddItemRequest = z.input<typeof addItemRequestSchema>;

/** Absent means leave, null means clear. The code stays for good. */
export const changeItemRequestSchema = itemFieldsSchema
  .omit({ code: true })
  .partial()
  .extend({ requestId: requestIdSchema, version: versionSchema });
export type ChangeItemRequest = z.input<typeof changeItemRequestSchema>;

export const itemSchema = z.object({ ...itemFieldsSchema.shape, id: idSchema, version: versionSchema });
export type Item = z.output<typeof itemSchema>;

export const itemParamsSchema = z.strictObject({ itemId: idSchema });

export const itemListQuerySchema = z.strictObject({ ...listQuery, kind: z.enum(itemKinds).optional() });

export const itemListResponseSchema = z.object({ items: z.array(itemSchema), ...pageOfList });
export type ItemList = z.output<typeof itemListResponseSchema>;
