import {
  defaultPolicy,
  policyParameters,
  type FacingRule,
  type LoadPolicy,
  type PolicyParameter,
} from '../load/policy';

export type ParameterId = PolicyParameter['id'];

/** A quantity in the unit of its parameter, or the value of one of its choices. */
export type SettingValue = number | string;

/** Everything one version of a facility's policy says. */
export type PolicySettings = {
  readonly policy: LoadPolicy;
  /** Sterilizers whose loads face otherwise than the facility's rule says, by the sterilizer's id. */
  readonly facingBySterilizer: Readonly<Record<string, FacingRule>>;
};

/** Undefined for a parameter that this program does not know. */
export function findParameter(id: string): PolicyParameter | undefined {
  return policyParameters.find((parameter) => parameter.id === id);
}

/** Whether a parameter takes a value today: a figure inside its range, one of its choices. */
export function takesValue(parameter: PolicyParameter, value: unknown): value is SettingValue {
  switch (parameter.form) {
    case 'quantity':
      return typeof value === 'number' && value >= parameter.range.least && value <= parameter.range.greatest;
    case 'choice':
      return parameter.choices.some((choice) => choice.value === value);
  }
}

/** Every facing rule there is, as the facility's own parameter offers them. */
export const facingRules: readonly FacingRule[] = choicesOf('facing').map((choice) => choice.value as FacingRule);

function choicesOf(id: ParameterId): readonly { readonly value: string; readonly label: string }[] {
  const parameter = findParameter(id);
  return parameter?.form === 'choice' ? parameter.choices : [];
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/**
 * Reads the settings of a version, whichever release of the program kept them: what it lacks, or what is not taken any
 * more, is the parameter's default, and is named; what nobody knows any more is passed over.
 */
export function readSettings(stored: unknown): {
  readonly settings: PolicySettings;
  readonly defaulted: readonly ParameterId[];
} {
  const kept = isRecord(stored) ? stored : {};
  const defaulted = policyParameters.flatMap((parameter) =>
    takesValue(parameter, kept[parameter.id]) ? [] : [parameter.id],
  );
  const taken = policyParameters
    .filter((parameter) => !defaulted.includes(parameter.id))
    .map((parameter) => [parameter.id, kept[parameter.id]] as const);
  const overrides = isRecord(kept.facingBySterilizer) ? kept.facingBySterilizer : {};
  return {
    settings: {
      policy: { ...defaultPolicy, ...Object.fromEntries(taken) },
      facingBySterilizer: Object.fromEntries(
        Object.entries(overrides).flatMap(([sterilizerId, value]) => {
          const rule = facingRules.find((one) => one === value);
          return rule === undefined ? [] : [[sterilizerId, rule]];
        }),
      ),
    },
    defaulted,
  };
}

/** The form in which a version keeps its settings: every value by name, the overrides beside them. */
export function storedSettings({ policy, facingBySterilizer }: PolicySettings): Readonly<Record<string, unknown>> {
  return { ...policy, facingBySterilizer };
}

/** What a load on one sterilizer is judged by: the settings, with the facing rule of that sterilizer. */
export function policyFor({ policy, facingBySterilizer }: PolicySettings, sterilizerId: string): LoadPolicy {
  const facing = facingBySterilizer[sterilizerId];
  return facing === undefined ? policy : { ...policy, facing };
}
