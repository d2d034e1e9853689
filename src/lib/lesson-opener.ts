import type { RuleId } from '#domain/load/finding';
import { createContext, use } from 'react';

type OpenLesson = (ruleId: RuleId) => void;

/** Given by a screen that can show lessons over itself: no feature has to know of another. */
export const LessonOpenerContext = createContext<OpenLesson | null>(null);

/** Opens the lesson of a rule over the screen; null where there is nothing that could show one. */
export function useLessonOpener(): OpenLesson | null {
  return use(LessonOpenerContext);
}
