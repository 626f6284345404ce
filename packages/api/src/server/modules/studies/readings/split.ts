import { parse } from 'csv-parse/sync'
import type { CellError, ReadAs } from '../../../../contract/readings'

export type Separator = ReadAs['separator']

const characters: Record<Separator, string> = {
  comma: ',',
  semicolon: ';',
  tab: '\t',
  // Nothing that a file could hold: every line is one cell, but quotes still count.
  none: '\u0001one cell\u0001',
}

/** The letter of a column as spreadsheets name it, from zero: A, B, …, Z, AA. */
export function letterOf(column: number): string {
  const rest = column >= 26 ? letterOf(Math.floor(column / 26) - 1) : ''
  return rest + String.fromCharCode(65 + (column % 26))
}

/** The column of a letter, from zero. */
export const columnOf = (letter: string): number =>
  [...letter].reduce((sum, each) => sum * 26 + each.charCodeAt(0) - 64, 0) - 1

/** Line ends of every system become the same one. */
export const lineEnds = (text: string): string => text.replace(/\r\n?/g, '\n')

function records(text: string, separator: Separator, quotes: boolean): string[][] {
  return parse(text, {
    delimiter: characters[separator],
    quote: quotes ? '"' : null,
    escape: '"',
    relax_column_count: true,
    relax_quotes: true,
    record_delimiter: '\n',
    ltrim: true,
    rtrim: true,
    skip_empty_lines: false,
  })
}

const oddQuotes = (cell: string): boolean => (cell.match(/"/g)?.length ?? 0) % 2 === 1

/** Empty cells at the end of a row, and empty rows at the end, say nothing. */
function withoutTrailing(rows: string[][]): string[][] {
  const cut = rows.map((row) => row.slice(0, row.findLastIndex((cell) => cell.trim() !== '') + 1))
  return cut.slice(0, cut.findLastIndex((row) => row.length > 0) + 1)
}

/** Splits text into rows of cells; where a quote is never closed, says where and splits without quotes. */
export function splitRows(
  text: string,
  separator: Separator,
): { rows: string[][]; broken: CellError | null } {
  try {
    return { rows: withoutTrailing(records(text, separator, true)), broken: null }
  } catch {
    const rows = withoutTrailing(records(text, separator, false))
    const row = rows.findIndex((cells) => cells.some(oddQuotes))
    const column = (rows[row] ?? []).findIndex(oddQuotes)
    const cell = rows[row]?.[column] ?? ''
    return {
      rows,
      broken: {
        code: 'broken-quotes',
        row: row + 1,
        column: letterOf(Math.max(column, 0)),
        text: cell.slice(0, 60),
        message: 'A quotation mark begins here and does not end. Remove it, or close it after the cell.',
      },
    }
  }
}

/** Characters that the database cannot hold: U+0000 and halves of a pair. */
const unstorable = /\u0000|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/ // eslint-disable-line no-control-regex -- it is what is refused

/** The first character that cannot be stored, with its place. */
export function unstorableIn(text: string, separator: Separator): CellError | null {
  const found = unstorable.exec(text)
  if (!found) return null
  const lines = text.slice(0, found.index).split('\n')
  const before = (lines.at(-1) ?? '').replace(/"[^"]*"/g, '').split(characters[separator])
  const name = `U+${found[0].charCodeAt(0).toString(16).toUpperCase().padStart(4, '0')}`
  return {
    code: 'unstorable-character',
    row: lines.length,
    column: letterOf(before.length - 1),
    text: `${(before.at(-1) ?? '').slice(-50)}\ufffd`,
    message: `This cell holds the character ${name}, which cannot be stored. Remove it, or export the readings anew.`,
  }
}
