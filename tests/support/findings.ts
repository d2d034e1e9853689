import { evaluateLoad } from '#domain/load/evaluate-load';
import type { Finding, RuleId } from '#domain/load/finding';
import { defaultPolicy, type LoadPolicy } from '#domain/load/policy';
import type { LoadBuilder } from './load-builder';

/** What one rule finds on a load; the other rules may find what they like. */
export function findingsOf(ruleId: RuleId, load: LoadBuilder, policy: Partial<LoadPolicy> = {}): readonly Finding[] {
  return evaluateLoad(load.build(), { ...defaultPolicy, ...policy }).filter((finding) => finding.ruleId === ruleId);
}

export function titlesOf(ruleId: RuleId, load: LoadBuilder, policy: Partial<LoadPolicy> = {}): readonly string[] {
  return findingsOf(ruleId, load, policy).map((finding) => finding.title);
}

/** What its fix says, or null where none holds good. */
export function fixesOf(
  ruleId: RuleId,
  load: LoadBuilder,
  policy: Partial<LoadPolicy> = {},
): readonly (string | null)[] {
  return findingsOf(ruleId, load, policy).map((finding) => finding.fix?.label ?? null);
}
