import { cycleTypes } from '#domain/catalogue/cycle-need-text';
import {
  holderConditions,
  holderForms,
  serviceStates,
  sizeClasses,
  surfaces,
} from '#domain/catalogue/equipment-fields';
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
import { idSchema, instantSchema, requestIdSchema, textSchema } from './common';
import {
  countSchema,
  statedDurationSchema,
  statedExposureSchema,
  statedMassOrNoneSchema,
  statedMassSchema,
  statedPositionSchema,
  statedSizeSchema,
  statedTemperatureSchema,
} from './quantities';

const added = { requestId: requestIdSchema };
const changed = { requestId: requestIdSchema, version: versionSchema };
const kept = { id: idSchema, version: versionSchema };

export const equipmentListQuerySchema = z.strictObject(listQuery);

// ---- programs

export const programFieldsSchema = z.strictObject({
  code: codeSchema,
  name: nameSchema,
  type: oneOf(cycleTypes),
  temperatureC: statedTemperatureSchema,
  exposureS: statedExposureSchema,
  dryS: statedDurationSchema,
  greatestLoadMassKg: statedMassSchema.nullable(),
  isRetired: yesNoSchema,
});
export const addProgramRequestSchema = programFieldsSchema.extend(added);
export const changeProgramRequestSchema = programFieldsSchema.omit({ code: true }).partial().extend(changed);
export const programSchema = z.object({
  ...programFieldsSchema.shape,
  ...kept,
  /** Codes of the sterilizers that are qualified for it. */
  qualifiedOn: z.array(z.string()),
});
export type ProgramOnFile = z.output<typeof programSchema>;
export const programParamsSchema = z.strictObject({ programId: idSchema });
export const programListResponseSchema = z.object({ programs: z.array(programSchema), ...pageOfList });

// ---- sterilizers

const programCodesSchema = z.array(codeSchema).max(60, 'At most 60 programs.');

export const sterilizerFieldsSchema = z.strictObject({
  code: codeSchema,
  number: z
    .string({ error: 'Please fill this in.' })
    .trim()
    .regex(/^[0-9A-Za-z]{1,4}$/, 'One to four letters or digits: it stands in every load number.')
    .transform((number) => number.toUpperCase()),
  name: nameSchema,
  sizeClass: oneOf(sizeClasses),
  chamberWidthMm: statedSizeSchema,
  chamberDepthMm: statedSizeSchema,
  chamberHeightMm: statedSizeSchema,
  drainXMm: statedPositionSchema,
  drainYMm: statedPositionSchema,
  greatestLoadMassKg: statedMassSchema,
  steamLine: lineSchema,
  hasAirDetector: yesNoSchema,
  needsAirRemovalTest: yesNoSchema,
  serviceState: oneOf(serviceStates),
  qualifiedPrograms: programCodesSchema,
  otherPrograms: programCodesSchema,
});
export const addSterilizerRequestSchema = sterilizerFieldsSchema.extend(added);
export const changeSterilizerRequestSchema = sterilizerFieldsSchema
  .omit({ code: true, number: true })
  .partial()
  .extend(changed);
export const sterilizerSchema = z.object({
  ...sterilizerFieldsSchema.shape,
  ...kept,
  /** The last air-removal test of the facility's day. */
  airRemoval: z.object({ result: z.enum(['passed', 'failed']), testedAt: instantSchema }).nullable(),
});
export type SterilizerOnFile = z.output<typeof sterilizerSchema>;
export const sterilizerParamsSchema = z.strictObject({ sterilizerId: idSchema });
export const sterilizerListResponseSchema = z.object({ sterilizers: z.array(sterilizerSchema), ...pageOfList });

// ---- carts and their shelves

export const shelfFieldsSchema = z.strictObject({
  level: countSchema(1, 20),
  name: nameSchema,
  widthMm: statedSizeSchema,
  depthMm: statedSizeSchema,
  clearHeightMm: statedSizeSchema,
  surface: oneOf(surfaces),
  greatestMassKg: statedMassSchema,
  isUsable: yesNoSchema,
});

export const cartFieldsSchema = z.strictObject({
  code: codeSchema,
  name: nameSchema,
  sizeClass: oneOf(sizeClasses),
  isUsable: yesNoSchema,
  note: lineSchema,
  shelves: z.array(shelfFieldsSchema).min(1, 'A cart has at least one shelf.').max(20, 'At most 20 shelves.'),
});
export const addCartRequestSchema = cartFieldsSchema.extend(added);
/** Shelves are told apart by their level. One that is not named stays as it is: what was loaded on it refers to it. */
export const changeCartRequestSchema = cartFieldsSchema.omit({ code: true }).partial().extend(changed);
export const cartSchema = z.object({
  ...cartFieldsSchema.shape,
  ...kept,
  shelves: z.array(z.object({ ...shelfFieldsSchema.shape, id: idSchema, placeCode: z.string() })),
});
export type CartOnFile = z.output<typeof cartSchema>;
export const cartParamsSchema = z.strictObject({ cartId: idSchema });
export const cartListResponseSchema = z.object({ carts: z.array(cartSchema), ...pageOfList });

/** A line of the carts file. */
export const shelfLineSchema = z.strictObject({
  ...shelfFieldsSchema.shape,
  cartCode: codeSchema,
  cartName: nameSchema,
  sizeClass: oneOf(sizeClasses),
  isCartUsable: yesNoSchema,
  cartNote: lineSchema,
  placeCode: textSchema(40).nullable(),
});

// ---- kinds of holders, and holders

export const holderKindFieldsSchema = z.strictObject({
  code: codeSchema,
  name: nameSchema,
  form: oneOf(holderForms),
  slots: countSchema(1, 200).nullable(),
  pitchMm: statedSizeSchema.nullable(),
  greatestHeightMm: statedSizeSchema.nullable(),
  greatestLengthMm: statedSizeSchema.nullable(),
  greatestThicknessMm: statedSizeSchema.nullable(),
  acrossMm: statedSizeSchema,
  alongMm: statedSizeSchema,
  massKg: statedMassOrNoneSchema,
  owned: countSchema(0, 9_999),
});
export const addHolderKindRequestSchema = holderKindFieldsSchema.extend(added);
export const changeHolderKindRequestSchema = holderKindFieldsSchema.omit({ code: true }).partial().extend(changed);
export const holderKindSchema = z.object({
  ...holderKindFieldsSchema.shape,
  ...kept,
  /** Holders of this kind that have a place code, and how many of them are in good order. */
  coded: z.number().int(),
  inGoodOrder: z.number().int(),
});
export type HolderKindOnFile = z.output<typeof holderKindSchema>;
export const holderKindParamsSchema = z.strictObject({ holderKindId: idSchema });
export const holderKindListResponseSchema = z.object({ holderKinds: z.array(holderKindSchema), ...pageOfList });

export const holderFieldsSchema = z.strictObject({
  name: codeSchema,
  kind: codeSchema,
  condition: oneOf(holderConditions),
  placeCode: textSchema(40).nullable(),
});
export const addHolderRequestSchema = holderFieldsSchema.omit({ placeCode: true }).extend(added);
export const changeHolderRequestSchema = holderFieldsSchema.pick({ condition: true }).partial().extend(changed);
export const holderSchema = z.object({
  ...holderFieldsSchema.shape,
  ...kept,
  placeCode: z.string(),
  kindName: z.string(),
  holderKindId: idSchema,
});
export type HolderOnFile = z.output<typeof holderSchema>;
export const holderParamsSchema = z.strictObject({ holderId: idSchema });
export const holderListQuerySchema = z.strictObject({ ...listQuery, kind: codeSchema.optional() });
export const holderListResponseSchema = z.object({ holders: z.array(holderSchema), ...pageOfList });

// ---- place labels

/** Labels of one cart's shelves, of all holders of a kind, or of one holder: a PDF. */
export const placeLabelQuerySchema = z
  .strictObject({
    cartId: idSchema.optional(),
    holderKindId: idSchema.optional(),
    holderId: idSchema.optional(),
    layout: z.enum(['single', 'sheet']).default('single'),
  })
  .refine(
    ({ cartId, holderKindId, holderId }) =>
      [cartId, holderKindId, holderId].filter((id) => id !== undefined).length === 1,
    'Say of which cart, kind of holder or holder.',
  );
export type PlaceLabelQuery = z.output<typeof placeLabelQuerySchema>;
