import type { Knex } from 'knex';
import { containing } from './search-text';

export type ListFilters = {
  readonly search: string;
  readonly retired: 'hidden' | 'shown';
  readonly page: number;
  readonly pageSize: number;
};

export type Page<Row> = {
  readonly rows: readonly Row[];
  readonly total: number;
  readonly page: number;
  readonly pageSize: number;
};

/** Keeps the rows in which every word of the search is found in one of the columns. */
export function whereFound(query: Knex.QueryBuilder, search: string, columns: readonly (string | Knex.Raw)[]): void {
  for (const word of search.split(/\s+/).filter((one) => one !== '')) {
    void query.where((either: Knex.QueryBuilder) => {
      for (const column of columns) void either.orWhereRaw(`?? ilike ?`, [column, containing(word)]);
    });
  }
}

/** One page of a list, with how long the whole is. */
export async function pageOf<Row>(
  query: Knex.QueryBuilder,
  {
    page,
    pageSize,
    orderBy,
    isDescending = false,
    select,
  }: {
    readonly page: number;
    readonly pageSize: number;
    readonly orderBy: readonly string[];
    readonly isDescending?: boolean;
    readonly select: readonly string[];
  },
): Promise<Page<Row>> {
  const counted = await query.clone().count({ count: '*' }).first<{ readonly count: number } | undefined>();
  const found: unknown[] = await query
    .clone()
    .orderBy(orderBy.map((column) => ({ column, order: isDescending ? 'desc' : 'asc' })))
    .limit(pageSize)
    .offset((page - 1) * pageSize)
    .select([...select]);
  return { rows: found as Row[], total: counted?.count ?? 0, page, pageSize };
}
