import type { ReadingsNote } from '../../../../contract/readings'
import { letterOf } from '../../../tables/letters'
import type { Table } from '../../../tables/table'
import type { Cell } from './cells'

const note = (code: ReadingsNote['code'], message: string): ReadingsNote[] => [
  { code, message, readings: [] },
]

/** Said where a file is not in UTF-8 and no byte order mark tells its encoding. */
export const encodingNotes = ({ dialect }: Pick<Table, 'dialect'>): ReadingsNote[] =>
  dialect?.encoding === 'windows-1252'
    ? note('read-as-latin-1', 'The file is not written in UTF-8, so it was read as Windows-1252 (Latin-1).')
    : []

export const passedOver = (headerRows: number): ReadingsNote[] =>
  headerRows > 1
    ? note('rows-passed-over', `The first ${headerRows} rows hold no readings and were passed over.`)
    : []

export const notTaken = (rows: number): ReadingsNote[] =>
  rows > 0
    ? note(
        'empty-at-end',
        `${rows === 1 ? 'The last row holds' : `The last ${rows} rows hold`} no reading yet and ${rows === 1 ? 'was' : 'were'} passed over.`,
      )
    : []

/** Said where a workbook has several sheets and nobody named one. */
export function sheetNotes({ sheets, sheet }: Table, named: boolean): ReadingsNote[] {
  const visible = sheets.filter(({ hidden }) => !hidden)
  return visible.length > 1 && !named
    ? note(
        'sheet-chosen',
        `The workbook has ${visible.length} sheets; ${sheet} was read. Choose another if the readings stand elsewhere.`,
      )
    : []
}

/** Readings out of sight, as a filter leaves them, are easily taken without being meant. */
export function hiddenNotes({ rows, hiddenColumns }: Table, cells: readonly Cell[]): ReadingsNote[] {
  const hidden = new Set(rows.flatMap(({ row, hidden }) => (hidden ? [row] : [])))
  const letters = new Set(hiddenColumns)
  const out = cells.filter(
    ({ row, column, text }) => text !== '' && (hidden.has(row) || letters.has(letterOf(column))),
  )
  return out.length > 0
    ? note(
        'hidden-cells',
        `${out.length === 1 ? 'One of the readings stands' : `${out.length} of the readings stand`} in hidden rows or columns of the sheet. Show them in the spreadsheet, and take out what does not belong.`,
      )
    : []
}

export const orderNotes = (inOrder: boolean): ReadingsNote[] =>
  inOrder
    ? []
    : note(
        'run-sheet-order',
        'The rows are not in the order of the run sheet; the readings were taken as they stand. Sort by the column No. first, unless they were measured in this order.',
      )
