import { z } from 'zod';
import { idSchema, instantSchema, requestIdSchema, textSchema } from './common';
import { packageSummarySchema } from './packages';

export const runStateSchema = z.enum(['waiting', 'taken', 'dropped']);

export const runListQuerySchema = z.strictObject({ state: runStateSchema.or(z.literal('all')).default('waiting') });

export const runSummarySchema = z.object({
  id: idSchema,
  name: z.string(),
  sterilizer: z.object({ id: idSchema, code: z.string(), name: z.string() }).nullable(),
  program: z.object({ id: idSchema, code: z.string(), name: z.string() }).nullable(),
  wantedAt: instantSchema.nullable(),
  state: runStateSchema,
  packages: z.number().int(),
  implants: z.number().int(),
  createdBy: z.string(),
  createdAt: instantSchema,
  /** The load that took it. */
  load: z.object({ id: idSchema, number: z.string() }).nullable(),
  version: z.number().int(),
});
export type RunSummary = z.infer<typeof runSummarySchema>;

export const runListResponseSchema = z.object({ runs: z.array(runSummarySchema) });

export const runParamsSchema = z.strictObject({ runId: idSchema });

export const runDetailSchema = z.object({ run: runSummarySchema, packages: z.array(packageSummarySchema) });
export type RunDetail = z.infer<typeof runDetailSchema>;

export const addRunRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  name: textSchema(80),
  sterilizerId: idSchema.nullable(),
  programId: idSchema.nullable(),
  wantedAt: instantSchema.nullable(),
});
export type AddRunRequest = z.infer<typeof addRunRequestSchema>;
export const addRunResponseSchema = z.object({ runId: idSchema });

/** What is absent stays as it is; null takes the hour away. */
export const changeRunRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** Of the run as it was when the change was decided on. */
  version: z.number().int(),
  name: textSchema(80).optional(),
  wantedAt: instantSchema.nullable().optional(),
});
export type ChangeRunRequest = z.infer<typeof changeRunRequestSchema>;
export const changeRunResponseSchema = z.object({ run: runSummarySchema });

export const stagePackagesRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  packageIds: z.array(idSchema).min(1, 'Choose at least one package.').max(200, 'At most 200 packages in one go.'),
});
export type StagePackagesRequest = z.infer<typeof stagePackagesRequestSchema>;
export const stagePackagesResponseSchema = z.object({
  /** Packages that changed; one that was in the run already is not among them. */
  staged: z.number().int(),
});
export const removePackagesResponseSchema = z.object({ removed: z.number().int() });

export const dropRunRequestSchema = z.strictObject({ requestId: requestIdSchema });
export const dropRunResponseSchema = z.object({ returned: z.number().int() });

export const stagingScanRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** Whatever a scanner sends. */
  raw: z.string().max(20_000, 'This is too long for a scan.'),
});

export const stagingScanResponseSchema = z.object({
  /** Only `taken` changes anything. */
  answer: z.enum(['taken', 'already-here', 'not-ready', 'not-known', 'held', 'called-back']),
  /** Taken, but look at this. */
  look: z.enum(['program-not-permitted']).nullable(),
  sentence: z.string(),
  /** As it was read, for showing; shortened and without control characters. */
  code: z.string(),
  package: z.object({ id: idSchema, code: z.string(), itemName: z.string() }).nullable(),
});
export type StagingScanResponse = z.infer<typeof stagingScanResponseSchema>;
