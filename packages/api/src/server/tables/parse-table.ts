import type { TableChoice } from '../../contract/tables'
import type { UploadedFile } from '../http/route'
import { kindOf } from './content'
import { readTextFile } from './csv/read-text'
import type { Table } from './table'
import { readWorkbookFile } from './xlsx/read-workbook'

/** Reads a file's table on the thread it is called on; see `readTable`, which keeps heavy ones off the server's. */
export async function parseTable(file: UploadedFile, choice: TableChoice = {}): Promise<Table> {
  return kindOf(file) === 'xlsx' ? readWorkbookFile(file, choice) : readTextFile(file, choice)
}
