import { invalidInput, type ProblemError } from '../errors'
import { limits } from './limits'
import type { Table } from './table'

/** A file that cannot be read as a table, with what it is and how to mend it. */
export const refusedFile = (message: string, path = 'body.file'): ProblemError =>
  invalidInput([{ path, message }])

const counted = (count: number): string => count.toLocaleString('en-GB')

/** Refuses what is more than is read of one table. */
export function refuseOversize(count: { rows: number; columns: number; cells: number; characters: number }) {
  if (count.rows > limits.rows)
    throw refusedFile(
      `This table has cells below row ${counted(limits.rows)}; at most ${counted(limits.rows)} rows are read. Split it into several files.`,
    )
  if (count.columns > limits.columns)
    throw refusedFile(
      `This table has ${counted(count.columns)} columns; at most ${limits.columns} are read. Check the separator, or remove the columns that are not needed.`,
    )
  if (count.cells > limits.cells || count.characters > limits.characters)
    throw refusedFile(
      `This table holds more than is read at once: at most ${counted(limits.cells)} cells and ${counted(limits.characters)} characters. Remove what is not needed, or split it into several files.`,
    )
}

/** Refuses a table of which one cell could not be read at all, naming its place. */
export function refuseBroken({ broken }: Pick<Table, 'broken'>): void {
  if (!broken) return
  const { row, column, message } = broken
  throw invalidInput([{ path: 'body.file', row, column, message }])
}
