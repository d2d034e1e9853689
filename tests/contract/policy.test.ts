import { loadPolicySchema, policyChangesSchema } from '#contract/policy';
import { defaultPolicy, limitOf, policyParameters } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

const quantities = policyParameters.filter((parameter) => parameter.form === 'quantity');
const choices = policyParameters.filter((parameter) => parameter.form === 'choice');

describe('a policy on the wire', () => {
  it('comes back as it was', () => {
    expect(loadPolicySchema.parse(JSON.parse(JSON.stringify(defaultPolicy)))).toEqual(defaultPolicy);
  });

  it.each(quantities.map((parameter) => [parameter.id, parameter] as const))(
    '%s has a range that is kept',
    (id, { range }) => {
      const parse = (value: unknown) => loadPolicySchema.safeParse({ ...defaultPolicy, [id]: value });
      expect([parse(range.least).success, parse(range.greatest).success]).toEqual([true, true]);
      for (const refused of [range.least - 0.001, range.greatest + 0.001, NaN, Infinity, '10', null]) {
        const answer = parse(refused);
        expect([refused, answer.success, answer.error?.issues[0]?.path]).toEqual([refused, false, [id]]);
      }
    },
  );

  it.each(choices.map((parameter) => [parameter.id, parameter] as const))(
    '%s is one of its choices',
    (id, { choices: known }) => {
      for (const { value } of known)
        expect(loadPolicySchema.safeParse({ ...defaultPolicy, [id]: value }).success).toBe(true);
      expect(loadPolicySchema.safeParse({ ...defaultPolicy, [id]: 'either' }).success).toBe(false);
    },
  );

  it('has every setting and no other', () => {
    for (const id of Object.keys(defaultPolicy)) {
      expect(loadPolicySchema.safeParse({ ...defaultPolicy, [id]: undefined }).success).toBe(false);
    }
    expect(loadPolicySchema.safeParse({ ...defaultPolicy, more: 1 }).success).toBe(false);
  });
});

describe('what a person wants otherwise', () => {
  it('is any of the settings, each as a policy takes it, and none that nobody knows', () => {
    expect(policyChangesSchema.parse({})).toEqual({});
    for (const { id, range } of quantities) {
      expect(policyChangesSchema.parse({ [id]: range.least })).toEqual({ [id]: range.least });
      const refused = policyChangesSchema.safeParse({ [id]: range.greatest + 1 });
      expect([id, refused.error?.issues[0]?.path]).toEqual([id, [id]]);
    }
    for (const { id, choices: known } of choices) {
      expect(policyChangesSchema.parse({ [id]: known[0]?.value })).toEqual({ [id]: known[0]?.value });
      expect(policyChangesSchema.safeParse({ [id]: 'either' }).error?.issues[0]?.path).toEqual([id]);
    }
    expect(policyChangesSchema.safeParse({ fumesPerFortnight: 3 }).success).toBe(false);
  });

  it('is refused in the unit of the setting', () => {
    expect(policyChangesSchema.safeParse({ startTemperatureC: 1000 }).error?.issues[0]?.message).toBe('At most 60 °C.');
    expect(policyChangesSchema.safeParse({ greatestLeanDeg: 0 }).error?.issues[0]?.message).toBe('At least 5°.');
    expect(policyChangesSchema.safeParse({ pouchGapMm: -1 }).error?.issues[0]?.message).toBe('At least 0 mm.');
    expect(policyChangesSchema.safeParse({ pouchGapMm: '12' }).error?.issues[0]?.message).toBe(
      'Please write a number.',
    );
  });
});

describe('the settings of a policy', () => {
  it('are exactly those that there is a parameter for', () => {
    expect(policyParameters.map(({ id }) => id).toSorted()).toEqual(Object.keys(defaultPolicy).toSorted());
  });

  it('have a default inside their range or among their choices, and say where it comes from', () => {
    for (const { id, default: value, range } of quantities) {
      expect([id, value >= range.least && value <= range.greatest, defaultPolicy[id]]).toEqual([id, true, value]);
    }
    for (const { id, default: value, choices: known } of choices) {
      expect([id, known.some((choice) => choice.value === value), defaultPolicy[id]]).toEqual([id, true, value]);
    }
    for (const { source } of policyParameters) expect(source.text.length).toBeGreaterThan(10);
  });
});

describe('where a limit comes from', () => {
  it('is the instructions, else the house, else the default', () => {
    expect(limitOf(mm(40), defaultPolicy, 'packageClearanceMm')).toEqual({ limit: 40, limitFrom: 'ifu' });
    expect(limitOf(mm(0), defaultPolicy, 'packageClearanceMm')).toEqual({ limit: 0, limitFrom: 'ifu' });
    const house = { ...defaultPolicy, packageClearanceMm: mm(30) };
    expect(limitOf(null, house, 'packageClearanceMm')).toEqual({ limit: 30, limitFrom: 'house-rule' });
    expect(limitOf(null, defaultPolicy, 'packageClearanceMm')).toEqual({ limit: 25, limitFrom: 'default' });
  });

  it('is never instructions that make no sense', () => {
    for (const nonsense of [NaN, -1]) {
      expect(limitOf(nonsense, defaultPolicy, 'packageClearanceMm').limitFrom).toBe('default');
    }
  });
});
