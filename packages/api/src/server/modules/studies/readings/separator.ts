import type { ReadingsNote } from '../../../../contract/readings'
import { asWritten } from './numbers'
import type { Separator } from './split'

export interface Separated {
  separator: Separator
  note: ReadingsNote | null
}

const note = (code: ReadingsNote['code'], message: string): ReadingsNote => ({ code, message, readings: [] })

const asDecimal = note(
  'comma-read-as-decimal',
  'Each line holds one comma, which was read as the decimal mark of one number. If it separates two columns, choose comma as the separator.',
)
const asSeparator = note(
  'comma-read-as-separator',
  'The comma was read as the separator between columns. If it marks decimals, choose “none” as the separator.',
)
export const commaBoth = note(
  'comma-both',
  'The comma stands both between the columns and in the numbers: the last two pieces of each row were read as one number. Check the readings, or save the file with semicolons.',
)

const outsideQuotes = (line: string): string => line.replace(/"[^"]*"/g, '""')
/** One number with a decimal comma, and perhaps a unit after it. */
const oneDecimal = /^\s*[+\-\u2212\u2013]?\d*,\d+(e[+-]?\d{1,3})?[^\d,]*$/i
const first = (line: string): string => line.split(',')[0] ?? ''
const whole = /^\d+$/
const signed = /^[+\-\u2212\u2013]?\d+$/

/** The separator of a text: the one that stands in most lines. Commas may mark decimals instead. */
export function detectSeparator(text: string): Separated {
  const lines = text
    .split('\n', 400)
    .filter((line) => line.trim() !== '')
    .slice(0, 200)
  const inMost = (character: string): boolean =>
    lines.filter((line) => outsideQuotes(line).includes(character)).length * 2 >= lines.length
  const plain = (separator: Separator): Separated => ({ separator, note: null })
  if (inMost('\t')) return plain('tab')
  if (inMost(';')) return plain('semicolon')
  return inMost(',') ? ofCommas(lines) : plain('none')
}

/** A comma in most lines: separator, or decimal mark of the only number in the line? */
function ofCommas(lines: readonly string[]): Separated {
  const data = lines.filter((line) => oneDecimal.test(line) || asWritten(first(line)) !== undefined)
  const alone = data.filter((line) => oneDecimal.test(line) || asWritten(line) !== undefined)
  // A decimal point beside the comma proves that the comma separates; one bad cell proves nothing.
  const pointed = data.some((line) => line.split(',').some((piece) => asWritten(piece)?.mark === 'point'))
  if (pointed || alone.length * 2 < data.length || data.length === 0)
    return { separator: 'comma', note: null }
  const above = lines.slice(0, lines.indexOf(data[0] ?? ''))
  const columnsNamed = above.some((line) => line.split(',').filter((name) => name.trim() !== '').length === 2)
  if (columnsNamed || counts(data.map(first))) return { separator: 'comma', note: asSeparator }
  return { separator: 'none', note: asDecimal }
}

/** Whether the texts count 1, 2, 3, … as a column of numbers of readings does. */
export const counts = (texts: readonly string[], fewest = 3): boolean =>
  texts.length >= fewest && texts.every((text, at) => text.trim() === String(at + 1))

/**
 * Rows whose commas separate columns and mark decimals as well: all pieces are whole numbers, and there is one piece
 * more than columns are named, or the first pieces count the rows and the last are fractions. The last two pieces of
 * each row are then one number.
 */
export function joinDecimals(
  rows: readonly string[][],
  headerRows: number,
): { rows: string[][]; joined: boolean } {
  const data = rows.slice(headerRows).filter((row) => row.length > 0)
  const width = data[0]?.length ?? 0
  const allWhole = data.every((row) => row.length === width && row.slice(-2).every(isPiece))
  const named = rows[headerRows - 1]?.length
  const surplus = named !== undefined && named === width - 1
  const numbered =
    headerRows === 0 && width === 3 && counts(data.map(([first = '']) => first)) && someFraction(data)
  if (width < 2 || !allWhole || !(surplus || numbered)) return { rows: [...rows], joined: false }
  return {
    rows: rows.map((row, at) =>
      at < headerRows || row.length === 0 ? row : [...row.slice(0, -2), row.slice(-2).join(',')],
    ),
    joined: true,
  }
}

/** The part of a number before its decimal comma, or after it. */
const isPiece = (piece: string, at: number): boolean => (at === 0 ? signed : whole).test(piece.trim())

/** A piece such as 001 is the fraction of a number and no number of its own. */
const someFraction = (data: readonly string[][]): boolean => data.some((row) => /^0\d/.test(row.at(-1) ?? ''))
