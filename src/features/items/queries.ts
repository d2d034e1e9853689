import { holderKindListResponseSchema } from '#contract/equipment';
import { itemListResponseSchema, itemSchema } from '#contract/items';
import { paths } from '#contract/paths';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

export type ItemFilters = {
  readonly search: string;
  /** null: whatever kind it is. */
  readonly kind: string | null;
  readonly retired: 'hidden' | 'shown';
  readonly page: number;
};

export const itemPageSize = 100;

/** Keys and requests of everything about items, together. */
export const itemQueries = {
  all: () => ['items'] as const,
  lists: () => [...itemQueries.all(), 'list'] as const,
  list: (filters: ItemFilters) =>
    queryOptions({
      queryKey: [...itemQueries.lists(), filters] as const,
      queryFn: ({ signal }) =>
        api.get(withQuery(paths.items, { ...filters, pageSize: itemPageSize }), itemListResponseSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  details: () => [...itemQueries.all(), 'detail'] as const,
  detail: (itemId: string) =>
    queryOptions({
      queryKey: [...itemQueries.details(), itemId] as const,
      queryFn: ({ signal }) => api.get(`${paths.items}/${itemId}`, itemSchema, { signal }),
    }),
  /** Kinds of holders a pouch may belong in. */
  holderKinds: () =>
    queryOptions({
      queryKey: [...itemQueries.all(), 'holder-kinds'] as const,
      queryFn: async ({ signal }) => {
        const path = withQuery(paths.holderKinds, { pageSize: 200 });
        const { holderKinds } = await api.get(path, holderKindListResponseSchema, { signal });
        return holderKinds.filter((kind) => kind.form === 'rack' || kind.form === 'basket');
      },
    }),
};
