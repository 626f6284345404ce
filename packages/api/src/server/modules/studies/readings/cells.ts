import type { CellError, ReadAs } from '../../../../contract/readings'
import { letterOf } from '../../../tables/letters'
import { asWritten, readCell, type ReadCell } from '../../../tables/numbers'
import type { CellMark, TableRow } from '../../../tables/table'

/** A place in which a reading belongs. */
export interface Cell {
  row: number
  /** Index of the column. */
  column: number
  text: string
  mark: CellMark | undefined
}

export interface Reading {
  row: number
  column: string
  text: string
  value: number
}

/** The cells of the columns below the headings, row by row. Written plainly: it runs a hundred thousand times. */
export function cellsOf(rows: readonly TableRow[], headerRows: number, columns: readonly number[]): Cell[] {
  const found: Cell[] = []
  for (let at = headerRows; at < rows.length; at++) {
    const { row, cells, marks } = rows[at] as TableRow
    if (cells.length === 0) continue
    for (const column of columns)
      found.push({ row, column, text: (cells[column] ?? '').trim(), mark: marks?.[column] })
  }
  return found
}

/** Cells up to the last that is filled; the rest of a run sheet has not been taken yet. */
export function untilLast(cells: readonly Cell[]): { cells: Cell[]; emptyRowsAtEnd: number } {
  const end = cells.findLastIndex(({ text, mark }) => text !== '' || mark?.formula) + 1
  const last = cells[end - 1]?.row ?? 0
  const rest = new Set(cells.slice(end).flatMap(({ row }) => (row === last ? [] : [row])))
  return { cells: cells.slice(0, end), emptyRowsAtEnd: rest.size }
}

/** The decimal mark that most of the readings were written with; numbers of a workbook have none. */
export function decimalOf(cells: readonly Cell[]): ReadAs['decimal'] {
  let more = 0
  for (const { text, mark } of cells) {
    const decimal = mark?.number ? null : asWritten(text)?.mark
    if (decimal) more += decimal === 'comma' ? 1 : -1
  }
  return more > 0 ? 'comma' : 'point'
}

const summaryWords =
  /^\s*(mean|average|avg|sum|total|count|std\.?( ?dev\.?)?|standard deviation|range|median|min(imum)?|max(imum)?|mittelwert|summe|standardabweichung|spannweite|moyenne|somme|media|suma)\s*:?$/i

/** Whether a row or a column of this name holds figures about the readings. */
export const isSummary = (name: string): boolean =>
  name !== '' && !/^\d/.test(name) && summaryWords.test(name)

/** Reads every cell; those without a reading are named with their place, what is wrong, and how to mend it. */
export function readCells(
  cells: readonly Cell[],
  decimal: ReadAs['decimal'],
  rows: readonly TableRow[],
  labelled: boolean,
): { readings: Reading[]; errors: CellError[] } {
  const readings: Reading[] = []
  const errors: CellError[] = []
  const columns = new Set(cells.map(({ column }) => column))
  const letters = new Map([...columns].map((column) => [column, letterOf(column)]))
  for (const cell of cells) {
    const { row, text } = cell
    const column = letters.get(cell.column) ?? ''
    const label = labelled ? summaryIn(rows[row - 1]?.cells ?? [], columns) : undefined
    const read = readOne(cell, decimal, label)
    if ('value' in read) readings.push({ row, column, text, value: read.value })
    else errors.push({ row, column, text: text.slice(0, 60), ...read })
  }
  return { readings, errors }
}

/** What calls a row a figure about the readings, beside the columns with readings. */
function summaryIn(cells: readonly string[], columns: ReadonlySet<number>): string | undefined {
  for (const [at, cell] of cells.entries()) if (!columns.has(at) && isSummary(cell)) return cell
  return undefined
}

function readOne({ text, mark }: Cell, decimal: ReadAs['decimal'], label: string | undefined): ReadCell {
  // A workbook's number has a point whatever the sheet shows.
  const read = readCell(text, mark?.number ? 'point' : decimal)
  if (label && 'value' in read)
    return {
      code: 'summary-row',
      message: `This row is called “${label.slice(0, 40)}”, so it looks like a figure about the readings. Remove the row, or leave it out.`,
    }
  if (mark?.formula)
    return {
      code: 'formula',
      message:
        'A formula computes this cell, so it is no reading as it was taken. Copy the cells and paste them as values, or enter the reading itself.',
    }
  if (mark?.error)
    return {
      code: 'error-value',
      message: `This cell shows the error ${text.slice(0, 20)}. Enter the reading, or leave the row out.`,
    }
  if (mark?.date)
    return {
      code: 'date-in-cell',
      message: `This cell holds a day or a time, ${text}. Spreadsheets turn some numbers into days: format the column as numbers, and enter the reading anew.`,
    }
  return read
}
