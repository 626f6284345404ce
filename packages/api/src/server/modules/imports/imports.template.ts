import ExcelJS from 'exceljs'
import type { ImportKind } from '../../../contract/imports'
import type { Side } from '../../../contract/access'
import { csvText } from '../../csv-export'
import type { Download } from '../../http/route'
import { tableTypes } from '../../tables/content'
import { fieldsOf } from './imports.source'
import type { Field } from './rows/fields'

/** Columns for readings side by side in the template of studies. */
const readingColumns = 30

interface Wanted {
  format: 'csv' | 'xlsx'
  layout: 'wide' | 'long'
}

/** Names of the template's columns. */
const headings = (fields: readonly Field[], layout: Wanted['layout']): string[] =>
  fields.flatMap(({ label, type }) =>
    type === 'decimals' && layout === 'wide'
      ? Array.from({ length: readingColumns }, (_, at) => `${label} ${at + 1}`)
      : [label],
  )

/** A file to fill in: the names of the columns alone; as a workbook with a second sheet that explains them. */
export async function templateOf(
  kind: ImportKind,
  side: Side,
  { format, layout }: Wanted,
): Promise<Download> {
  const fields = fieldsOf(kind, side)
  const names = headings(fields, layout)
  const name = `${kind}${kind === 'studies' && layout === 'long' ? ', a row for each reading' : ''}.${format}`
  if (format === 'csv') return { name, contentType: 'text/csv; charset=utf-8', bytes: csvText([names]) }
  return { name, contentType: tableTypes.xlsx, bytes: await workbookOf(kind, fields, names) }
}

async function workbookOf(
  kind: ImportKind,
  fields: readonly Field[],
  names: readonly string[],
): Promise<Buffer> {
  const workbook = new ExcelJS.Workbook()
  const sheet = workbook.addWorksheet(sheetNames[kind], { views: [{ state: 'frozen', ySplit: 1 }] })
  // As text, so that a program keeps 24.000 and 2026-03-02 as they are typed.
  sheet.columns = names.map((header) => ({
    header,
    width: Math.max(header.length + 2, 12),
    style: { numFmt: '@' },
  }))
  sheet.getRow(1).font = { bold: true }
  const help = workbook.addWorksheet('How to fill in')
  help.columns = [
    { header: 'Column', width: 34 },
    { header: 'Needed', width: 10 },
    { header: 'What to enter', width: 90 },
    { header: 'Example', width: 20, style: { numFmt: '@' } },
  ]
  help.getRow(1).font = { bold: true }
  for (const { label, required, hint, example } of fields)
    help.addRow([label, required ? 'yes' : '', hint, example])
  help.addRow([])
  for (const line of notes[kind]) help.addRow(['', '', line])
  for (const row of help.getRows(1, help.rowCount) ?? []) row.alignment = { wrapText: true, vertical: 'top' }
  return Buffer.from(await workbook.xlsx.writeBuffer())
}

const sheetNames: Record<ImportKind, string> = { parts: 'Parts', gauges: 'Gauges', studies: 'Studies' }

const always = [
  'An empty cell leaves what is there already as it is.',
  'Numbers may have a decimal point or a decimal comma, the same in the whole file, and no separator between thousands.',
  'The names of the columns may be changed and the columns moved; after choosing the file you can say which is which.',
]

const notes: Record<ImportKind, string[]> = {
  parts: ['One row for each characteristic.', ...always],
  gauges: ['One row for each calibration; a gauge without one has one row.', ...always],
  studies: [
    'Studies taken over so are marked as not registered beforehand; the customer is told.',
    'A study is imported as a whole: where one of its rows is bad, none of them is taken.',
    ...always.slice(1),
  ],
}
