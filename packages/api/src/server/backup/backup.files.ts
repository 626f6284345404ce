import { mkdir, readFile, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import type { FileStore } from '../integrations/file-store'
import { sha256 } from '../modules/record/record.append'
import type { Manifest } from './backup.manifest'
import { BackupProblem } from './backup.problem'

type Entry = Manifest['files'][number]

/** How many files are on their way at once. */
const lanes = 4

/** Works through the items, a few at a time. After a failure none is begun, and those under way are waited for. */
async function inLanes<T, R>(items: readonly T[], work: (item: T) => Promise<R>): Promise<R[]> {
  const results: R[] = []
  let next = 0
  const lane = async () => {
    for (let at = next++; at < items.length; at = next++) {
      try {
        results[at] = await work(items[at] as T)
      } catch (error) {
        next = items.length
        throw error
      }
    }
  }
  const ended = await Promise.allSettled(Array.from({ length: lanes }, lane))
  const failed = ended.find((outcome) => outcome.status === 'rejected')
  if (failed) throw failed.reason
  return results
}

const said = (error: unknown): string => (error instanceof Error ? error.message : String(error))

/**
 * Copies files out of the store into a folder. They are in the store before the rows that name them and never
 * change or go, so that those of a snapshot can be fetched after it while the product is in use.
 *
 * @throws {BackupProblem} naming the file that the store does not hold whole
 */
export function copyOut(store: FileStore, keys: readonly string[], folder: string): Promise<Entry[]> {
  return inLanes(keys, async (key) => {
    const bytes = await store.get(key).catch((error: unknown) => {
      throw new BackupProblem(`The file store does not give ${key}: ${said(error)}. No backup was made.`)
    })
    const path = join(folder, key)
    await mkdir(dirname(path), { recursive: true })
    await writeFile(path, bytes, { flag: 'wx' })
    return { key, bytes: bytes.length, sha256: sha256(bytes) }
  })
}

/**
 * Puts the files of a backup into the store and reads each back. Those that are there already stay; nothing is
 * ever removed, since a file's key is its content.
 *
 * @throws {BackupProblem} where the store gives other bytes back
 */
export async function copyIn(store: FileStore, files: readonly Entry[], folder: string): Promise<void> {
  await inLanes(files, async ({ key }) => {
    const held = await store.get(key).then(
      () => true,
      () => false,
    )
    if (held) return
    try {
      await store.put(await readFile(join(folder, key)))
      await store.get(key)
    } catch (error) {
      throw new BackupProblem(
        `The file store does not take ${key}: ${said(error)}. The database was not touched. Mend the store (an object that is damaged there must be removed first), then restore again.`,
      )
    }
  })
}
