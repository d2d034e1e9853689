import type { Role } from '#domain/access/permissions';
import { paths } from '#contract/paths';
import { peopleResponseSchema } from '#contract/people';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api, withQuery } from '../../lib/api-client';

export type PeopleFilters = {
  readonly search: string;
  /** null: whatever their role. */
  readonly role: Role | null;
};

/** A department fits into one answer; the screen narrows it by itself, as fast as one types. */
export const everyone: PeopleFilters = { search: '', role: null };

/** Keys and requests of everything about people, together. */
export const peopleQueries = {
  all: () => ['people'] as const,
  lists: () => [...peopleQueries.all(), 'list'] as const,
  list: (filters: PeopleFilters) =>
    queryOptions({
      queryKey: [...peopleQueries.lists(), filters] as const,
      queryFn: async ({ signal }) => {
        const { people } = await api.get(withQuery(paths.people, filters), peopleResponseSchema, { signal });
        return people;
      },
      placeholderData: keepPreviousData,
    }),
};
