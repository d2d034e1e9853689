import { paths } from '#contract/paths';
import { todaySchema } from '#contract/today';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

/** A screen that hangs on the wall of the department: it looks again by itself. */
const lookAgainMs = 20_000;

export const todayQueries = {
  all: () => ['today'] as const,
  day: () =>
    queryOptions({
      queryKey: [...todayQueries.all(), 'day'] as const,
      queryFn: ({ signal }) => api.get(paths.today, todaySchema, { signal }),
      refetchInterval: lookAgainMs,
    }),
};
