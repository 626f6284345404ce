import type { TableChoice } from '../../contract/tables'
import type { UploadedFile } from '../http/route'
import { runOnThread } from '../thread/run'
import { kindOf } from './content'
import { light } from './limits'
import { parseTable } from './parse-table'
import type { Table } from './table'
import { openParts } from './xlsx/zip'

/**
 * Reads the table of a CSV or XLSX file into rows of text. What the file is follows from its content; what cannot be
 * read is refused, saying what it is and how to mend it. Large files are read on a thread of their own.
 */
export async function readTable(file: UploadedFile, choice: TableChoice = {}): Promise<Table> {
  return (await isLight(file)) ? parseTable(file, choice) : runOnThread('table', file, choice)
}

/** Whether a file is small once unpacked, so that reading it keeps nobody waiting. */
export async function isLight(file: UploadedFile): Promise<boolean> {
  const { bytes } = file
  if (kindOf(file) === 'csv') return bytes.length <= light.text
  return bytes.length <= light.inflated && (await openParts(file)).declared <= light.inflated
}
