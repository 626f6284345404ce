import { refusedFile } from './refuse'
import type { TableKind } from '../../contract/tables'
import type { UploadedFile } from '../http/route'

/** The content types a table's file is kept under. */
export const tableTypes = {
  csv: 'text/csv',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
} as const satisfies Record<TableKind, string>

/** Whether bytes begin with these; "?" stands for any byte. */
const begins = (bytes: Buffer, head: string): boolean =>
  [...head].every((each, at) => each === '?' || bytes[at] === each.charCodeAt(0))

const zip = 'PK\u0003\u0004'
const asXlsx = 'Open it in a spreadsheet program and save it as XLSX or CSV.'
const instead = 'Choose the XLSX or CSV file instead.'

/** Binary files by their first bytes, with how to mend. */
const heads: readonly (readonly [head: string, name: string, mend: string])[] = [
  ['%PDF-', 'a PDF file', 'Export the table itself as XLSX or CSV.'],
  ['\u0089PNG', 'a PNG picture', instead],
  ['\u00ff\u00d8\u00ff', 'a JPEG picture', instead],
  ['GIF8', 'a GIF picture', instead],
  ['BM????\u0000\u0000\u0000\u0000', 'a bitmap picture', instead],
  ['RIFF????WEBP', 'a WebP picture', instead],
  ['II*\u0000', 'a TIFF picture', instead],
  ['MM\u0000*', 'a TIFF picture', instead],
  ['{\\rtf', 'a text document (RTF)', asXlsx],
  ['\u001f\u008b', 'a compressed file (GZIP)', 'Unpack it and choose the file inside.'],
  ['7z\u00bc\u00af', 'a compressed file (7z)', 'Unpack it and choose the file inside.'],
  ['Rar!', 'a compressed file (RAR)', 'Unpack it and choose the file inside.'],
  ['SQLite format 3', 'a database file', 'Export the table as XLSX or CSV.'],
  ['MZ', 'a program', instead],
  ['\u007fELF', 'a program', instead],
]

/** Parts by which the files that are zipped like a workbook tell themselves apart. */
const zipped: readonly (readonly [part: string, name: string, mend: string])[] = [
  ['xl/workbook.bin', 'a binary workbook (XLSB)', asXlsx],
  ['xl/vbaProject.bin', 'a workbook with macros (XLSM)', 'Save it as XLSX, without macros, or as CSV.'],
  [
    'application/vnd.oasis.opendocument.spreadsheet',
    'an OpenDocument spreadsheet (ODS)',
    'Save it as XLSX or CSV.',
  ],
  ['application/vnd.oasis.opendocument', 'an OpenDocument file', asXlsx],
  ['Index/Document.iwa', 'a spreadsheet of a kind that is not read here', 'Export it as XLSX or CSV.'],
  ['word/document.xml', 'a text document (DOCX)', 'Copy the table into a spreadsheet and save it as XLSX.'],
  ['ppt/presentation.xml', 'a presentation (PPTX)', 'Copy the table into a spreadsheet and save it as XLSX.'],
]

/** What the head of a text tells of it where it is no CSV. */
const texts: readonly (readonly [pattern: RegExp, name: string, mend: string])[] = [
  [/^<(!doctype html|html|head|body|table|meta)\b/i, 'a web page (HTML), whatever its name says', asXlsx],
  [/urn:schemas-microsoft-com:office:spreadsheet/, 'an XML spreadsheet of 2003', asXlsx],
  [/^<\?xml|^<[a-z][\w:.-]*[\s>]/i, 'an XML file', 'Export the table as XLSX or CSV.'],
  [/^[{[]\s*["{[]/, 'a JSON file', 'Export the table as XLSX or CSV.'],
]

/** Whether the bytes are those of an XLSX workbook, by the name of its main part. */
export const isWorkbook = (bytes: Buffer): boolean =>
  begins(bytes, zip) && bytes.includes('xl/workbook.xml') && zippedAs(bytes) === undefined

const zippedAs = (bytes: Buffer) => zipped.find(([part]) => bytes.includes(part))

/** Whether the file is a CSV or an XLSX by its content; refuses anything else, saying what it is and how to mend it. */
export function kindOf({ name, bytes }: UploadedFile): TableKind {
  if (bytes.length === 0) throw refusedFile(`${name} is empty. Choose the file with the table.`)
  const refuse = (what: string, mend: string) => refusedFile(`${name} is ${what}. ${mend}`)
  if (begins(bytes, zip)) {
    const other = zippedAs(bytes)
    if (other) throw refuse(other[1], other[2])
    if (isWorkbook(bytes)) return 'xlsx'
    throw refuse('a ZIP file', 'Unpack it and choose the XLSX or CSV file inside.')
  }
  if (begins(bytes, 'PK\u0005\u0006')) throw refuse('an empty ZIP file', instead)
  if (begins(bytes, '\u00d0\u00cf\u0011\u00e0')) {
    const holds = (stream: string) => bytes.includes(Buffer.from(stream, 'utf16le'))
    if (holds('EncryptedPackage'))
      throw refuse('a workbook with a password', 'Save it without a password and choose it again.')
    if (holds('Workbook') || holds('Book'))
      throw refuse('an old binary workbook (XLS)', 'Save it as XLSX or CSV and choose that.')
    throw refuse('an old office document', asXlsx)
  }
  const other = heads.find(([head]) => begins(bytes, head))
  if (other) throw refuse(other[1], other[2])
  const head = bytes
    .subarray(0, 2000)
    .toString('latin1')
    .replace(/^(\u00ef\u00bb\u00bf)?\s*/, '')
  const text = texts.find(([pattern]) => pattern.test(head))
  if (text) throw refuse(text[1], text[2])
  return 'csv'
}
