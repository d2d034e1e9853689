import { loadDetailSchema, loadHistorySchema, loadListResponseSchema, loadOpeningOptionsSchema } from '#contract/loads';
import { paths } from '#contract/paths';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

/** While a load is being built, another station may change it: look again this often. */
const otherStationsMs = 4_000;

/** Keys and requests of everything about loads, together. */
export const loadQueries = {
  all: () => ['loads'] as const,
  lists: () => [...loadQueries.all(), 'list'] as const,
  list: (state: 'open' | 'closed' | 'all') =>
    infiniteQueryOptions({
      queryKey: [...loadQueries.lists(), { state }] as const,
      queryFn: ({ pageParam: olderThan, signal }) =>
        api.get(withQuery(paths.loads, { state, olderThan }), loadListResponseSchema, { signal }),
      initialPageParam: null as string | null,
      getNextPageParam: ({ loads, hasOlder }) => (hasOlder ? (loads.at(-1)?.id ?? null) : null),
    }),
  openingOptions: () =>
    queryOptions({
      queryKey: [...loadQueries.all(), 'opening-options'] as const,
      queryFn: ({ signal }) => api.get(`${paths.loads}/opening-options`, loadOpeningOptionsSchema, { signal }),
    }),
  details: () => [...loadQueries.all(), 'detail'] as const,
  detail: (loadId: string) =>
    queryOptions({
      queryKey: [...loadQueries.details(), loadId] as const,
      queryFn: ({ signal }) => api.get(paths.load(loadId), loadDetailSchema, { signal }),
      refetchInterval: (query) => (query.state.data?.summary.state === 'building' ? otherStationsMs : false),
    }),
  history: (loadId: string) =>
    queryOptions({
      queryKey: [...loadQueries.all(), 'history', loadId] as const,
      // Somebody at another station may have done something since.
      staleTime: 0,
      queryFn: async ({ signal }) => {
        const { events } = await api.get(`${paths.load(loadId)}/history`, loadHistorySchema, { signal });
        return events;
      },
    }),
};
