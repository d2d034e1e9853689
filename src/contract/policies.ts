import type { SettingChange } from '#domain/policy/setting-change';
import type { PolicySettings } from '#domain/policy/settings';
import { z } from 'zod';
import { dateSchema, idSchema, instantSchema, reasonSchema, requestIdSchema } from './common';
import { facingBySterilizerSchema, facingRuleSchema, loadPolicySchema, policyChangesSchema } from './policy';

export const policySettingsSchema: z.ZodType<PolicySettings> = z.object({
  policy: loadPolicySchema,
  facingBySterilizer: facingBySterilizerSchema,
});

const settingValueSchema = z.union([z.number(), z.string()]);

/** Also of settings that only an older release of the program knew. */
export const settingChangeSchema: z.ZodType<SettingChange> = z.discriminatedUnion('of', [
  z.object({ of: z.literal('parameter'), id: z.string(), before: settingValueSchema, after: settingValueSchema }),
  z.object({
    of: z.literal('facing-at-sterilizer'),
    sterilizerId: idSchema,
    before: facingRuleSchema.nullable(),
    after: facingRuleSchema.nullable(),
  }),
]);

export const policyVersionSchema = z.object({
  number: z.number().int(),
  /** The facility's calendar day from whose beginning it holds. */
  effectiveOn: dateSchema,
  standing: z.enum(['in-force', 'planned', 'past', 'overtaken']),
  confirmedAt: instantSchema,
  /** Who proposed it and who confirmed it; null for the settings a facility begins with. */
  author: z.string().nullable(),
  secondPerson: z.string().nullable(),
  reason: z.string(),
  settings: policySettingsSchema,
  /** Settings that this version does not say: the program learned of them later, and their default holds. */
  defaulted: z.array(z.string()),
  /** What differs from the version before it. */
  changes: z.array(settingChangeSchema),
});
export type PolicyVersion = z.infer<typeof policyVersionSchema>;

export const policyProposalSchema = z.object({
  id: idSchema,
  state: z.enum(['open', 'confirmed', 'withdrawn', 'refused']),
  changes: z.array(settingChangeSchema),
  reason: z.string(),
  effectiveOn: dateSchema,
  proposedBy: z.object({ id: idSchema, name: z.string() }),
  proposedAt: instantSchema,
  settledBy: z.string().nullable(),
  settledAt: instantSchema.nullable(),
  settledReason: z.string().nullable(),
});
export type PolicyProposal = z.infer<typeof policyProposalSchema>;

export const policyOverviewSchema = z.object({
  /** The facility's calendar day. */
  today: dateSchema,
  /** Newest first. */
  versions: z.array(policyVersionSchema),
  /** The one that waits for a second person. */
  proposal: policyProposalSchema.nullable(),
  /** Those that came to nothing, newest first. */
  notMade: z.array(policyProposalSchema),
  /** Whose facing can be set apart. */
  sterilizers: z.array(z.object({ id: idSchema, code: z.string(), name: z.string() })),
});
export type PolicyOverview = z.infer<typeof policyOverviewSchema>;

export const proposePolicyChangeRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** The newest version the person looked at; another one by now has to be seen first. */
  baseNumber: z.number().int().min(0),
  changes: policyChangesSchema,
  /** Every sterilizer that is to face otherwise than the facility; absent: as they are. */
  facingBySterilizer: facingBySterilizerSchema.optional(),
  reason: reasonSchema,
  effectiveOn: dateSchema,
});
export type ProposePolicyChangeRequest = z.infer<typeof proposePolicyChangeRequestSchema>;

export const policyProposalResponseSchema = z.object({ proposal: policyProposalSchema });

export const confirmPolicyChangeRequestSchema = z.strictObject({ requestId: requestIdSchema });

export const confirmPolicyChangeResponseSchema = z.object({ number: z.number().int(), effectiveOn: dateSchema });

export const turnDownPolicyChangeRequestSchema = z.strictObject({ requestId: requestIdSchema, reason: reasonSchema });
export type TurnDownPolicyChangeRequest = z.infer<typeof turnDownPolicyChangeRequestSchema>;
