import { asc, desc, ilike, isNotNull, isNull, or, sql, type AnyColumn, type SQL } from 'drizzle-orm'
import type { PageQuery } from '../../contract/common'

type Sortable = AnyColumn | SQL

/** `limit` and `offset` of a page. */
export const windowOf = ({ page, size }: PageQuery): { limit: number; offset: number } => ({
  limit: size,
  offset: (page - 1) * size,
})

/**
 * The order a list asks for. `columns` is the allow-list, by the names of the contract; the id at the end makes
 * pages stable where values are equal. Empty values come last either way.
 */
export function orderOf<K extends string>(
  columns: Record<K, Sortable>,
  sort: K | `-${K}`,
  id: AnyColumn,
): SQL[] {
  const descending = sort.startsWith('-')
  const column = columns[(descending ? sort.slice(1) : sort) as K]
  return [sql`${descending ? desc(column) : asc(column)} nulls last`, asc(id)]
}

/** Rows in which one of the columns contains the text, whatever its case; without a text every row. */
export function containing(text: string | undefined, ...columns: Sortable[]): SQL | undefined {
  if (!text) return undefined
  const pattern = `%${text.replace(/[\\%_]/g, '\\$&')}%`
  return or(...columns.map((column) => ilike(column as AnyColumn, pattern)))
}

/** Rows that are in use, those that are archived, or both; `column` holds when a row was archived. */
export const archivedIs = (filter: 'active' | 'archived' | 'all', column: AnyColumn): SQL | undefined =>
  filter === 'all' ? undefined : filter === 'active' ? isNull(column) : isNotNull(column)

/** Total over all pages, for the select list of a page's query. */
export const totalOverPages = sql<number>`(count(*) over ())::integer`

/**
 * Runs a page's query, whose rows each carry the total. A page beyond the end is empty and still tells the total,
 * so that a reader can be led back.
 */
export async function paged<Q extends PageQuery, R extends { total: number }, I>(
  query: Q,
  select: (query: Q) => Promise<R[]>,
  asItems: (rows: R[]) => I[] | Promise<I[]>,
): Promise<{ items: I[]; total: number; page: number; size: number }> {
  const rows = await select(query)
  const beyond = rows.length === 0 && query.page > 1 ? await select({ ...query, page: 1, size: 1 }) : rows
  const { page, size } = query
  return { items: await asItems(rows), total: beyond[0]?.total ?? 0, page, size }
}
