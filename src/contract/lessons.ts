import { answerIds } from '#domain/lessons/lesson';
import { z } from 'zod';
import { idSchema, instantSchema, requestIdSchema, textSchema } from './common';

export const lessonParamsSchema = z.object({ ruleId: z.string().max(60) });

export const finishLessonRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** The rules the lesson was read by: those of the page. */
  ruleSet: textSchema(40),
  /** In the order in which they were given; the last is the right one. */
  answers: z
    .array(z.enum(answerIds))
    .min(1)
    .max(answerIds.length, `There are ${answerIds.length} answers, and each is given once.`),
  /** The load whose finding opened the lesson. */
  loadId: idSchema.nullable(),
});
export type FinishLessonRequest = z.input<typeof finishLessonRequestSchema>;

export const finishedLessonSchema = z.object({
  ruleId: z.string(),
  ruleSet: z.string(),
  tries: z.number().int(),
  finishedAt: instantSchema,
  load: z.object({ id: idSchema, number: z.string() }).nullable(),
});
export type FinishedLesson = z.output<typeof finishedLessonSchema>;

export const finishLessonResponseSchema = z.object({ lesson: finishedLessonSchema });

/** One's own: of each lesson the last time it was finished. */
export const lessonListResponseSchema = z.object({ finished: z.array(finishedLessonSchema) });
