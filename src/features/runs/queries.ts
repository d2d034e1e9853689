import { paths } from '#contract/paths';
import { programListResponseSchema, sterilizerListResponseSchema } from '#contract/equipment';
import { runDetailSchema, runListResponseSchema } from '#contract/runs';
import { queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

/** Another station may scan into the same run: look again this often. */
const otherStationsMs = 8_000;

/** Keys and requests of everything about runs, together. */
export const runQueries = {
  all: () => ['runs'] as const,
  lists: () => [...runQueries.all(), 'list'] as const,
  list: () =>
    queryOptions({
      queryKey: [...runQueries.lists(), { state: 'waiting' }] as const,
      queryFn: async ({ signal }) => {
        const { runs } = await api.get(withQuery(paths.runs, { state: 'waiting' }), runListResponseSchema, { signal });
        return runs;
      },
      refetchInterval: otherStationsMs,
    }),
  details: () => [...runQueries.all(), 'detail'] as const,
  detail: (runId: string) =>
    queryOptions({
      queryKey: [...runQueries.details(), runId] as const,
      queryFn: ({ signal }) => api.get(paths.run(runId), runDetailSchema, { signal }),
      refetchInterval: otherStationsMs,
    }),
  /** Sterilizers and programs a new run may name. */
  equipment: () =>
    queryOptions({
      queryKey: [...runQueries.all(), 'equipment'] as const,
      queryFn: async ({ signal }) => {
        const [{ sterilizers }, { programs }] = await Promise.all([
          api.get(withQuery(paths.sterilizers, { pageSize: 200 }), sterilizerListResponseSchema, { signal }),
          api.get(withQuery(paths.programs, { pageSize: 200 }), programListResponseSchema, { signal }),
        ]);
        return { sterilizers, programs };
      },
      staleTime: 60_000,
    }),
};
