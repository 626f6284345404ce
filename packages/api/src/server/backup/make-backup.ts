import { existsSync } from 'node:fs'
import { mkdir, rename, rm } from 'node:fs/promises'
import { dirname, join, resolve } from 'node:path'
import type { FileStore } from '../integrations/file-store'
import { copyOut } from './backup.files'
import { dumpName, measure, writeManifest, type Manifest } from './backup.manifest'
import { BackupProblem } from './backup.problem'
import { noteDatabase } from './backup.snapshot'
import { asOwner } from './owner'
import { startProgram } from './postgres-program'

export interface BackupSource {
  ownerUrl: string
  store: FileStore
  postgresBin: string | undefined
  /** Version of the program, noted for whoever restores. */
  product: string
  now: Date
}

/**
 * Backs up an instance, in use or not: the database in one snapshot, then every file that it names, then the
 * manifest. Made under another name first, so that what carries the wanted name is whole.
 *
 * Sessions are left out: whoever held one would be signed in again by a restore.
 *
 * @throws {BackupProblem} where the folder exists or something cannot be read
 */
export async function makeBackup(source: BackupSource, folder: string): Promise<Manifest> {
  const wanted = resolve(folder)
  if (existsSync(wanted))
    throw new BackupProblem(
      `${wanted} exists already, and no backup is ever overwritten; name another folder.`,
    )
  const draft = `${wanted}.partial`
  await rm(draft, { recursive: true, force: true })
  await mkdir(dirname(wanted), { recursive: true })
  // People's names and addresses are in it: for its owner alone.
  await mkdir(draft, { mode: 0o700 })
  const manifest = await fillBackup(source, draft)
  await rename(draft, wanted)
  return manifest
}

function fillBackup(source: BackupSource, folder: string): Promise<Manifest> {
  return asOwner(source.ownerUrl, async (client) => {
    await client.query('begin isolation level repeatable read read only')
    const { rows } = await client.query<{ id: string }>('select pg_export_snapshot() as id')
    const noted = await noteDatabase(client)
    await dumpDatabase(source, join(folder, dumpName), rows[0]?.id ?? '')
    const manifest: Manifest = {
      ...{ format: 1, product: source.product, madeAt: source.now.toISOString() },
      database: {
        ...{ file: dumpName, server: noted.server, migrations: noted.migrations },
        ...(await measure(join(folder, dumpName))),
      },
      record: noted.record,
      files: await copyOut(source.store, noted.keys, folder),
    }
    await writeManifest(folder, manifest)
    return manifest
  })
}

/** Dumps the database as it was at a snapshot: schema, rows, policies and grants; not the roles, which an instance makes itself. */
async function dumpDatabase(
  { ownerUrl, postgresBin }: BackupSource,
  path: string,
  snapshot: string,
): Promise<void> {
  const what = ['--format=custom', '--compress=9', '--exclude-table-data=session.session']
  const { child, ended } = startProgram(
    'pg_dump',
    [...what, `--snapshot=${snapshot}`, '--lock-wait-timeout=60s', `--file=${path}`],
    { bin: postgresBin, url: ownerUrl },
  )
  child.stdin.end()
  await ended
}
