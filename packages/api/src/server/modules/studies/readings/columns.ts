import type { ReadingsNote } from '../../../../contract/readings'
import { asWritten, meantAsNumber } from '../../../tables/numbers'
import { counts } from '../../../tables/csv/separator'
import { letterOf } from '../../../tables/letters'

/** Rows above the first number: names of columns, titles, units. */
export function headerRowsOf(rows: readonly string[][]): number {
  const first = rows.findIndex((row) =>
    row.some((cell) => asWritten(cell) !== undefined || meantAsNumber(cell)),
  )
  // Without any number there is nothing to stand above.
  if (first < 0) return 0
  return countsItsColumns(rows[first] ?? [], rows[first + 1] ?? []) ? first + 1 : first
}

/** A row such as Part, 1, 2, 3 above fractions names the columns, though it holds numbers. */
function countsItsColumns(row: readonly string[], below: readonly string[]): boolean {
  const numbered = row.flatMap((cell, at) => (/^\d{1,3}$/.test(cell.trim()) ? [at] : []))
  const names = row.filter((cell) => cell.trim() !== '')
  return (
    numbered.length > 1 &&
    names.length > numbered.length &&
    counts(
      numbered.map((at) => row[at] ?? ''),
      2,
    ) &&
    names.every((cell) => asWritten(cell) === undefined || /^\d{1,3}$/.test(cell.trim())) &&
    numbered.every((at) => (asWritten(below[at] ?? '')?.mark ?? null) !== null)
  )
}

export interface Column {
  index: number
  letter: string
  name: string | null
  numbers: number
  /** Counts the rows 1, 2, 3, …, or is called a number of them. */
  running: boolean
  fractions: boolean
}

/** What the columns hold below the header rows. */
export function columnsOf(rows: readonly string[][], headerRows: number): Column[] {
  const data = rows.slice(headerRows).filter((row) => row.length > 0)
  const width = Math.min(
    rows.reduce((most, row) => Math.max(most, row.length), 0),
    702,
  )
  const names = namesIn(rows.slice(0, headerRows))
  return Array.from({ length: width }, (_each, index) => {
    const cells = data.map((row) => row[index] ?? '')
    const written = cells.map(asWritten).filter((each) => each !== undefined)
    return {
      index,
      letter: letterOf(index),
      name: names[index]?.trim() || null,
      numbers: written.length,
      running: counts(cells, 2) || numberWords.test(names[index]?.trim() ?? ''),
      fractions: written.some(({ mark }) => mark !== null),
    }
  })
}

/** The header row that names the most columns; the lowest of them where several do. */
function namesIn(header: readonly string[][]): string[] {
  const filled = (row: readonly string[]) => row.filter((cell) => cell !== '').length
  return header.reduce<string[]>((best, row) => (filled(row) >= filled(best) ? row : best), [])
}

/** Words that name a column of readings, in the languages this trade's programs export in. */
const readingWords =
  /reading|measure|value|actual|deviation|result|messwert|istwert|wert|abweichung|mesure|valeur|lectura|valor|lettura|misura|pomiar|wartość/i

/** Words that name a column which counts the rows. */
const numberWords = /^(n[or]\.?|no|#|id|index|pos\.?|number|row|zeile|lfd\.? ?nr\.?)$/i

/** The column to take the readings from, the first of the best; undefined where no column holds numbers. */
export function readingColumn(columns: readonly Column[]): { column?: Column; note: ReadingsNote | null } {
  const candidates = columns.filter(({ numbers }) => numbers > 0)
  const most = Math.max(...candidates.filter(({ running }) => !running).map(({ numbers }) => numbers), 0)
  const rank = ({ name, running, fractions, numbers }: Column): number =>
    (running ? 0 : 16) +
    (numbers * 2 >= most ? 8 : 0) +
    (name !== null && readingWords.test(name) ? 4 : 0) +
    (fractions ? 2 : 0)
  const column = candidates.reduce<Column | undefined>(
    (best, each) => (best === undefined || rank(each) > rank(best) ? each : best),
    undefined,
  )
  const others = candidates.filter((each) => each !== column && !each.running && each.numbers * 2 >= most)
  if (!column || others.length === 0) return { ...(column ? { column } : {}), note: null }
  const called = ({ letter, name }: Column) => (name === null ? letter : `${letter} (${name})`)
  return {
    column,
    note: {
      code: 'column-chosen',
      message: `Columns ${[column, ...others].map(called).sort().join(', ')} hold numbers. The readings were taken from ${called(column)}; choose another column if they stand elsewhere.`,
      readings: [],
    },
  }
}
