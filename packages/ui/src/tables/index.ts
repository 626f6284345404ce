export { default as DataTable } from './DataTable.vue'
export { default as Pager } from './Pager.vue'
export { default as SearchField } from './SearchField.vue'
export { isDescending, nextSort, sortKey, type RowLink, type Sort, type TableColumn } from './types'
export {
  useTableQuery,
  type TableQuery,
  type UseTableQueryOptions,
  type UseTableQueryReturn,
} from './useTableQuery'
