import {
  cartListResponseSchema,
  holderKindListResponseSchema,
  holderListResponseSchema,
  programListResponseSchema,
  sterilizerListResponseSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { api, withQuery } from '../../lib/api-client';

export type EquipmentFilters = {
  readonly search: string;
  readonly retired: 'hidden' | 'shown';
  readonly page: number;
};

export const equipmentPageSize = 100;

/** The whole of a list that is never long. */
export const everything: EquipmentFilters = { search: '', retired: 'hidden', page: 1 };

function listOf<Reply>(name: string, path: string, schema: z.ZodType<Reply>) {
  const key = ['equipment', name] as const;
  return {
    all: () => key,
    list: (filters: EquipmentFilters) =>
      queryOptions({
        queryKey: [...key, 'list', filters] as const,
        queryFn: ({ signal }) =>
          api.get(withQuery(path, { ...filters, pageSize: equipmentPageSize }), schema, { signal }),
        placeholderData: keepPreviousData,
      }),
  };
}

/** Keys and requests of everything about equipment, together. */
export const equipmentQueries = {
  all: () => ['equipment'] as const,
  sterilizers: listOf('sterilizers', paths.sterilizers, sterilizerListResponseSchema),
  programs: listOf('programs', paths.programs, programListResponseSchema),
  carts: listOf('carts', paths.carts, cartListResponseSchema),
  holderKinds: listOf('holder-kinds', paths.holderKinds, holderKindListResponseSchema),
  holders: listOf('holders', paths.holders, holderListResponseSchema),
};
