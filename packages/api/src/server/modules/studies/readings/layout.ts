import type { ReadingsInput, ReadingsNote } from '../../../../contract/readings'
import { invalidInput } from '../../../errors'
import { columnOf } from '../../../tables/letters'
import { asWritten, meantAsNumber } from '../../../tables/numbers'
import type { TableRow } from '../../../tables/table'
import { isSummary } from './cells'
import { readingColumn, type Column } from './columns'

export interface Layout {
  layout: 'long' | 'wide'
  columns: Column[]
  note: ReadingsNote | null
  /** One row of readings and nothing else: what stands before them is their name. */
  across: boolean
}

export type LayoutInput = Pick<ReadingsInput, 'source' | 'layout' | 'columns'>

/** Where the readings stand: as the sender says, or as the table suggests. */
export function layoutOf(
  input: LayoutInput,
  rows: readonly TableRow[],
  headerRows: number,
  columns: readonly Column[],
): Layout {
  if (input.columns) return asNamed(input, columns)
  if (input.layout !== 'long') {
    const across = input.source === 'typed' ? null : acrossOf(rows, headerRows, columns)
    if (across) return across
    const wide = input.layout === 'wide' ? numberColumns(columns) : countedColumns(columns)
    if (input.layout === 'wide' || wide.length > 1)
      return { layout: 'wide', columns: wide, note: input.layout ? null : wideNote(wide), across: false }
  }
  const { column = columns[0], note } = readingColumn(columns)
  return { layout: 'long', columns: column ? [column] : [], note: column ? note : null, across: false }
}

function asNamed({ layout, columns: letters = [] }: LayoutInput, columns: readonly Column[]): Layout {
  const refuse = (message: string) => invalidInput([{ path: 'body.columns', message }])
  const named = letters.map((letter) => {
    const column = columns[columnOf(letter)]
    if (column) return column
    const last = columns.at(-1)?.letter
    throw refuse(
      last ? `There is no column ${letter}; the last one is ${last}.` : 'There are no columns in it at all.',
    )
  })
  if (new Set(letters).size < letters.length) throw refuse('Name each column once.')
  if (layout === 'long' && named.length > 1)
    throw refuse('The long layout has one column. Name one, or choose the wide layout.')
  return {
    layout: layout ?? (named.length > 1 ? 'wide' : 'long'),
    columns: named.toSorted((a, b) => a.index - b.index),
    note: null,
    across: false,
  }
}

const acrossNote: ReadingsNote = {
  code: 'read-across',
  message: 'There is one row of numbers, so the readings were taken from left to right.',
  readings: [],
}

/** A single row of numbers, perhaps after its name. */
function acrossOf(rows: readonly TableRow[], headerRows: number, columns: readonly Column[]): Layout | null {
  const data = rows.filter(({ cells }) => cells.length > 0)
  const cells = data[0]?.cells ?? []
  const [first = ''] = cells
  const numbers = cells.filter((cell) => asWritten(cell) !== undefined)
  if (data.length !== 1 || headerRows > 0 || numbers.length < 2) return null
  const labelled = first.trim() !== '' && asWritten(first) === undefined && !meantAsNumber(first)
  return { layout: 'wide', columns: columns.slice(labelled ? 1 : 0), note: acrossNote, across: true }
}

const isFigure = ({ name }: Column): boolean => name !== null && isSummary(name)

/** Columns of numbers that are neither a count of the rows nor figures about the readings. */
const numberColumns = (columns: readonly Column[]): Column[] =>
  columns.filter((column) => column.numbers > 0 && !column.running && !isFigure(column))

/** Columns of numbers named alike and counted from 1, such as Trial 1, Trial 2, Trial 3 or 1, 2, 3. */
function countedColumns(columns: readonly Column[]): Column[] {
  const counted = columns.filter(({ numbers }) => numbers > 0)
  const from = counted.findIndex(({ name }) => numberIn(name)?.number === 1)
  const run: Column[] = []
  const prefix = numberIn(counted[from]?.name ?? null)?.prefix
  for (const column of from < 0 ? [] : counted.slice(from)) {
    const named = numberIn(column.name)
    if (named?.prefix !== prefix || named?.number !== run.length + 1) break
    run.push(column)
  }
  return run
}

function numberIn(name: string | null): { prefix: string; number: number } | undefined {
  const [, prefix, number] = /^(\D*?)\s*#?(\d{1,3})(?:\s*[[(].*)?$/.exec(name?.trim() ?? '') ?? []
  return prefix === undefined ? undefined : { prefix: prefix.toLowerCase(), number: Number(number) }
}

function wideNote(columns: readonly Column[]): ReadingsNote {
  const [first, last] = [columns[0], columns.at(-1)]
  return {
    code: 'read-wide',
    message: `Columns ${first?.letter} to ${last?.letter} are numbered alike (${first?.name} to ${last?.name}), so the readings were taken from all of them, row by row. Choose one column if only that holds the readings.`,
    readings: [],
  }
}
