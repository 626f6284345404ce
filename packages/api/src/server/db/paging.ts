import { asc, desc, ilike, or, sql, type AnyColumn, type SQL } from 'drizzle-orm'
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

/** Total over all pages, for the select list of a page's query. */
export const totalOverPages = sql<number>`(count(*) over ())::integer`
