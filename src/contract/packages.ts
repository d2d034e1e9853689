import { z } from 'zod';
import { dateSchema, idSchema, instantSchema, reasonSchema, requestIdSchema, textSchema } from './common';
import { packageStateSchema } from './load-view';

const itemKindSchema = z.enum([
  'pouch',
  'rigid-container',
  'wrapped-tray',
  'basin',
  'textile-pack',
  'challenge-device',
]);

/** Text for looking something up: whatever was typed, but nothing that cannot be kept, and not a novel. */
export const searchSchema = z
  .string()
  .trim()
  .max(100, 'At most 100 characters.')

  .refine((text) => !/[\u0000-\u001f\u007f]/.test(text), 'This has a character that cannot be searched for.');

/** A page of a list, counted from 1; text, because it comes in an address. */
export const pageSchema = z
  .string()
  .regex(/^[1-9]\d{0,5}$/, 'This is not the number of a page.')
  .transform(Number);

export const packagesPerPage = 50;

// ---- list and detail

export const packageListQuerySchema = z.strictObject({
  /** Code or part of it, item code or part of the item's name. */
  search: searchSchema.optional(),
  itemId: idSchema.optional(),
  state: packageStateSchema.optional(),
  runId: idSchema.optional(),
  page: pageSchema.optional(),
});

export const packageSummarySchema = z.object({
  id: idSchema,
  code: z.string(),
  item: z.object({
    id: idSchema,
    code: z.string(),
    name: z.string(),
    kind: itemKindSchema,
    isImplant: z.boolean(),
  }),
  state: packageStateSchema,
  heldReason: z.string().nullable(),
  /** Last calendar day it may be used; null where expiry is event-related. */
  expiresOn: dateSchema.nullable(),
  isExpired: z.boolean(),
  packedAt: instantSchema,
  packedBy: z.string(),
  destination: z.string(),
  run: z.object({ id: idSchema, name: z.string() }).nullable(),
  openLoad: z.object({ id: idSchema, number: z.string() }).nullable(),
  /** How many times its label was printed. */
  labels: z.number().int(),
});
export type PackageSummary = z.infer<typeof packageSummarySchema>;

export const packageListResponseSchema = z.object({
  packages: z.array(packageSummarySchema),
  total: z.number().int(),
  page: z.number().int(),
});
export type PackageListResponse = z.infer<typeof packageListResponseSchema>;

/** An id, or a code as scanned or typed. What is neither is simply not known. */
export const packageParamsSchema = z.strictObject({ packageRef: z.string() });

export const packageDetailSchema = z.object({
  package: packageSummarySchema,
  isContentsConfirmed: z.boolean(),
  hasInternalIndicator: z.boolean(),
  hasExternalIndicator: z.boolean(),
  labelPrints: z.array(
    z.object({
      copy: z.number().int(),
      reason: z.string().nullable(),
      printedBy: z.string(),
      printedAt: instantSchema,
    }),
  ),
  history: z.array(z.object({ id: z.string(), at: instantSchema, who: z.string(), sentence: z.string() })),
});
export type PackageDetail = z.infer<typeof packageDetailSchema>;

// ---- packing

export const greatestPackQuantity = 50;

export const packRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  itemId: idSchema,
  quantity: z
    .number()
    .int('A whole number of packages, please.')
    .min(1, 'At least one package.')
    .max(greatestPackQuantity, `At most ${greatestPackQuantity} packages in one go.`),
  isContentsConfirmed: z.boolean(),
  hasInternalIndicator: z.boolean(),
  hasExternalIndicator: z.boolean(),
  /** Where it goes when it is sterile, such as a room or a clinic; empty when nobody has asked for it. */
  destination: z.union([z.literal(''), textSchema(80)]),
});
export type PackRequest = z.infer<typeof packRequestSchema>;

export const packResponseSchema = z.object({
  packages: z.array(z.object({ id: idSchema, code: z.string() })),
  warnings: z.array(z.object({ code: z.string(), sentence: z.string() })),
});
export type PackResponse = z.infer<typeof packResponseSchema>;

export const identifyRequestSchema = z.strictObject({
  /** Whatever a scanner sends. */
  raw: z.string().max(20_000, 'This is too long for a scan.'),
});

export const identifiedItemSchema = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  kind: itemKindSchema,
  isImplant: z.boolean(),
  isRetired: z.boolean(),
});

export const identifyResponseSchema = z.discriminatedUnion('found', [
  z.object({ found: z.literal('item'), item: identifiedItemSchema, sentence: z.string() }),
  z.object({ found: z.literal('package'), package: packageSummarySchema, sentence: z.string() }),
  z.object({ found: z.literal('nothing'), sentence: z.string() }),
]);
export type IdentifyResponse = z.infer<typeof identifyResponseSchema>;

// ---- labels

export const greatestLabelSheet = 100;

export const labelLayoutSchema = z.enum(['single', 'sheet']);
export type LabelLayout = z.infer<typeof labelLayoutSchema>;

export const printLabelsRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  packageIds: z.array(idSchema).min(1, 'Choose at least one package.').max(greatestLabelSheet),
  layout: labelLayoutSchema,
  /** Needed as soon as one of the packages has had a label before. */
  reason: reasonSchema.nullable().optional(),
});
export type PrintLabelsRequest = z.infer<typeof printLabelsRequestSchema>;

export const printLabelsResponseSchema = z.object({
  labels: z.array(z.object({ packageId: idSchema, copy: z.number().int() })),
  /** Address of the labels as PDF. */
  pdf: z.string(),
});
export type PrintLabelsResponse = z.infer<typeof printLabelsResponseSchema>;

export const labelSheetParamsSchema = z.strictObject({ batchId: idSchema });
export const labelSheetQuerySchema = z.strictObject({ layout: labelLayoutSchema });

/** One line of a packages file. How the parts hold together is the core's to check. */
export const packageFieldsSchema = z.strictObject({
  code: z.string().trim().max(40),
  itemCode: textSchema(40),
  isContentsConfirmed: z.boolean(),
  hasInternalIndicator: z.boolean(),
  hasExternalIndicator: z.boolean(),
  destination: z.string().trim().max(80),
});
