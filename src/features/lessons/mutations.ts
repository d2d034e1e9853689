import { finishLessonResponseSchema, type FinishLessonRequest } from '#contract/lessons';
import { paths } from '#contract/paths';
import type { RuleId } from '#domain/load/finding';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';
import { lessonQueries } from './queries';

/** A repeat is sent with the same request id, so that a lesson is kept once. */
export function useFinishLesson(ruleId: RuleId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: FinishLessonRequest) =>
      api.post(paths.finishLesson(ruleId), request, finishLessonResponseSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: lessonQueries.all() }),
  });
}
