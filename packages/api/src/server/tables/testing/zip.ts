import { crc32, deflateRawSync } from 'node:zlib'

/** A part of a ZIP file, and what its headers should say where that is to be wrong. */
export interface ZipPart {
  name: string
  content: string | Buffer
  /** The size that the directory declares. */
  declared?: number
  /** Where the directory says that the part begins: at the part of this index. */
  sharesBytesOf?: number
  flags?: number
  method?: number
}

/** Writes a ZIP file byte by byte, well formed or wrong in the way that a test asks for. */
export function zipOf(parts: readonly ZipPart[]): Buffer {
  const local: Buffer[] = []
  const central: Buffer[] = []
  const offsets: number[] = []
  let at = 0
  for (const { name, content, declared, sharesBytesOf, flags = 0, method = 8 } of parts) {
    const bytes = Buffer.from(content)
    const packed = method === 8 ? deflateRawSync(bytes) : bytes
    const fileName = Buffer.from(name)
    offsets.push(at)
    const common = Buffer.alloc(26)
    common.writeUInt16LE(20, 0)
    common.writeUInt16LE(flags, 2)
    common.writeUInt16LE(method, 4)
    common.writeUInt32LE(crc32(bytes), 10)
    common.writeUInt32LE(packed.length, 14)
    common.writeUInt32LE(declared ?? bytes.length, 18)
    common.writeUInt16LE(fileName.length, 22)
    const head = Buffer.concat([Buffer.from('PK\u0003\u0004'), common, fileName])
    if (sharesBytesOf === undefined) {
      local.push(head, packed)
      at += head.length + packed.length
    }
    const rest = Buffer.alloc(14)
    rest.writeUInt32LE(
      sharesBytesOf === undefined ? (offsets.at(-1) ?? 0) : (offsets[sharesBytesOf] ?? 0),
      10,
    )
    central.push(Buffer.from('PK\u0001\u0002'), Buffer.from([20, 0]), common, rest, fileName)
  }
  const directory = Buffer.concat(central)
  const end = Buffer.alloc(18)
  end.writeUInt16LE(parts.length, 4)
  end.writeUInt16LE(parts.length, 6)
  end.writeUInt32LE(directory.length, 8)
  end.writeUInt32LE(at, 12)
  return Buffer.concat([...local, directory, Buffer.from('PK\u0005\u0006'), end])
}
