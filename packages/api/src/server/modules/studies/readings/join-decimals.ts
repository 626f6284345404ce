import type { ReadingsNote } from '../../../../contract/readings'
import { counts } from '../../../tables/csv/separator'

export const commaBoth: ReadingsNote = {
  code: 'comma-both',
  message:
    'The comma stands both between the columns and in the numbers: the last two pieces of each row were read as one number. Check the readings, or save the file with semicolons.',
  readings: [],
}

const whole = /^\d+$/
const signed = /^[+\-\u2212\u2013]?\d+$/

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
