import { letterOf } from '../../../tables/letters'
import type { TableRow } from '../../../tables/table'

/** What the first cell of a run sheet says, so that the sheet is known when it comes back filled in. */
export const runSheetTitle = (code: string): string => `Run sheet of study ${code}`
export const runSheetNumber = 'No.'
export const runSheetReading = (measuredAs: 'value' | 'deviation', unit: string): string =>
  `${measuredAs === 'deviation' ? 'Deviation' : 'Reading'} (${unit})`

const title = /^Run sheet of study (.+)$/
const reading = /^(Reading|Deviation) \(.+\)$/

/** A run sheet of ours that came back. */
export interface RunSheetFound {
  /** Code of the study it was made for. */
  code: string
  headerRows: number
  column: string
  /** Whether its rows still stand in its order. */
  inOrder: boolean
}

/** Knows a run sheet of ours by its title and its headings, wherever a spreadsheet has saved it. */
export function runSheetIn(rows: readonly TableRow[]): RunSheetFound | null {
  const code = title.exec(rows[0]?.cells[0]?.trim() ?? '')?.[1]
  if (code === undefined) return null
  const at = rows.slice(0, 12).findIndex(({ cells }) => cells[0]?.trim() === runSheetNumber)
  const column = rows[at]?.cells.findIndex((cell) => reading.test(cell.trim())) ?? -1
  if (at < 0 || column < 0) return null
  const numbers = rows.slice(at + 1).flatMap(({ cells }) => (cells[0] ? [Number(cells[0])] : []))
  const inOrder = numbers.every((number, index) => index === 0 || number > (numbers[index - 1] ?? 0))
  return { code: code.trim(), headerRows: at + 1, column: letterOf(column), inOrder }
}
