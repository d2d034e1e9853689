import { airRemovalTestListResponseSchema } from '#contract/air-removal-tests';
import { sterilizerListResponseSchema } from '#contract/equipment';
import { paths } from '#contract/paths';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

/** Keys and requests of everything about air-removal tests, together. */
export const airRemovalTestQueries = {
  all: () => ['air-removal-tests'] as const,
  list: (filters: { readonly sterilizerId: string | null }) =>
    queryOptions({
      queryKey: [...airRemovalTestQueries.all(), 'list', filters] as const,
      queryFn: ({ signal }) =>
        api.get(withQuery(paths.airRemovalTests, filters), airRemovalTestListResponseSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  /** The sterilizers, with what is known of today. */
  sterilizers: () =>
    queryOptions({
      queryKey: [...airRemovalTestQueries.all(), 'sterilizers'] as const,
      queryFn: async ({ signal }) => {
        const path = withQuery(paths.sterilizers, { pageSize: 100 });
        const { sterilizers } = await api.get(path, sterilizerListResponseSchema, { signal });
        return sterilizers;
      },
    }),
};
