import 'server-only';
import type { Knex } from 'knex';

/** Pattern for `like ... escape '\'` that finds the text anywhere, its own wildcards taken as letters. */
function containing(text: string): string {
  return `%${text.replace(/[\\%_]/g, '\\$&')}%`;
}

/** Narrows a query to rows where one of the columns contains the text, whatever the case; no text, no change. */
export function whereAnyContains(
  query: Knex.QueryBuilder,
  columns: readonly string[],
  text: string,
): Knex.QueryBuilder {
  const wanted = text.trim().toLowerCase();
  if (wanted === '') return query;
  return query.where((either) => {
    for (const column of columns) {
      void either.orWhereRaw("lower(??) like ? escape '\\'", [column, containing(wanted)]);
    }
  });
}

export interface Page<T> {
  rows: T[];
  total: number;
  page: number;
  pageCount: number;
}

export const PAGE_SIZE = 50;

/** Runs a query for one page and for the count of all; a page past the end gives the last one. */
export async function fetchPage<Row>(asked: {
  query: Knex.QueryBuilder;
  page: number;
  select: (query: Knex.QueryBuilder) => Knex.QueryBuilder;
}): Promise<Page<Row>> {
  const counted: { count: number } | undefined = await asked.query.clone().count({ count: '*' }).first();
  const total = Number(counted?.count ?? 0);
  const pageCount = Math.max(1, Math.ceil(total / PAGE_SIZE));
  const page = Math.min(Math.max(1, asked.page), pageCount);
  const rows: Row[] = await asked
    .select(asked.query.clone())
    .limit(PAGE_SIZE)
    .offset((page - 1) * PAGE_SIZE);
  return { rows, total, page, pageCount };
}
