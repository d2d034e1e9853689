import { loadStates } from '#domain/load/state-machine';
import { z } from 'zod';
import { idSchema, instantSchema, reasonSchema, requestIdSchema } from './common';
import { keptFindingSchema } from './judged-again';
import {
  acceptanceSchema,
  cartViewSchema,
  catalogueItemSchema,
  loadEditSchema,
  loadHolderSchema,
  loadPackageSchema,
  loadViewSchema,
  placementSchema,
  programViewSchema,
  sterilizerViewSchema,
} from './load-view';
import { loadPolicySchema } from './policy';

export const loadStateSchema = z.enum(loadStates);
export type LoadState = z.infer<typeof loadStateSchema>;

/** A scan may hold anything a scanner sends; 10,000 characters are answered, more are refused at the edge. */
const rawScanSchema = z.string().max(20_000);

// ---- list and detail

export const loadListQuerySchema = z.strictObject({
  state: z.enum(['open', 'closed', 'all']).default('open'),
  /** The last load of the page before: only what was opened before it. */
  olderThan: idSchema.optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});
export type LoadListQuery = z.output<typeof loadListQuerySchema>;

export const loadSummarySchema = z.object({
  id: idSchema,
  number: z.string(),
  state: loadStateSchema,
  sterilizer: z.object({ id: idSchema, code: z.string(), name: z.string() }),
  program: z.object({ id: idSchema, code: z.string(), name: z.string() }),
  cart: z.object({ id: idSchema, code: z.string(), name: z.string() }),
  openedBy: z.string(),
  openedAt: instantSchema,
  closedBy: z.string().nullable(),
  closedAt: instantSchema.nullable(),
  listed: z.number().int(),
  scanned: z.number().int(),
  implants: z.number().int(),
  version: z.number().int(),
});
export type LoadSummary = z.infer<typeof loadSummarySchema>;
export const loadListResponseSchema = z.object({ loads: z.array(loadSummarySchema), hasOlder: z.boolean() });

const shelfCountWithPersonSchema = z.object({
  shelfId: idSchema,
  counted: z.number().int(),
  countedBy: z.string(),
  countedAt: instantSchema,
});

const acceptanceWithPersonSchema = acceptanceSchema.extend({ acceptedBy: z.string(), acceptedAt: instantSchema });

export const loadDetailSchema = z.object({
  summary: loadSummarySchema,
  /** What the rules look at, the same on both sides. */
  view: loadViewSchema,
  policy: loadPolicySchema,
  policyNumber: z.number().int(),
  counts: z.array(shelfCountWithPersonSchema),
  acceptances: z.array(acceptanceWithPersonSchema),
  /** The last act that can be undone, in words; null when there is none. */
  undoable: z.string().nullable(),
  /** Packages with a live load sticker. */
  stickers: z.array(z.object({ packageId: idSchema, stickerId: idSchema, copy: z.number().int() })),
  /** Of a closed load: digest of its contents, the rule set it was judged by, and what that found. */
  closing: z.object({ digest: z.string(), ruleSet: z.string(), findings: z.array(keptFindingSchema) }).nullable(),
  version: z.number().int(),
});
export type LoadDetail = z.infer<typeof loadDetailSchema>;

// ---- opening

export const loadOpeningOptionsSchema = z.object({
  sterilizers: z.array(
    z.object({
      sterilizer: sterilizerViewSchema,
      programs: z.array(programViewSchema),
      /** Programs on its panel that it is not qualified for: named, so that people know why they are missing. */
      unqualified: z.array(z.object({ id: idSchema, code: z.string() })),
      carts: z.array(cartViewSchema.extend({ isFree: z.boolean(), usedBy: z.string().nullable() })),
      airRemoval: z.object({ result: z.enum(['passed', 'failed']), testedAt: instantSchema }).nullable(),
    }),
  ),
  runs: z.array(
    z.object({
      id: idSchema,
      name: z.string(),
      packages: z.number().int(),
      implants: z.number().int(),
      sterilizerId: idSchema.nullable(),
      programId: idSchema.nullable(),
      wantedAt: instantSchema.nullable(),
    }),
  ),
});
export type LoadOpeningOptions = z.infer<typeof loadOpeningOptionsSchema>;

export const openLoadRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  sterilizerId: idSchema,
  programId: idSchema,
  cartId: idSchema,
  runId: idSchema.nullable(),
});
export type OpenLoadRequest = z.infer<typeof openLoadRequestSchema>;
export const openLoadResponseSchema = z.object({ loadId: idSchema, number: z.string() });

// ---- what every act on a load answers: the part that changed

export const loadChangeSchema = z.object({
  /** The load's version before and after: who holds `from` can apply the change, anyone else fetches anew. */
  from: z.number().int(),
  version: z.number().int(),
  packages: z.array(loadPackageSchema),
  removedPackageIds: z.array(idSchema),
  items: z.array(catalogueItemSchema),
  holders: z.array(loadHolderSchema),
  program: programViewSchema,
  counts: z.array(shelfCountWithPersonSchema),
  acceptances: z.array(acceptanceWithPersonSchema),
  undoable: z.string().nullable(),
});
export type LoadChange = z.infer<typeof loadChangeSchema>;

// ---- scanning

export const scanPlaceSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('shelf'), shelfId: idSchema }),
  z.strictObject({ kind: z.literal('holder'), holderId: idSchema }),
]);
export type ScanPlace = z.infer<typeof scanPlaceSchema>;

export const scanRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  raw: rawScanSchema,
  entry: z.enum(['wedge', 'camera', 'keyed']),
  /** Where packages go until another place is scanned; null: be told where. */
  place: scanPlaceSchema.nullable(),
});
export type ScanRequest = z.infer<typeof scanRequestSchema>;

export const scanAnswerKindSchema = z.enum([
  // The six answers to a package:
  'taken',
  'already-here',
  'not-ready',
  'not-known',
  'held',
  'called-back',
  // Answers to a place code: a place was set, or a holder was put on the cart, or it may not be here.
  'place-set',
  'place-refused',
]);

export const scanResponseSchema = z.object({
  answer: scanAnswerKindSchema,
  /** Taken, but look at this. */
  look: z.enum(['no-slot-left', 'no-place-found', 'not-on-the-list']).nullable(),
  sentence: z.string(),
  at: instantSchema,
  /** As it was read, for showing; shortened and without control characters. */
  code: z.string(),
  package: z.object({ id: idSchema, code: z.string(), itemName: z.string() }).nullable(),
  /** The place that now is the current one, when a place was scanned. */
  place: scanPlaceSchema.nullable(),
  placement: placementSchema.nullable(),
  change: loadChangeSchema.nullable(),
});
export type ScanResponse = z.infer<typeof scanResponseSchema>;

// ---- editing, counting, accepting, closing

export const editLoadRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  edits: z.array(loadEditSchema).min(1).max(400),
});
export type EditLoadRequest = z.infer<typeof editLoadRequestSchema>;

export const countShelfRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  shelfId: idSchema,
  counted: z.number().int().min(0).max(9_999),
});

export const acceptFindingRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  findingKey: z.string().min(1).max(2_000),
  reason: reasonSchema,
});

export const undoRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** What the person saw as the last act: another one by now is somebody else's, and is not taken back unseen. */
  undoing: z.string().min(1).max(200),
});
export const loadActRequestSchema = z.strictObject({ requestId: requestIdSchema });
export const abandonLoadRequestSchema = z.strictObject({ requestId: requestIdSchema, reason: reasonSchema });

export const loadChangeResponseSchema = z.object({ change: loadChangeSchema });

export const closeLoadResponseSchema = z.object({
  number: z.string(),
  digest: z.string(),
  ruleSet: z.string(),
  closedAt: instantSchema,
});

// ---- stickers and history

export const printStickersRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** null: every scanned package that has no sticker yet. */
  packageIds: z.array(idSchema).min(1).max(500).nullable(),
  /** Needed for a reprint. */
  reason: reasonSchema.nullable(),
});
export const printStickersResponseSchema = z.object({
  stickerIds: z.array(idSchema),
  /** Address of the sheet as PDF. */
  pdf: z.string(),
});

export const loadHistorySchema = z.object({
  events: z.array(
    z.object({
      id: z.string(),
      at: instantSchema,
      who: z.string(),
      kind: z.string(),
      sentence: z.string(),
    }),
  ),
});
