import {
  finishLessonRequestSchema,
  finishLessonResponseSchema,
  lessonListResponseSchema,
  lessonParamsSchema,
} from '#contract/lessons';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { finishLesson } from './finish-lesson';
import { listFinishedLessons } from './finished-lesson-read-model';

export const lessonRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.lessons,
    permission: 'lesson.finish',
    response: lessonListResponseSchema,
    // One's own only: nobody looks up here what others have learned.
    handle: async ({ services, actor }) => ({ finished: await listFinishedLessons(services.db, actor) }),
  }),
  defineRoute({
    method: 'post',
    path: paths.finishLesson(':ruleId'),
    permission: 'lesson.finish',
    params: lessonParamsSchema,
    body: finishLessonRequestSchema,
    response: finishLessonResponseSchema,
    status: 201,
    handle: ({ services, actor, params, body }) => finishLesson(services, actor, params.ruleId, body),
  }),
];
