import type { ReadAs } from '../../../../contract/readings'
import { invalidInput, type ProblemError } from '../../../errors'
import type { UploadedFile } from '../../../http/route'
import { contentTypeOf } from '../../files/files.content'

export interface Decoded extends Pick<ReadAs, 'encoding' | 'byteOrderMark'> {
  text: string
}

const refused = (message: string, path = 'body.file'): ProblemError => invalidInput([{ path, message }])

/** What Windows-1252 has where Latin-1 has control characters; Node's own decoder leaves them as they are. */
const windowsOnly = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ'

const decodeWindows1252 = (bytes: Buffer): string =>
  bytes
    .toString('latin1')
    .replace(/[\u0080-\u009f]/g, (each) => windowsOnly[each.charCodeAt(0) - 0x80] ?? each)

const marks = [
  { encoding: 'utf-8', label: 'utf-8', bytes: [0xef, 0xbb, 0xbf] },
  { encoding: 'utf-16', label: 'utf-16le', bytes: [0xff, 0xfe] },
  { encoding: 'utf-16', label: 'utf-16be', bytes: [0xfe, 0xff] },
] as const

/** Decodes strictly; undefined where the bytes are not of this encoding. Takes a byte order mark away. */
function decodeStrictly(bytes: Buffer, label: string): string | undefined {
  try {
    return new TextDecoder(label, { fatal: true }).decode(bytes)
  } catch {
    return undefined
  }
}

/**
 * The text of an uploaded file. A byte order mark tells the encoding; without one it is UTF-8 where the bytes are
 * valid UTF-8, and Windows-1252 (which contains Latin-1) otherwise, unless the sender says which.
 */
export function decodeFile({ name, bytes }: UploadedFile, wanted?: ReadAs['encoding']): Decoded {
  if (bytes.length === 0) throw refused(`${name} is empty. Choose the file with the readings.`)
  refuseOtherFormats(name, bytes)
  const mark = marks.find((each) => each.bytes.every((byte, at) => bytes[at] === byte))
  const encoding = wanted ?? mark?.encoding
  const byteOrderMark = mark !== undefined && mark.encoding === encoding
  if (encoding === 'windows-1252') return { text: decodeWindows1252(bytes), encoding, byteOrderMark }
  if (encoding === undefined) {
    const text = decodeStrictly(bytes, 'utf-8')
    return text === undefined
      ? { text: decodeWindows1252(bytes), encoding: 'windows-1252', byteOrderMark }
      : { text, encoding: 'utf-8', byteOrderMark }
  }
  const text = decodeStrictly(
    bytes,
    byteOrderMark ? mark.label : encoding === 'utf-16' ? 'utf-16le' : 'utf-8',
  )
  if (text === undefined)
    throw refused(
      `${name} is not written in ${encoding.toUpperCase()}. Choose another encoding, or save it again as CSV in UTF-8.`,
      wanted ? 'body.encoding' : 'body.file',
    )
  return { text, encoding, byteOrderMark }
}

/** Says what to do with a file that is no text, by its first bytes and not by its name. */
function refuseOtherFormats(name: string, bytes: Buffer): void {
  const head = bytes.subarray(0, 8).toString('latin1')
  if (head.startsWith('PK\u0003\u0004') || head.startsWith('\u00d0\u00cf\u0011\u00e0'))
    throw refused(
      `${name} is a workbook. Save the sheet with the readings as CSV and upload that, or copy the cells and paste them.`,
    )
  const type = contentTypeOf(bytes)
  if (type !== null && type !== 'text/csv')
    throw refused(`${name} is a ${type.split('/')[1]?.toUpperCase() ?? ''} file. Upload the readings as CSV.`)
}
