import { invalidInput, type ProblemError } from '../../errors'
import type { UploadedFile } from '../../http/route'
import { isWorkbook, otherFormat, tableTypes } from '../../tables/content'

/** The types of file that the product takes; told by content, never by name. */
export type ContentType =
  'application/pdf' | 'image/png' | 'image/jpeg' | (typeof tableTypes)[keyof typeof tableTypes]

const startsWith = (bytes: Buffer, ...head: number[]): boolean =>
  head.every((byte, index) => bytes[index] === byte)

/** The type that the first bytes of a file prove, or null where they prove none that is taken here. */
export function contentTypeOf(bytes: Buffer): ContentType | null {
  // Writers may put a few bytes before a PDF's header; readers look for it in the first kilobyte.
  if (bytes.subarray(0, 1024).includes('%PDF-')) return 'application/pdf'
  if (startsWith(bytes, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) return 'image/png'
  if (startsWith(bytes, 0xff, 0xd8, 0xff)) return 'image/jpeg'
  if (isWorkbook(bytes)) return tableTypes.xlsx
  return isText(bytes) && !otherFormat(bytes) ? tableTypes.csv : null
}

/** Text in UTF-8 or Latin-1: no control characters but tab and line ends. */
function isText(bytes: Buffer): boolean {
  return (
    bytes.length > 0 &&
    bytes.every((byte) => (byte >= 0x20 ? byte !== 0x7f : byte === 0x09 || byte === 0x0a || byte === 0x0d))
  )
}

/** The certificate types. */
export const certificateTypes = ['application/pdf', 'image/png', 'image/jpeg'] as const

/** The type of an uploaded certificate; refuses anything that is no PDF, PNG or JPEG, whatever it is called. */
export function certificateType(file: UploadedFile): ContentType {
  const type = contentTypeOf(file.bytes)
  if (type && (certificateTypes as readonly ContentType[]).includes(type)) return type
  throw notOfType(file, 'PDF, PNG or JPEG', 'Save the certificate as one of these and choose it again.')
}

/** Refuses a file by its content, saying what it is where that is known. */
export function notOfType({ name, bytes }: UploadedFile, wanted: string, mend: string): ProblemError {
  const is =
    bytes.length === 0
      ? 'is empty'
      : `is ${otherFormat(bytes)?.name ?? `no ${wanted} file`}, whatever its name says`
  return invalidInput([
    { path: 'body.file', message: `${name} ${is}. Files are taken as ${wanted}. ${mend}` },
  ])
}

// Control characters, marks that turn the direction of text, lone surrogates, and what some systems forbid.
const unwanted =
  // eslint-disable-next-line no-control-regex -- the control characters are what is removed
  /[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\u2066-\u2069\ufeff\ud800-\udfff"<>|:*?]/g

/** A file's name as it is kept and shown: without folders, and not so long that it cannot be saved again. */
export function cleanFileName(name: string): string {
  const bare = (name.split(/[\\/]/).pop() ?? '')
    .normalize('NFC')
    .replace(unwanted, '')
    .replace(/^[\s.]+|[\s.]+$/g, '')
  if (bare.length <= 120) return bare || 'file'
  const ending = /\.[A-Za-z0-9]{1,8}$/.exec(bare)?.[0] ?? ''
  return bare.slice(0, 120 - ending.length) + ending
}
