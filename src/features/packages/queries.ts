import { itemListResponseSchema } from '#contract/items';
import { packageDetailSchema, packageListResponseSchema, type PackageSummary } from '#contract/packages';
import { paths } from '#contract/paths';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

export type PackageFilters = {
  readonly search: string;
  /** null: whatever state it is in. */
  readonly state: PackageSummary['state'] | null;
  readonly page: number;
};

/** Keys and requests of everything about packages, together. */
export const packageQueries = {
  all: () => ['packages'] as const,
  lists: () => [...packageQueries.all(), 'list'] as const,
  list: (filters: PackageFilters) =>
    queryOptions({
      queryKey: [...packageQueries.lists(), filters] as const,
      queryFn: ({ signal }) => api.get(withQuery(paths.packages, filters), packageListResponseSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  details: () => [...packageQueries.all(), 'detail'] as const,
  /** By id or by code. */
  detail: (packageRef: string) =>
    queryOptions({
      queryKey: [...packageQueries.details(), packageRef] as const,
      queryFn: ({ signal }) => api.get(paths.package(packageRef), packageDetailSchema, { signal }),
    }),
  /** Items that can be packed. */
  items: (search: string) =>
    queryOptions({
      queryKey: [...packageQueries.all(), 'items', { search }] as const,
      queryFn: ({ signal }) =>
        api.get(withQuery(paths.items, { search, pageSize: 200 }), itemListResponseSchema, { signal }),
      placeholderData: keepPreviousData,
      staleTime: 60_000,
    }),
};
