import { judgedAgainSchema } from '#contract/judged-again';
import { paths } from '#contract/paths';
import { policyOverviewSchema } from '#contract/policies';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

/** Keys and requests of everything about the policy, together. */
export const policyQueries = {
  all: () => ['policies'] as const,
  overview: () =>
    queryOptions({
      queryKey: [...policyQueries.all(), 'overview'] as const,
      queryFn: ({ signal }) => api.get(paths.policies, policyOverviewSchema, { signal }),
    }),
  judgedAgain: (loadId: string) =>
    queryOptions({
      queryKey: [...policyQueries.all(), 'judged-again', loadId] as const,
      queryFn: ({ signal }) => api.get(paths.loadJudgedAgain(loadId), judgedAgainSchema, { signal }),
    }),
};
