import { mostTableColumns, mostTableRows } from '../../contract/tables'

/** What is read of a file at most; each keeps a small upload from becoming a large computation. */
export const limits = {
  rows: mostTableRows,
  columns: mostTableColumns,
  cells: 2_000_000,
  /** Characters in all cells together: a workbook may name one long text in every cell. */
  characters: 40_000_000,
  /** Files inside a workbook. */
  entries: 2_000,
  /** Bytes of the parts of a workbook that are read, inflated. */
  inflated: 150_000_000,
} as const

/** What is read at once on the server's own thread: more goes to a thread of its own. */
export const light = { text: 100_000, inflated: 500_000 } as const
