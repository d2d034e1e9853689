import type { FindingPlace } from '#domain/load/finding';
import type { FindingComparison, KeptFinding } from '#domain/policy/compare-findings';
import { z } from 'zod';
import { dateSchema, idSchema, instantSchema } from './common';

const findingPlaceSchema: z.ZodType<FindingPlace> = z.discriminatedUnion('on', [
  z.object({ on: z.literal('load') }),
  z.object({ on: z.literal('shelf'), shelfId: idSchema }),
  z.object({ on: z.literal('holder'), holderId: idSchema, slot: z.number().int().nullable() }),
  z.object({ on: z.literal('package'), packageId: idSchema }),
]);

const keptFigureSchema = z.object({
  measured: z.number(),
  limit: z.number(),
  unit: z.string(),
  want: z.enum(['at-least', 'at-most', 'exactly']),
  limitFrom: z.string(),
});

/** As it was kept at the close, by whatever rules there were then. */
export const keptFindingSchema: z.ZodType<KeptFinding> = z.object({
  key: z.string(),
  ruleId: z.string(),
  severity: z.enum(['stop', 'accept', 'advice']),
  title: z.string(),
  reason: z.string(),
  remedy: z.string(),
  source: z.object({ text: z.string(), provenance: z.string() }),
  places: z.array(findingPlaceSchema),
  // What is no number is kept as none.
  figure: keptFigureSchema.nullable().catch(null),
});

export const keptAcceptanceSchema = z.object({
  findingKey: z.string(),
  ruleId: z.string(),
  reason: z.string(),
  acceptedBy: z.string(),
  acceptedAt: instantSchema,
});

const findingPairSchema = z.object({ then: keptFindingSchema, now: keptFindingSchema });

const comparisonSchema: z.ZodType<FindingComparison> = z.object({
  changed: z.array(findingPairSchema),
  onlyNow: z.array(keptFindingSchema),
  onlyThen: z.array(keptFindingSchema),
  both: z.array(findingPairSchema),
});

/** By what a load was judged. */
const measureSchema = z.object({
  ruleSet: z.string(),
  policyNumber: z.number().int(),
  policyEffectiveOn: dateSchema,
});

/** A closed load as it was closed, and what the rules and the policy of today would say of the same contents. */
export const judgedAgainSchema = z.object({
  load: z.object({ id: idSchema, number: z.string(), closedAt: instantSchema, closedBy: z.string() }),
  then: measureSchema.extend({ findings: z.array(keptFindingSchema), acceptances: z.array(keptAcceptanceSchema) }),
  /** null where the load cannot be judged again; then `whyNot` says why. */
  now: measureSchema
    .extend({
      findings: z.array(keptFindingSchema),
      /** How many things would hold the load open today. */
      holding: z.number().int(),
    })
    .nullable(),
  comparison: comparisonSchema.nullable(),
  whyNot: z.string().nullable(),
});
export type JudgedAgain = z.infer<typeof judgedAgainSchema>;
