import type { ReadAs, ReadingsInput, ReadingsPreview } from '../../../../contract/readings'
import { mostReadings, type CellError } from '../../../../contract/readings'
import { invalidInput } from '../../../errors'
import type { Table } from '../../../tables/table'
import { cellsOf, decimalOf, readCells, untilLast, type Reading } from './cells'
import { columnsOf, headerRowsOf, type Column } from './columns'
import { commaBoth, joinDecimals } from './join-decimals'
import { layoutOf, type Layout } from './layout'
import { columnsLesson, nothingRemembered, ofHeadings, type Lesson, type Remembered } from './memory'
import { encodingNotes, hiddenNotes, notTaken, orderNotes, passedOver, sheetNotes } from './notes'
import { runSheetIn, type RunSheetFound } from './run-sheet-file'

export interface ReadReadings extends Pick<
  ReadingsPreview,
  'readAs' | 'columns' | 'firstRows' | 'rows' | 'notes' | 'mayLeaveOut' | 'remembered' | 'sheets'
> {
  readings: Reading[]
  errors: CellError[]
  /** Where the table is a run sheet of ours: the study it belongs to. */
  runSheet: RunSheetFound | null
  lessons: Lesson[]
}

/** What is wanted of a table: as the sender says, or as it is remembered. */
export type Wanted = Pick<ReadingsInput, 'source' | 'sheet' | 'layout' | 'columns' | 'headerRows' | 'decimal'>

/** The readings in a table; every cell without one is named with its place and how to mend it. */
export function readingsOf(table: Table, wanted: Wanted, remembered = nothingRemembered): ReadReadings {
  const runSheet = runSheetIn(table.rows)
  const headings = headingsOf(table, wanted, runSheet)
  const { columns } = headings
  const recalled = recalledFor(wanted, headings, runSheet ? nothingRemembered : remembered)
  const { headerRows, rows, joined } = recalled
    ? headingsOf(table, { ...wanted, headerRows: recalled.headerRows }, runSheet)
    : headings
  const asked = runSheet && !wanted.columns ? { ...wanted, columns: [runSheet.column] } : wanted
  const layout = layoutOf(recalled ? { ...wanted, ...recalled } : asked, rows, headerRows, columns)
  const indices = layout.columns.map(({ index }) => index)
  const { cells, emptyRowsAtEnd } = untilLast(cellsOf(rows, headerRows, indices))
  const decimal = wanted.decimal ?? decimalOf(cells)
  const { readings, errors } = table.broken
    ? { readings: [], errors: [table.broken] }
    : readCells(cells, decimal, rows, !layout.across)
  refuseTooMany(readings.length, wanted)
  return {
    readAs: readAsOf(table, { decimal, headerRows, layout }),
    remembered: recalled !== undefined,
    sheets: table.sheets,
    columns: columnChoices(columns, layout),
    firstRows: firstRows(rows),
    rows: rows.length,
    ...{ readings, errors, runSheet },
    mayLeaveOut: readings.length > 0 && errors.length > 0,
    notes: [
      ...encodingNotes(table),
      ...sheetNotes(table, wanted.sheet !== undefined),
      ...(runSheet ? orderNotes(runSheet.inOrder) : passedOver(headerRows)),
      ...notTaken(emptyRowsAtEnd),
      ...hiddenNotes(table, cells),
      ...(table.dialect?.note ? [{ ...table.dialect.note, readings: [] }] : []),
      ...[joined ? commaBoth : null, layout.note].filter((each) => each !== null),
    ],
    lessons: lessonsOf(wanted, { rows, headerRows, columns, layout }),
  }
}

function headingsOf(table: Table, wanted: Wanted, runSheet: RunSheetFound | null) {
  const texts = table.rows.map(({ cells }) => cells)
  const headerRows =
    wanted.headerRows ?? (wanted.source === 'typed' ? 0 : (runSheet?.headerRows ?? headerRowsOf(texts)))
  const join = table.dialect?.separator === 'comma' && wanted.decimal !== 'point'
  const { rows: joinedRows, joined } = join ? joinDecimals(texts, headerRows) : { rows: texts, joined: false }
  const rows = joined
    ? table.rows.map((row, at) => ({ ...row, cells: joinedRows[at] ?? row.cells }))
    : table.rows
  return { headerRows, rows, joined, columns: columnsOf(joinedRows, headerRows) }
}

type Headings = ReturnType<typeof headingsOf>

/** How a table with these headings was read before, unless the sender says how. */
function recalledFor(
  { columns: named, layout, headerRows }: Wanted,
  { columns }: Headings,
  { columns: all }: Remembered,
) {
  if (named ?? layout ?? headerRows) return undefined
  const signature = ofHeadings(columns.map(({ name }) => name))
  const recalled = signature === null ? undefined : all[signature]
  const letters = new Set(columns.map(({ letter }) => letter))
  return recalled?.columns.every((letter) => letters.has(letter)) ? recalled : undefined
}

function lessonsOf(
  wanted: Wanted,
  {
    rows,
    headerRows,
    columns,
    layout,
  }: Pick<Headings, 'rows' | 'headerRows' | 'columns'> & { layout: Layout },
): Lesson[] {
  if (!wanted.columns && !wanted.layout) return []
  const asColumns = ({ layout: name, columns: taken }: Layout) => ({
    ...{ layout: name, headerRows },
    columns: taken.map(({ letter }) => letter),
  })
  if (layout.columns.length === 0) return []
  const found = layoutOf({ source: wanted.source }, rows, headerRows, columns)
  return columnsLesson(
    columns.map(({ name }) => name),
    asColumns(layout),
    asColumns(found),
  )
}

const readAsOf = (
  { kind, sheet, dialect }: Table,
  { decimal, headerRows, layout }: Pick<ReadAs, 'decimal' | 'headerRows'> & { layout: Layout },
): ReadAs => ({
  kind,
  sheet,
  encoding: dialect?.encoding ?? null,
  byteOrderMark: dialect?.byteOrderMark ?? false,
  separator: dialect?.separator ?? null,
  decimal,
  layout: layout.layout,
  headerRows,
  columns: layout.columns.map(({ letter }) => letter),
  columnNames: layout.columns.map(({ name }) => name),
})

const columnChoices = (columns: readonly Column[], layout: Layout): ReadingsPreview['columns'] => {
  const chosen = new Set(layout.columns.map(({ letter }) => letter))
  return columns
    .filter(({ numbers, letter }) => numbers > 0 || chosen.has(letter))
    .map(({ letter, name, numbers }) => ({ letter, name, numbers, chosen: chosen.has(letter) }))
}

function refuseTooMany(count: number, { source }: Wanted): void {
  if (count <= mostReadings) return
  const most = mostReadings.toLocaleString('en-GB')
  throw invalidInput([
    {
      path: source === 'uploaded' ? 'body.file' : 'body.text',
      message: `These are ${count.toLocaleString('en-GB')} readings; one study holds at most ${most}. Split them into several studies.`,
    },
  ])
}

const firstRows = (rows: Table['rows']): ReadingsPreview['firstRows'] =>
  rows.slice(0, 12).map(({ row, cells }) => ({
    row,
    cells: cells.slice(0, 30).map((cell) => cell.slice(0, 60)),
  }))
