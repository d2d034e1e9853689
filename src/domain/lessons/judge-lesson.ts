import { evaluateLoad } from '../load/evaluate-load';
import type { Finding, RuleId } from '../load/finding';
import { defaultPolicy, type LoadPolicy } from '../load/policy';
import { lessonOf } from './all-lessons';

/** The figures a lesson's carts are judged by. */
export function lessonPolicy(ruleId: RuleId): LoadPolicy {
  return { ...defaultPolicy, ...lessonOf(ruleId).policy };
}

export type JudgedLesson = { readonly bad: readonly Finding[]; readonly good: readonly Finding[] };

/** What the rules find on both carts of a lesson: on the bad one what the lesson is about, on the good one nothing. */
export function judgeLesson(ruleId: RuleId): JudgedLesson {
  const { bad, good } = lessonOf(ruleId);
  const policy = lessonPolicy(ruleId);
  return { bad: evaluateLoad(bad.view, policy), good: evaluateLoad(good.view, policy) };
}
