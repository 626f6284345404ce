import type { RouteLocationRaw } from 'vue-router'

export interface TableColumn {
  /** Property of the row, name of the slot `cell-<key>`, and name for sorting. */
  key: string
  label: string
  align?: 'start' | 'end'
  sortable?: boolean
  /** CSS width, such as "120px" or "30%". */
  width?: string
  /** Heads the row when a phone stacks its cells, and carries the row's link; the first column without it. */
  primary?: boolean
  /** Takes the whole width when a phone stacks the cells. */
  wholeRow?: boolean
  /** The key grows as what is shown falls, as the day since when something waits does against how long it waits. */
  reversed?: boolean
  /** Left out when a phone stacks the cells. */
  wideOnly?: boolean
}

/** Where a row leads; `undefined` for a row that leads nowhere. */
export type RowLink<Row> = (row: Row) => RouteLocationRaw | undefined

/** A column name, with "-" before it for descending; undefined for the server's own order. */
export type Sort = string | undefined

export const isDescending = (sort: Sort): boolean => sort?.startsWith('-') ?? false
export const sortKey = (sort: Sort): string | undefined => sort?.replace(/^-/, '')

/** Which way the column runs as it is read, where the rows are ordered by it. */
export function orderOf(column: TableColumn, sort: Sort): 'ascending' | 'descending' | undefined {
  if (sortKey(sort) !== column.key) return undefined
  return isDescending(sort) === Boolean(column.reversed) ? 'ascending' : 'descending'
}

/** The order after a click on a column's heading: ascending, descending, ascending … */
export const nextSort = (sort: Sort, key: string): string =>
  sortKey(sort) === key && !isDescending(sort) ? `-${key}` : key
