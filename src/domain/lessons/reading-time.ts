import type { RuleId } from '../load/finding';
import { lessonOf, ruleOf } from './all-lessons';
import { answerIds } from './lesson';

/** How fast a tired person reads plain words. Ours, no source: slower than the 200 and more of a rested one. */
const wordsPerMinute = 180;

/** Everything a lesson gives to read, with the reasons of all three answers. */
export function textOfLesson(ruleId: RuleId): string {
  const { why, lookFor, bad, good, question } = lessonOf(ruleId);
  const { name, source } = ruleOf(ruleId);
  const answers = answerIds.flatMap((id) => [question.answers[id].text, question.answers[id].because]);
  return [name, ...why, lookFor, bad.caption, good.caption, question.text, ...answers, source.text].join(' ');
}

/** How long a lesson takes to read, in seconds, rounded up to ten. */
export function readingSeconds(ruleId: RuleId): number {
  const words = textOfLesson(ruleId)
    .split(/\s+/)
    .filter((word) => /\w/.test(word)).length;
  return Math.ceil(((words / wordsPerMinute) * 60) / 10) * 10;
}
