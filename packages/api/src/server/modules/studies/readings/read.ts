import {
  mostReadings,
  type CellError,
  type ReadAs,
  type ReadingsInput,
  type ReadingsNote,
  type ReadingsPreview,
} from '../../../../contract/readings'
import { invalidInput } from '../../../errors'
import type { UploadedFile } from '../../../http/route'
import { readText } from '../../../tables/csv/read-text'
import { columnOf, letterOf } from '../../../tables/letters'
import { asWritten, meantAsNumber, readCell } from '../../../tables/numbers'
import { readTable } from '../../../tables/read-table'
import { refusedFile } from '../../../tables/refuse'
import type { Table, TextDialect } from '../../../tables/table'
import type { LeftOutRow } from '../studies.table'
import { columnsOf, headerRowsOf, readingColumn, type Column } from './columns'
import { commaBoth, joinDecimals } from './join-decimals'

export interface ReadReadings extends Pick<
  ReadingsPreview,
  'readAs' | 'columns' | 'firstRows' | 'rows' | 'readings' | 'notes' | 'mayLeaveOut'
> {
  errors: CellError[]
}

interface Cell {
  row: number
  column: number
  text: string
}

/**
 * Reads typed, pasted or uploaded readings. What the sender does not say about the dialect is detected and named;
 * every cell without a number is named with its row, its column and how to mend it. Nothing is stored.
 */
export async function readReadings(
  input: ReadingsInput,
  file: UploadedFile | undefined,
): Promise<ReadReadings> {
  return readingsOf(await tableOf(input, file), input, file)
}

/** The readings in a table. */
export function readingsOf(
  { rows: all, dialect, broken: unreadable }: Table,
  input: ReadingsInput,
  file: UploadedFile | undefined,
): ReadReadings {
  if (!dialect)
    throw refusedFile(
      'This is a workbook. Save the sheet with the readings as CSV and upload that, or copy the cells and paste them.',
    )
  const { separator, note } = dialect
  const split = { rows: all.map(({ cells }) => cells) }
  const headerRows = input.headerRows ?? (input.source === 'typed' ? 0 : headerRowsOf(split.rows))
  const { rows, joined } =
    separator === 'comma' && input.decimal !== 'point'
      ? joinDecimals(split.rows, headerRows)
      : { rows: split.rows, joined: false }
  const columns = columnsOf(rows, headerRows)
  const direction = input.direction ?? directionOf(input, rows, headerRows)
  const chosen = direction === 'across' ? { note: null } : chosenColumn(input, columns)
  const { cells, emptyAtEnd } = untilLast(cellsOf(rows, headerRows, chosen.column?.index))
  const decimal = input.decimal ?? decimalOf(cells)
  const { readings, errors } = unreadable
    ? { readings: [], errors: [unreadable] }
    : readCells(cells, decimal, rows, chosen.column)
  refuseTooMany(readings.length, file)
  return {
    readAs: {
      encoding: dialect.encoding,
      byteOrderMark: dialect.byteOrderMark,
      separator,
      decimal,
      direction,
      headerRows,
      column: chosen.column?.letter ?? null,
      columnName: chosen.column?.name ?? null,
    },
    columns: columns
      .filter(({ numbers }) => numbers > 0)
      .map(({ letter, name, numbers }) => ({
        letter,
        name,
        numbers,
        chosen: letter === chosen.column?.letter,
      })),
    firstRows: firstRows(rows),
    rows: rows.length,
    readings,
    errors,
    mayLeaveOut: readings.length > 0 && errors.length > 0,
    notes: [
      ...encodingNotes(dialect),
      ...passedOver(headerRows),
      ...notTaken(emptyAtEnd),
      ...(direction === 'across' ? [acrossNote] : []),
      ...[note && { ...note, readings: [] }, joined ? commaBoth : null, chosen.note].filter(
        (each) => each !== null,
      ),
    ],
  }
}

/** Rows that were left out because they hold no number where a reading belongs. */
export const leftOutOf = ({ errors }: Pick<ReadReadings, 'errors'>): LeftOutRow[] =>
  errors.map(({ row, column, text }) => ({ row, column, text }))

async function tableOf(input: ReadingsInput, file: UploadedFile | undefined): Promise<Table> {
  const { text, separator, source } = input
  if (file && text !== undefined)
    throw invalidInput([{ path: 'body.text', message: 'Send either a file or text, not both.' }])
  if (file) return readTable(file, input)
  if (text === undefined || text.trim() === '')
    throw invalidInput([
      { path: 'body.text', message: 'There are no readings. Type or paste them, or choose a file.' },
    ])
  return readText(text, separator ?? (source === 'typed' ? 'none' : undefined))
}

function directionOf(
  { source, column }: ReadingsInput,
  rows: readonly string[][],
  headerRows: number,
): ReadAs['direction'] {
  const data = rows.filter((row) => row.length > 0)
  const numbers = (data[0] ?? []).filter((cell) => asWritten(cell) !== undefined)
  const single = data.length === 1 && headerRows === 0 && numbers.length > 1
  return single && column === undefined && source !== 'typed' ? 'across' : 'down'
}

function chosenColumn(
  { column: letter }: ReadingsInput,
  columns: readonly Column[],
): { column?: Column; note: ReadingsNote | null } {
  if (letter === undefined) {
    const found = readingColumn(columns)
    return found.column ? found : { ...(columns[0] ? { column: columns[0] } : {}), note: null }
  }
  const column = columns[columnOf(letter)]
  if (column) return { column, note: null }
  throw invalidInput([
    {
      path: 'body.column',
      message: `There is no column ${letter}; the last one is ${columns.at(-1)?.letter ?? 'missing too'}.`,
    },
  ])
}

/** The cells in which readings belong: of one column downwards, or of every row from left to right. */
function cellsOf(rows: readonly string[][], headerRows: number, column: number | undefined): Cell[] {
  const cells: Cell[] = []
  for (const [at, row] of rows.entries()) {
    if (at < headerRows || row.length === 0) continue
    if (column !== undefined) {
      cells.push({ row: at + 1, column, text: (row[column] ?? '').trim() })
      continue
    }
    const [first = ''] = row
    const labelled = first.trim() !== '' && asWritten(first) === undefined && !meantAsNumber(first)
    for (const [index, cell] of row.entries())
      if (index > 0 || !labelled) cells.push({ row: at + 1, column: index, text: cell.trim() })
  }
  return cells
}

/** Cells up to the last that is filled; the rest of a run sheet has not been taken yet. */
function untilLast(cells: readonly Cell[]): { cells: Cell[]; emptyAtEnd: number } {
  const end = cells.findLastIndex(({ text }) => text !== '') + 1
  return { cells: cells.slice(0, end), emptyAtEnd: cells.length - end }
}

/** The decimal mark that most of the readings were written with. */
function decimalOf(cells: readonly Cell[]): ReadAs['decimal'] {
  let more = 0
  for (const { text } of cells) {
    const mark = asWritten(text)?.mark
    if (mark) more += mark === 'comma' ? 1 : -1
  }
  return more > 0 ? 'comma' : 'point'
}

const summaryWords =
  /^\s*(mean|average|avg|sum|total|count|std\.?( ?dev\.?)?|standard deviation|range|median|min(imum)?|max(imum)?|mittelwert|summe|standardabweichung|spannweite|moyenne|somme|media|suma)\s*:?$/i

function readCells(
  cells: readonly Cell[],
  decimal: ReadAs['decimal'],
  rows: readonly string[][],
  column: Column | undefined,
): Pick<ReadReadings, 'readings' | 'errors'> {
  const readings: ReadReadings['readings'] = []
  const errors: CellError[] = []
  for (const cell of cells) {
    const { row, text } = cell
    const place = { row, column: letterOf(cell.column), text: text.slice(0, 60) }
    const label = column && rows[row - 1]?.find((each, at) => at !== column.index && summaryWords.test(each))
    const read = readCell(text, decimal)
    if (label && 'value' in read)
      errors.push({
        ...place,
        code: 'summary-row',
        message: `This row is called “${label.slice(0, 40)}”, so it looks like a figure about the readings. Remove the row, or leave it out.`,
      })
    else if ('value' in read) readings.push({ row, text, value: read.value })
    else errors.push({ ...place, ...read })
  }
  return { readings, errors }
}

function refuseTooMany(count: number, file: UploadedFile | undefined): void {
  if (count <= mostReadings) return
  const most = mostReadings.toLocaleString('en-GB')
  throw invalidInput([
    {
      path: file ? 'body.file' : 'body.text',
      message: `These are ${count.toLocaleString('en-GB')} readings; one study holds at most ${most}. Split them into several studies.`,
    },
  ])
}

const firstRows = (rows: readonly string[][]): ReadingsPreview['firstRows'] =>
  rows.slice(0, 12).map((row, at) => ({
    row: at + 1,
    cells: row.slice(0, 30).map((cell) => cell.slice(0, 60)),
  }))

const acrossNote: ReadingsNote = {
  code: 'read-across',
  message: 'There is one row of numbers, so the readings were taken from left to right.',
  readings: [],
}

const encodingNotes = ({ encoding }: TextDialect): ReadingsNote[] =>
  encoding === 'windows-1252'
    ? [
        {
          code: 'read-as-latin-1',
          message: 'The file is not written in UTF-8, so it was read as Windows-1252 (Latin-1).',
          readings: [],
        },
      ]
    : []

const passedOver = (headerRows: number): ReadingsNote[] =>
  headerRows > 1
    ? [
        {
          code: 'rows-passed-over',
          message: `The first ${headerRows} rows hold no numbers and were passed over.`,
          readings: [],
        },
      ]
    : []

const notTaken = (rows: number): ReadingsNote[] =>
  rows > 0
    ? [
        {
          code: 'empty-at-end',
          message: `${rows === 1 ? 'The last row holds' : `The last ${rows} rows hold`} no reading yet and ${rows === 1 ? 'was' : 'were'} passed over.`,
          readings: [],
        },
      ]
    : []
