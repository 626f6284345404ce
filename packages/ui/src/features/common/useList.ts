import { computed, type ComputedRef } from 'vue'
import { useLoaded } from './useLoaded'

interface Page<Row> {
  items: Row[]
  total: number
}

interface Asked {
  page: number
  size: number
  sort?: string | undefined
}

/** What `DataTable` takes of a list; `v-bind="list.table.value"`. */
export interface TableBinding<Row> {
  rows: Row[]
  total: number
  page: number
  size: number
  sort: string | undefined
  loading: boolean
  error: unknown
}

export interface List<Row> {
  table: ComputedRef<TableBinding<Row>>
  total: ComputedRef<number>
  reload(): Promise<void>
}

/** What is chosen in the address, without what is not: empty texts are left out of the request. */
export const chosen = <Q extends object>(query: Q): Q =>
  Object.fromEntries(Object.entries(query).filter(([, value]) => value !== '' && value !== undefined)) as Q

/** One page of a list from the server, following the table's state in the address. */
export function useList<Q extends Asked, Row>(
  query: () => Q,
  load: (query: Q) => Promise<Page<Row>>,
): List<Row> {
  const { data, error, loading, reload } = useLoaded(() => chosen(query()), load)
  const total = computed(() => data.value?.total ?? 0)
  const table = computed(() => ({
    rows: data.value?.items ?? [],
    total: total.value,
    page: query().page,
    size: query().size,
    sort: query().sort,
    loading: loading.value,
    error: error.value,
  }))
  return { table, total, reload }
}
