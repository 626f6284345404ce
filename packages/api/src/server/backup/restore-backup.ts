import { join, resolve } from 'node:path'
import { knownMigrations, requireContinuation } from '../db/journal'
import { migrateDatabase } from '../db/migrate'
import type { FileStore } from '../integrations/file-store'
import { copyIn } from './backup.files'
import { readManifest, requireWhole, type Manifest } from './backup.manifest'
import { BackupProblem } from './backup.problem'
import { readHeads } from './backup.snapshot'
import { asOwner } from './owner'
import { contentOf, requireAlone, restoreDatabase } from './restore-database'

export interface RestoreTarget {
  ownerUrl: string
  store: FileStore
  postgresBin: string | undefined
  migrationsDir: string
  /** Whether what stands in the database may go. */
  replace: boolean
  say: (line: string) => void
}

/**
 * Puts a backup back. First everything is looked at and nothing changed: the hashes of the backup, whether this
 * program can go on from its schema, whether the database is empty or may be replaced, whether it is in use. Then
 * the files, which replace nothing; then the database in one transaction; then the migrations since.
 *
 * @throws {BackupProblem | JournalProblem} with what to do
 */
export async function restoreBackup(target: RestoreTarget, folder: string): Promise<Manifest> {
  const from = resolve(folder)
  const { ownerUrl, store, postgresBin, migrationsDir, say } = target
  const manifest = await readManifest(from)
  await requireWhole(from, manifest)
  requireContinuation('The backup', manifest.database.migrations, await knownMigrations(migrationsDir))
  await requireRoom(target)
  say(`The backup of ${manifest.madeAt} by Evenrule ${manifest.product} is undamaged.`)
  await copyIn(store, manifest.files, from)
  say(`${manifest.files.length} files are in the file store.`)
  await restoreDatabase(ownerUrl, join(from, manifest.database.file), postgresBin)
  await requireHeads(ownerUrl, manifest)
  say(`The database is restored: ${manifest.record.length} chains of the record end where the backup says.`)
  const count = await migrateDatabase(ownerUrl, migrationsDir)
  say(
    `Its schema is up to date: ${count} migrations, ${count - manifest.database.migrations.length} of them applied now.`,
  )
  return manifest
}

async function requireRoom({ ownerUrl, replace }: RestoreTarget): Promise<void> {
  const content = await contentOf(ownerUrl)
  if (content !== undefined && !replace)
    throw new BackupProblem(
      `The database is not empty: it holds ${content}. Restoring would remove all of it; to do so, back it up first and add --replace. If this is what a restore has left that was cut short, check it with npm run -s verify-record instead. Nothing was changed.`,
    )
  await requireAlone(ownerUrl)
}

async function requireHeads(ownerUrl: string, { record }: Manifest): Promise<void> {
  const heads = await asOwner(ownerUrl, readHeads)
  if (JSON.stringify(heads) === JSON.stringify(record)) return
  throw new BackupProblem(
    'The restored record does not end where the backup says, so manifest and dump are not of one backup. Do not use this database; restore another backup with --replace.',
  )
}
