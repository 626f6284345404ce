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
  [/^<(!doctype html|html|head|body|table|meta)\b/i, 'a web page (HTML)', asXlsx],
  [/urn:schemas-microsoft-com:office:spreadsheet/, 'an XML spreadsheet of 2003', asXlsx],
  [/^<\?xml|^<[a-z][\w:.-]*[\s>]/i, 'an XML file', 'Export the table as XLSX or CSV.'],
  [/^[{[]\s*["{[]/, 'a JSON file', 'Export the table as XLSX or CSV.'],
]

/** Whether the bytes are those of an XLSX workbook, by the name of its main part. */
export const isWorkbook = (bytes: Buffer): boolean =>
  begins(bytes, zip) && bytes.includes('xl/workbook.xml') && zippedAs(bytes) === undefined

const zippedAs = (bytes: Buffer) => zipped.find(([part]) => bytes.includes(part))

interface Other {
  /** Such as "a PDF file". */
  name: string
  mend: string
}

/** Whether the file is a CSV or an XLSX by its content; refuses anything else, saying what it is and how to mend it. */
export function kindOf({ name, bytes }: UploadedFile): TableKind {
  if (bytes.length === 0) throw refusedFile(`${name} is empty. Choose the file with the table.`)
  const other = otherFormat(bytes)
  if (other) throw refusedFile(`${name} is ${other.name}, whatever its name says. ${other.mend}`)
  return isWorkbook(bytes) ? 'xlsx' : 'csv'
}

/** What a file is by its content, where that is known and neither a CSV nor an XLSX. */
export function otherFormat(bytes: Buffer): Other | undefined {
  if (begins(bytes, zip)) return isWorkbook(bytes) ? undefined : otherZip(bytes)
  if (begins(bytes, 'PK\u0005\u0006')) return { name: 'an empty ZIP file', mend: instead }
  if (begins(bytes, '\u00d0\u00cf\u0011\u00e0')) return otherOffice(bytes)
  const [, name, mend = ''] = heads.find(([head]) => begins(bytes, head)) ?? textFormat(bytes) ?? []
  return name === undefined ? undefined : { name, mend }
}

function otherZip(bytes: Buffer): Other {
  const [, name, mend] = zippedAs(bytes) ?? []
  return name !== undefined && mend !== undefined
    ? { name, mend }
    : { name: 'a ZIP file', mend: 'Unpack it and choose the XLSX or CSV file inside.' }
}

/** Files of the office programs before 2007, in which workbooks with a password are wrapped to this day. */
function otherOffice(bytes: Buffer): Other {
  const holds = (stream: string) => bytes.includes(Buffer.from(stream, 'utf16le'))
  if (holds('EncryptedPackage'))
    return { name: 'a workbook with a password', mend: 'Save it without a password and choose it again.' }
  return holds('Workbook') || holds('Book')
    ? { name: 'an old binary workbook (XLS)', mend: 'Save it as XLSX or CSV and choose that.' }
    : { name: 'an old office document', mend: asXlsx }
}

function textFormat(bytes: Buffer) {
  const head = bytes
    .subarray(0, 2000)
    .toString('latin1')
    .replace(/^(\u00ef\u00bb\u00bf)?\s*/, '')
  return texts.find(([pattern]) => pattern.test(head))
}
