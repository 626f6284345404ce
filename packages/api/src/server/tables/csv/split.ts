import { parse } from 'csv-parse/sync'
import type { Separator } from '../../../contract/tables'
import { letterOf } from '../letters'
import type { BrokenCell } from '../table'
import { unstorableAt, unstorableCell } from '../unstorable'

const characters: Record<Separator, string> = {
  comma: ',',
  semicolon: ';',
  tab: '\t',
  // Nothing that a file could hold: every line is one cell, but quotes still count.
  none: '\u0001one cell\u0001',
}

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

/** Without any quote a line is a row and every separator separates: no parser is needed, and it is ten times as fast. */
const plainRecords = (text: string, separator: Separator): string[][] =>
  text
    .split('\n')
    .map((line) =>
      (separator === 'none' ? [line] : line.split(characters[separator])).map((cell) => cell.trim()),
    )

const oddQuotes = (cell: string): boolean => (cell.match(/"/g)?.length ?? 0) % 2 === 1

/** Empty cells at the end of a row, and empty rows at the end, say nothing. */
export function withoutTrailing(rows: readonly (readonly string[])[]): string[][] {
  const cut = rows.map((row) => row.slice(0, row.findLastIndex((cell) => cell.trim() !== '') + 1))
  return cut.slice(0, cut.findLastIndex((row) => row.length > 0) + 1)
}

/** Splits text into rows of cells; where a quote is never closed, says where and splits without quotes. */
export function splitRows(
  text: string,
  separator: Separator,
): { rows: string[][]; broken: BrokenCell | null } {
  if (!text.includes('"')) return { rows: withoutTrailing(plainRecords(text, separator)), broken: null }
  try {
    return { rows: withoutTrailing(records(text, separator, true)), broken: null }
  } catch {
    const rows = withoutTrailing(plainRecords(text, separator))
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

/** The first character that cannot be stored, with its place. */
export function unstorableIn(text: string, separator: Separator): BrokenCell | null {
  const at = unstorableAt(text)
  if (at < 0) return null
  const lines = text.slice(0, at).split('\n')
  const before = (lines.at(-1) ?? '').replace(/"[^"]*"/g, '').split(characters[separator])
  return {
    code: 'unstorable-character',
    row: lines.length,
    column: letterOf(before.length - 1),
    ...unstorableCell(text.charCodeAt(at), before.at(-1) ?? ''),
  }
}
