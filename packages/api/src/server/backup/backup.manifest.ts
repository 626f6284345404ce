import { createHash } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { readFile, stat, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { z } from 'zod'
import { BackupProblem } from './backup.problem'

const hash = z.string().regex(/^[0-9a-f]{64}$/)

/** What a backup holds, with the hash of each thing: whatever does not fit its hash is not put back. */
const manifestSchema = z.object({
  format: z.literal(1),
  product: z.string(),
  madeAt: z.iso.datetime(),
  database: z.object({
    file: z.literal('database.dump'),
    bytes: z.number().int(),
    sha256: hash,
    /** Version of the server that it was taken from. */
    server: z.string(),
    migrations: z.array(z.object({ madeAt: z.number().int(), sha256: hash })),
  }),
  /** Where every chain of the record ended. */
  record: z.array(z.object({ chainId: z.uuid(), sequence: z.number().int(), hash })),
  files: z.array(
    z.object({
      key: z.string().regex(/^files\/[0-9a-f]{2}\/[0-9a-f]{64}$/),
      bytes: z.number().int(),
      sha256: hash,
    }),
  ),
})

export type Manifest = z.infer<typeof manifestSchema>

const manifestName = 'manifest.json'
export const dumpName = 'database.dump'

/** Writes the manifest, which is what makes a folder a backup; it comes last. */
export async function writeManifest(folder: string, manifest: Manifest): Promise<void> {
  await writeFile(join(folder, manifestName), `${JSON.stringify(manifest, null, 1)}\n`, { flag: 'wx' })
}

/**
 * Reads the manifest of a backup.
 *
 * @throws {BackupProblem} where there is none, or none that this program can read
 */
export async function readManifest(folder: string): Promise<Manifest> {
  const text = await readFile(join(folder, manifestName), 'utf8').catch((error: NodeJS.ErrnoException) => {
    if (error.code !== 'ENOENT' && error.code !== 'ENOTDIR') throw error
    throw new BackupProblem(
      `${folder} is no complete backup: it has no ${manifestName}, which is written last. Name the folder that npm run backup has told.`,
    )
  })
  const parsed = manifestSchema.safeParse(parseJson(text))
  if (parsed.success) return parsed.data
  const [issue] = parsed.error.issues
  throw new BackupProblem(
    `${join(folder, manifestName)} cannot be read: ${issue?.path.join('.') || 'it'} is not as Evenrule writes it. Take another backup, or the version of Evenrule that made this one.`,
  )
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

/** Size and SHA-256 of a file, read in pieces. */
export async function measure(path: string): Promise<{ bytes: number; sha256: string }> {
  const sum = createHash('sha256')
  await pipeline(createReadStream(path), sum)
  return { bytes: (await stat(path)).size, sha256: sum.digest('hex') }
}

/**
 * Proves that everything the manifest names is there, with the very bytes it names.
 *
 * @throws {BackupProblem} naming the first thing that is not, and how many there are
 */
export async function requireWhole(folder: string, { database, files }: Manifest): Promise<void> {
  const parts = [database, ...files.map((file) => ({ file: file.key, sha256: file.sha256 }))]
  const faulty: string[] = []
  for (const { file, sha256 } of parts) {
    const found = await measure(join(folder, file)).catch((error: NodeJS.ErrnoException) => {
      if (error.code !== 'ENOENT') throw error
      return undefined
    })
    if (!found) faulty.push(`${file} is missing`)
    else if (found.sha256 !== sha256) faulty.push(`${file} does not have the hash that was noted for it`)
  }
  if (faulty.length === 0) return
  const more = faulty.length > 1 ? `, and ${faulty.length - 1} more` : ''
  throw new BackupProblem(
    `The backup in ${folder} is damaged: ${faulty[0]}${more}. Nothing was changed; copy the backup afresh from where it is kept, or take another one.`,
  )
}
