import { ruleIds, type RuleId } from '../load/finding';
import { accept, refuse, type Result } from '../result';
import { lessonOf } from './all-lessons';
import type { AnswerId } from './lesson';

export type FinishedLesson = { readonly ruleId: RuleId; readonly tries: number };

export type FinishRefusal = 'lesson.none' | 'lesson.not-answered-right' | 'lesson.tries-do-not-fit';

/** A rule's id as it stands in an address. */
export function findRuleId(text: string | undefined): RuleId | undefined {
  return ruleIds.find((id) => id === text);
}

/**
 * Whether a person has finished a lesson: the last answer is right, and each one before it was wrong and given once.
 * @param answers in the order in which they were given
 */
export function decideFinishLesson(
  ruleId: string,
  answers: readonly AnswerId[],
): Result<FinishedLesson, FinishRefusal> {
  const known = findRuleId(ruleId);
  if (known === undefined) return refuse('lesson.none', 'There is no such lesson.');
  const { right } = lessonOf(known).question;
  if (answers.at(-1) !== right) {
    return refuse('lesson.not-answered-right', 'The lesson is finished once its question is answered right.');
  }
  if (new Set(answers).size !== answers.length) {
    return refuse('lesson.tries-do-not-fit', 'Each answer can be given once. Please open the lesson again.');
  }
  return accept({ ruleId: known, tries: answers.length });
}
