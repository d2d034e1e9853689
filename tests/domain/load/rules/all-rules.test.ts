import { ruleIds } from '#domain/load/finding';
import { defaultPolicy, policyParameters } from '#domain/load/policy';
import { rules } from '#domain/load/rules/all-rules';
import { describe, expect, it } from 'vitest';

describe('the rules', () => {
  it('are all there, once each, in the order in which they are told', () => {
    expect(rules.map((rule) => rule.id)).toEqual(ruleIds);
  });

  it('each give a reason in one sentence and a source', () => {
    for (const { id, reason, source, name } of rules) {
      expect([id, reason.endsWith('.'), reason.match(/[.!?](\s|$)/g)?.length]).toEqual([id, true, 1]);
      expect([id, source.text.length > 10, name.endsWith('.')]).toEqual([id, true, false]);
    }
  });

  it('between them use every setting of a policy, and none that is not there', () => {
    const used = new Set(rules.flatMap((rule) => rule.parameters));
    expect([...used].sort()).toEqual(Object.keys(defaultPolicy).sort());
    expect(policyParameters.map((parameter) => parameter.id).sort()).toEqual(Object.keys(defaultPolicy).sort());
  });
});
