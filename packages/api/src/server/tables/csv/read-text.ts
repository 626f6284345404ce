import type { Separator, TableChoice } from '../../../contract/tables'
import type { UploadedFile } from '../../http/route'
import { tableTypes } from '../content'
import { refuseOversize } from '../refuse'
import type { Table, TextDialect } from '../table'
import { decodeFile } from './decode'
import { detectSeparator, type Separated } from './separator'
import { lineEnds, splitRows, unstorableIn } from './split'

/** The table of a text file. */
export function readTextFile(file: UploadedFile, choice: TableChoice): Table {
  const { text, encoding, byteOrderMark } = decodeFile(file, choice.encoding)
  return readText(text, choice.separator, { encoding, byteOrderMark })
}

/** The table of a text that came without a file: typed or pasted. */
export function readText(
  text: string,
  wanted?: Separator,
  source: Pick<TextDialect, 'encoding' | 'byteOrderMark'> = { encoding: 'utf-8', byteOrderMark: false },
): Table {
  const { separator, note, rest } = separatorOf(lineEnds(text.replace(/^\ufeff/, '')), wanted)
  const { rows, broken } = splitRows(rest, separator)
  refuseOversize({
    rows: rows.length,
    columns: rows.reduce((most, row) => Math.max(most, row.length), 0),
    cells: rows.reduce((sum, row) => sum + row.length, 0),
    characters: rest.length,
  })
  return {
    kind: 'csv',
    contentType: tableTypes.csv,
    rows: rows.map((cells, at) => ({ row: at + 1, cells })),
    broken: unstorableIn(rest, separator) ?? broken,
    dialect: { ...source, separator, note },
    sheets: [],
    sheet: null,
    hiddenColumns: [],
  }
}

const named: Record<string, Separator> = { ',': 'comma', ';': 'semicolon', '\t': 'tab' }

/** Spreadsheets may write the separator into a first line of its own, such as `sep=;`. */
function separatorOf(text: string, wanted: Separator | undefined): Separated & { rest: string } {
  const [line = ''] = text.split('\n', 1)
  const said = /^"?sep=(.)"?\s*$/i.exec(line)?.[1]
  const rest = said === undefined ? text : text.slice(line.length)
  const separator = wanted ?? named[said ?? '']
  return separator ? { separator, note: null, rest } : { ...detectSeparator(rest), rest }
}
