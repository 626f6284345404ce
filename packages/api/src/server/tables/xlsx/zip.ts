import { crc32, inflateRawSync } from 'node:zlib'
import { fromBufferPromise, type Entry, type ZipFile } from 'yauzl'
import type { UploadedFile } from '../../http/route'
import { limits } from '../limits'
import { refusedFile } from '../refuse'

/** The parts of a workbook, inflated on demand and within limits. */
export interface Parts {
  /** Bytes of a part by its path; undefined where the workbook has none of this name. */
  read(path: string): Buffer | undefined
  /** Bytes that all parts together are said to hold. */
  declared: number
}

interface Part {
  entry: Entry
  start: number
}

/** A workbook whose bytes contradict themselves. */
export const damaged = ({ name }: Pick<UploadedFile, 'name'>, what: string) =>
  refusedFile(`${name} is damaged: ${what}. Open it in a spreadsheet program and save it again as XLSX.`)

const tooMuch = ({ name }: Pick<UploadedFile, 'name'>) =>
  refusedFile(
    `${name} unpacks to more than ${limits.inflated / 1_000_000} MB, which is more than is read at once. Remove what is not needed, or split it into several files.`,
  )

/** Opens a workbook's container: its directory is checked whole before anything is inflated. */
export async function openParts(file: UploadedFile): Promise<Parts> {
  const { name, bytes } = file
  const parts = await directoryOf(file)
  let inflated = 0
  return {
    declared: [...parts.values()].reduce((sum, { entry }) => sum + entry.uncompressedSize, 0),
    read(path) {
      const part = parts.get(path.toLowerCase())
      if (!part) return undefined
      const { entry, start } = part
      inflated += entry.uncompressedSize
      if (inflated > limits.inflated) throw tooMuch(file)
      return inflate({ name }, bytes.subarray(start, start + entry.compressedSize), entry)
    },
  }
}

async function directoryOf(file: UploadedFile): Promise<Map<string, Part>> {
  const parts = new Map<string, Part>()
  try {
    const zip = await fromBufferPromise(file.bytes, { lazyEntries: true, decodeStrings: true })
    if (zip.entryCount > limits.entries)
      throw refusedFile(
        `${file.name} holds ${zip.entryCount.toLocaleString('en-GB')} parts; a workbook of at most ${limits.entries.toLocaleString('en-GB')} is read. Save the sheet alone as XLSX or CSV.`,
      )
    await takeEntries(file, zip, parts)
  } catch (error) {
    throw explained(file, error)
  }
  refuseOverlaps(file, [...parts.values()])
  return parts
}

/** What the reader of the container says, in words for the person who chose the file. */
function explained(file: UploadedFile, error: unknown): unknown {
  if (!(error instanceof Error) || 'status' in error) return error
  if (/relative path|absolute path|invalid characters/i.test(error.message))
    return refusedFile(
      `${file.name} holds a part whose name points outside of it, as no spreadsheet program writes it. Save the table anew as XLSX or CSV.`,
    )
  return damaged(file, 'it ends too early, or its directory cannot be read')
}

async function takeEntries(file: UploadedFile, zip: ZipFile, parts: Map<string, Part>): Promise<void> {
  for await (const entry of zip.eachEntry()) {
    if (entry.fileName.endsWith('/')) continue
    if (entry.isEncrypted())
      throw refusedFile(`${file.name} is protected by a password. Save it without one and choose it again.`)
    if (entry.compressionMethod !== 0 && entry.compressionMethod !== 8)
      throw damaged(file, 'it is packed in a way that workbooks are not')
    const path = entry.fileName.toLowerCase()
    if (parts.has(path)) throw damaged(file, `it holds the part ${entry.fileName.slice(0, 60)} twice`)
    const { fileDataStart } = await zip.readLocalFileHeaderPromise(entry, { minimal: true })
    parts.set(path, { entry, start: fileDataStart })
  }
}

/** Parts that share bytes are how a small file is made to unpack to a huge one. */
function refuseOverlaps(file: UploadedFile, parts: readonly Part[]): void {
  const sorted = parts.toSorted((a, b) => begin(a) - begin(b))
  let end = 0
  for (const part of sorted) {
    const last = part.start + part.entry.compressedSize
    if (begin(part) < end || last > file.bytes.length) throw damaged(file, 'its parts overlap')
    end = last
  }
}

const begin = ({ entry }: Part): number => entry.relativeOffsetOfLocalHeader

function inflate(
  file: Pick<UploadedFile, 'name'>,
  bytes: Buffer,
  { compressionMethod, uncompressedSize, crc32: sum, fileName }: Entry,
): Buffer {
  const wrong = () => damaged(file, `the part ${fileName.slice(0, 60)} is not what the directory says`)
  let inflated: Buffer
  try {
    inflated =
      compressionMethod === 0
        ? bytes
        : inflateRawSync(bytes, { maxOutputLength: Math.max(uncompressedSize, 1) })
  } catch {
    throw wrong()
  }
  if (inflated.length !== uncompressedSize || crc32(inflated) !== sum) throw wrong()
  return inflated
}
