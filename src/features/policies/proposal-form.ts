import { reasonSchema } from '#contract/common';
import { facingBySterilizerSchema } from '#contract/policy';
import type { PolicyOverview, PolicyVersion, ProposePolicyChangeRequest } from '#contract/policies';
import { policyParameters, type FacingRule, type PolicyParameter } from '#domain/load/policy';
import { daysToChoose } from '#domain/policy/decide-proposal';
import { changesBetween, type SettingChange } from '#domain/policy/setting-change';
import { readSettings, takesValue, type PolicySettings, type SettingValue } from '#domain/policy/settings';
import { z } from 'zod';
import type { UnitSystem } from '../../lib/facility';
import { figureProblem, keptFigure, shownFigure } from './setting-words';

/* What people fill in, and what it becomes. Figures are text in the facility's units; "" for a sterilizer is the facility's rule. */

export type ProposalFields = {
  values: Record<string, string>;
  facing: Record<string, string>;
  reason: string;
  effectiveOn: string;
};

export type Proposal = Pick<ProposePolicyChangeRequest, 'changes' | 'facingBySterilizer' | 'reason' | 'effectiveOn'>;

/** What a new version rests on: the newest one, whether or not its day has come. */
export function baseOf({ versions }: PolicyOverview): Pick<PolicyVersion, 'number' | 'settings'> {
  return versions[0] ?? { number: 0, settings: readSettings({}).settings };
}

function fieldText(parameter: PolicyParameter, value: SettingValue, unitSystem: UnitSystem): string {
  return parameter.form === 'quantity' && typeof value === 'number'
    ? shownFigure(parameter, value, unitSystem)
    : String(value);
}

export function fieldsOf(overview: PolicyOverview, unitSystem: UnitSystem): ProposalFields {
  const { settings } = baseOf(overview);
  return {
    values: Object.fromEntries(
      policyParameters.map((parameter) => [
        parameter.id,
        fieldText(parameter, settings.policy[parameter.id], unitSystem),
      ]),
    ),
    facing: Object.fromEntries(overview.sterilizers.map(({ id }) => [id, settings.facingBySterilizer[id] ?? ''])),
    reason: '',
    effectiveOn: overview.today,
  };
}

type ReadValue =
  { readonly value: SettingValue; readonly problem: null } | { readonly value: null; readonly problem: string };

/** What a field means: the value as it is, where nothing else was written. */
function readField(parameter: PolicyParameter, text: string, now: SettingValue, unitSystem: UnitSystem): ReadValue {
  if (parameter.form === 'choice') {
    return takesValue(parameter, text)
      ? { value: text, problem: null }
      : { value: null, problem: 'This is none of the choices.' };
  }
  const kept = keptFigure(parameter, text, { unitSystem, known: typeof now === 'number' ? [now] : [] });
  const problem = figureProblem(parameter, kept, unitSystem);
  return problem === null && kept !== undefined
    ? { value: kept, problem: null }
    : { value: null, problem: problem ?? 'Please write a number.' };
}

function facingOf(facing: Readonly<Record<string, string>>): Readonly<Record<string, FacingRule>> {
  return facingBySterilizerSchema.parse(Object.fromEntries(Object.entries(facing).filter(([, rule]) => rule !== '')));
}

/** What would change as the form stands; a field that cannot be read changes nothing yet. */
export function changesIn(
  fields: Pick<ProposalFields, 'values' | 'facing'>,
  base: PolicySettings,
  unitSystem: UnitSystem,
): readonly SettingChange[] {
  const policy = Object.fromEntries(
    policyParameters.map((parameter) => {
      const now = base.policy[parameter.id];
      return [parameter.id, readField(parameter, fields.values[parameter.id] ?? '', now, unitSystem).value ?? now];
    }),
  );
  return changesBetween(base, {
    policy: { ...base.policy, ...policy },
    facingBySterilizer: facingOf(fields.facing),
  });
}

/** Reads the settings of the form; complaints are in the unit the person writes in. */
function valuesSchema(settings: PolicySettings, unitSystem: UnitSystem) {
  return z.record(z.string(), z.string()).transform((values, context) => {
    const changes: Partial<Record<string, SettingValue>> = {};
    for (const parameter of policyParameters) {
      const now = settings.policy[parameter.id];
      const read = readField(parameter, values[parameter.id] ?? '', now, unitSystem);
      if (read.problem !== null) {
        context.addIssue({ code: 'custom', path: [parameter.id], message: read.problem });
      } else if (read.value !== now) changes[parameter.id] = read.value;
    }
    return changes;
  });
}

export function proposalSchema(overview: PolicyOverview, unitSystem: UnitSystem) {
  return z
    .object({
      values: valuesSchema(baseOf(overview).settings, unitSystem),
      facing: z.record(z.string(), z.string()),
      reason: reasonSchema,
      effectiveOn: z.iso
        .date('Choose a day.')
        .refine((day) => day >= daysToChoose(overview.today).first, 'Today at the earliest.')
        .refine((day) => day <= daysToChoose(overview.today).last, 'Within a year from today.'),
    })
    .transform(({ values, facing, ...rest }): Proposal => ({
      ...rest,
      // Each value was taken by its own parameter.
      changes: values,
      facingBySterilizer: facingOf(facing),
    }));
}

/** The field of this form that a part of the request is called here. */
export function formFieldOf(pointer: string): string {
  return pointer
    .replace(/^\/body\/changes\//, '/values/')
    .replace(/^\/body\/facingBySterilizer\//, '/facing/')
    .replace(/^\/body\//, '/')
    .slice(1)
    .replaceAll('/', '.');
}
