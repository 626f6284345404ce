import type { TableChoice } from '../../../contract/tables'
import type { UploadedFile } from '../../http/route'
import { tableTypes } from '../content'
import { refusedFile } from '../refuse'
import type { Table } from '../table'
import { readDateStyles } from './dates'
import { readSheet } from './sheet'
import { readStrings } from './strings'
import { readWorkbook } from './workbook'
import { openParts } from './zip'

/** The table of one sheet of a workbook: the chosen one, or the first visible one that holds anything. */
export async function readWorkbookFile(file: UploadedFile, choice: TableChoice): Promise<Table> {
  const parts = await openParts(file)
  const { sheets, from1904, stylesPath = '', stringsPath = '' } = readWorkbook(file, parts)
  const candidates = candidatesOf(file, sheets, choice.sheet)
  const how = {
    strings: readStrings(file, stringsPath, parts.read(stringsPath)),
    dateStyles: readDateStyles(file, stylesPath, parts.read(stylesPath)),
    from1904,
  }
  let table: Table | undefined
  for (const { name, path } of candidates) {
    const bytes = parts.read(path)
    if (!bytes) throw refusedFile(`The sheet ${name} is missing in ${file.name}. Save the workbook again.`)
    const read: Table = {
      kind: 'xlsx',
      contentType: tableTypes.xlsx,
      ...readSheet(file, path, bytes, how),
      dialect: null,
      sheets: sheets.map(({ name, hidden }) => ({ name, hidden })),
      sheet: name,
    }
    table ??= read
    if (read.rows.length > 0) return read
  }
  return table as Table
}

function candidatesOf<S extends { name: string; hidden: boolean }>(
  file: UploadedFile,
  sheets: readonly S[],
  wanted: string | undefined,
): S[] {
  if (sheets.length === 0)
    throw refusedFile(`${file.name} has no sheet with cells. Choose the workbook with the table.`)
  if (wanted === undefined) {
    const visible = sheets.filter(({ hidden }) => !hidden)
    return (visible.length > 0 ? visible : [...sheets]).slice(0, 20)
  }
  const chosen = sheets.find(({ name }) => name === wanted)
  if (chosen) return [chosen]
  const names = sheets.slice(0, 20).map(({ name }) => name)
  throw refusedFile(
    `${file.name} has no sheet called ${wanted}. Choose one of: ${names.join(', ')}.`,
    'body.sheet',
  )
}
