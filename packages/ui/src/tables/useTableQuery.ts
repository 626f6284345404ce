import { computed, reactive, type ComputedRef } from 'vue'
import { useRoute, useRouter, type LocationQueryValue } from 'vue-router'

export interface UseTableQueryOptions<Filter extends string> {
  /** Names of further filters kept in the address, with their value when nothing is chosen. */
  filters?: Record<Filter, string>
  /** Order while the address names none. */
  sort?: string
  /** Rows of a page. */
  size?: number
  /** Tells two tables of one page apart: "gauges" gives `gauges.page`, `gauges.sort` … */
  prefix?: string
}

export type TableQuery<Filter extends string> = {
  page: number
  size: number
  sort: string | undefined
  search: string
} & Record<Filter, string>

export interface UseTableQueryReturn<Filter extends string> {
  /** What to ask the server for; follows the address. */
  query: ComputedRef<TableQuery<Filter>>
  /** Two-way bindings for the table, the search field and filters. */
  state: TableQuery<Filter>
  /** Whether anything narrows the list, to tell "nothing found" from "nothing there". */
  isFiltered: ComputedRef<boolean>
  /** Back to the unfiltered first page; keeps the order. */
  clear(): void
}

const single = (value: LocationQueryValue | LocationQueryValue[] | undefined): string =>
  (Array.isArray(value) ? value[0] : value) ?? ''

const mostPages = 100_000

/**
 * Sorting, filters and page of a table, kept in the address so that it can be reloaded, shared and gone back to.
 * Defaults are left out of the address; a change of anything but the page returns to the first page.
 */
export function useTableQuery<Filter extends string = never>(
  options: UseTableQueryOptions<Filter> = {},
): UseTableQueryReturn<Filter> {
  const route = useRoute()
  const router = useRouter()
  const size = options.size ?? 25
  const filters = (options.filters ?? {}) as Record<string, string>
  const nameOf = (key: string) => (options.prefix ? `${options.prefix}.${key}` : key)
  const defaults: Record<string, string> = { page: '1', sort: options.sort ?? '', search: '', ...filters }
  const read = (key: string) => single(route.query[nameOf(key)]) || (defaults[key] ?? '')

  const query = computed(() => {
    const page = Number(read('page'))
    return {
      page: Number.isInteger(page) && page >= 1 && page <= mostPages ? page : 1,
      size,
      sort: read('sort') || undefined,
      search: read('search'),
      ...Object.fromEntries(Object.keys(filters).map((key) => [key, read(key)])),
    } as TableQuery<Filter>
  })

  // Changes of one moment go into the address together; the route still shows the old one meanwhile.
  let pending: Record<string, string> | undefined
  function write(changes: Record<string, string>) {
    const first = pending === undefined
    pending = {
      ...pending,
      ...(Object.keys(changes).some((key) => key !== 'page') ? { page: '1' } : {}),
      ...changes,
    }
    if (first) queueMicrotask(flush)
  }
  function flush() {
    const next = { ...route.query }
    for (const [key, value] of Object.entries(pending ?? {})) {
      if (value === defaults[key]) delete next[nameOf(key)]
      else next[nameOf(key)] = value
    }
    pending = undefined
    void router.replace({ query: next, hash: route.hash })
  }

  const state = reactive(
    Object.fromEntries(
      ['page', 'size', 'sort', 'search', ...Object.keys(filters)].map((key) => [
        key,
        computed({
          get: () => (query.value as Record<string, unknown>)[key],
          set: (value) => key !== 'size' && write({ [key]: String(value ?? '') }),
        }),
      ]),
    ),
  ) as unknown as TableQuery<Filter>

  const narrowing = ['search', ...Object.keys(filters)]
  return {
    query,
    state,
    isFiltered: computed(() => narrowing.some((key) => read(key) !== (defaults[key] ?? ''))),
    clear: () => write(Object.fromEntries(narrowing.map((key) => [key, defaults[key] ?? '']))),
  }
}
