import { policyParameters, type FacingRule, type LoadPolicy, type PolicyParameter } from '#domain/load/policy';
import { facingRules } from '#domain/policy/settings';
import { z } from 'zod';
import { idSchema } from './common';

/* Made from the list of parameters, so that a parameter added there is on the wire, in its range, without a line here. */

const unitSigns: Readonly<Record<string, string>> = { degC: ' °C', deg: '°', count: '' };

function withUnit(value: number, unit: string): string {
  return `${value}${unitSigns[unit] ?? ` ${unit}`}`;
}

function valueSchema(parameter: PolicyParameter): z.ZodType<number | string> {
  switch (parameter.form) {
    case 'quantity': {
      const { range, unit } = parameter;
      return z
        .number({ error: 'Please write a number.' })
        .min(range.least, `At least ${withUnit(range.least, unit)}.`)
        .max(range.greatest, `At most ${withUnit(range.greatest, unit)}.`);
    }
    case 'choice':
      return z.enum(parameter.choices.map((choice) => choice.value));
  }
}

const values = Object.fromEntries(policyParameters.map((parameter) => [parameter.id, valueSchema(parameter)]));

/** All settings of one policy. */
export const loadPolicySchema: z.ZodType<LoadPolicy> = z
  .strictObject(values)
  // Each value was read by the schema of its own parameter.
  .transform((policy) => policy as LoadPolicy);

/** Those settings that a person wants otherwise. */
export const policyChangesSchema: z.ZodType<Partial<LoadPolicy>> = z
  .strictObject(values)
  .partial()
  .transform((changes) => changes as Partial<LoadPolicy>);

export const facingRuleSchema: z.ZodType<FacingRule> = z.enum(facingRules);

export const facingBySterilizerSchema = z.record(idSchema, facingRuleSchema);
