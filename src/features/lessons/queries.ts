import { lessonListResponseSchema } from '#contract/lessons';
import { paths } from '#contract/paths';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

export const lessonQueries = {
  all: () => ['lessons'] as const,
  /** One's own: of each lesson the last time it was finished. */
  finished: () =>
    queryOptions({
      queryKey: [...lessonQueries.all(), 'finished'] as const,
      queryFn: async ({ signal }) => (await api.get(paths.lessons, lessonListResponseSchema, { signal })).finished,
    }),
};
