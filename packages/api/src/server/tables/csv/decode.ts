import type { Encoding } from '../../../contract/tables'
import type { UploadedFile } from '../../http/route'
import { refusedFile } from '../refuse'

export interface Decoded {
  text: string
  encoding: Encoding
  byteOrderMark: boolean
}

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
 * The text of an uploaded file. A byte order mark tells the encoding; without one it is UTF-16 where every second byte
 * is zero, UTF-8 where the bytes are valid UTF-8, and Windows-1252 (which contains Latin-1) otherwise, unless the
 * sender says which.
 */
export function decodeFile({ name, bytes }: UploadedFile, wanted?: Encoding): Decoded {
  const mark = marks.find((each) => each.bytes.every((byte, at) => bytes[at] === byte))
  const wide = mark?.encoding === 'utf-16' ? mark.label : unmarkedWide(bytes)
  const encoding = wanted ?? mark?.encoding ?? (wide ? 'utf-16' : undefined)
  const byteOrderMark = mark !== undefined && mark.encoding === encoding
  if (encoding === 'utf-16' || encoding === 'utf-8') {
    const label = encoding === 'utf-16' ? (wide ?? 'utf-16le') : 'utf-8'
    const text = decodeStrictly(bytes, label)
    if (text === undefined)
      throw refusedFile(
        `${name} is not written in ${encoding.toUpperCase()}. Choose another encoding, or save it again as CSV in UTF-8.`,
        wanted ? 'body.encoding' : 'body.file',
      )
    return { text: refuseBinary(name, text), encoding, byteOrderMark }
  }
  const text = encoding === undefined ? decodeStrictly(bytes, 'utf-8') : undefined
  return text === undefined
    ? { text: refuseBinary(name, decodeWindows1252(bytes)), encoding: 'windows-1252', byteOrderMark }
    : { text: refuseBinary(name, text), encoding: 'utf-8', byteOrderMark }
}

/** UTF-16 without a byte order mark: text of western languages has a zero in nearly every other byte. */
function unmarkedWide(bytes: Buffer): 'utf-16le' | 'utf-16be' | undefined {
  const sample = bytes.subarray(0, 2000)
  if (sample.length < 8 || bytes.length % 2 === 1) return undefined
  const zeros = [0, 0]
  for (const [at, byte] of sample.entries()) if (byte === 0) zeros[at % 2] = (zeros[at % 2] ?? 0) + 1
  const [even = 0, odd = 0] = zeros
  const most = sample.length * 0.4
  if (odd > most && even === 0) return 'utf-16le'
  return even > most && odd === 0 ? 'utf-16be' : undefined
}

// eslint-disable-next-line no-control-regex -- control characters are what gives a binary file away
const control = /[\u0000-\u0008\u000e-\u001f\u007f\ufffd]/g

/** A single stray character is told at its place; many of them are no text. */
function refuseBinary(name: string, text: string): string {
  const sample = text.slice(0, 4000)
  const odd = sample.match(control)?.length ?? 0
  if (odd > 4 && odd * 20 > sample.length)
    throw refusedFile(
      `${name} is neither text nor a workbook, whatever its name says. Choose the XLSX or CSV file with the table.`,
    )
  return text
}
