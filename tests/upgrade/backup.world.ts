import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect } from 'vitest'
import { copyIn } from '../../packages/api/src/server/backup/backup.files'
import { readManifest } from '../../packages/api/src/server/backup/backup.manifest'
import { makeBackup } from '../../packages/api/src/server/backup/make-backup'
import { restoreBackup } from '../../packages/api/src/server/backup/restore-backup'
import { differences, readCatalogue } from './catalogue'
import { startObjectStore } from './object-store'
import { rowsOf } from './rows'
import {
  backup,
  makeDatabase,
  migrations,
  postgresBin,
  root,
  upgradedDatabase,
  type TestDatabase,
} from './stand'

/**
 * What is backed up and restored: the demonstration of the first release, brought up to date, with somebody signed
 * in, and its files in an object store.
 */
export async function startBackups() {
  const folder = mkdtempSync(join(tmpdir(), 'evenrule-backup-'))
  const objects = await startObjectStore()
  const source = await upgradedDatabase()
  await copyIn(objects.store, (await readManifest(backup)).files, backup)
  await source.admin.query(
    `insert into session.session (sid, sess, expire) values ('s', '{}', now() + interval '1 day')`,
  )
  const schema = await readCatalogue(source.admin)
  const rows = await rowsOf(source)

  return {
    folder,
    objects,
    source,
    /** Runs a command as people do, on a database and on the object store of this test. */
    command(name: string, url: string, ...args: string[]) {
      const child = spawn(process.execPath, [join(root, `infra/${name}.mjs`), ...args], {
        cwd: root,
        env: {
          ...{ ...process.env, ...objects.environment, MIGRATOR_DATABASE_URL: url, INIT_CWD: folder },
          ...(postgresBin ? { POSTGRES_BIN: postgresBin } : {}),
        },
        stdio: ['ignore', 'pipe', 'pipe'],
      })
      let said = ''
      for (const stream of [child.stdout, child.stderr])
        stream.on('data', (bytes: Buffer) => (said += bytes.toString()))
      return new Promise<{ status: number | null; said: string }>((done) =>
        child.once('close', (status) => done({ status, said })),
      )
    },
    backUp: (name: string, from = source) =>
      makeBackup(
        { ownerUrl: from.url, store: objects.store, postgresBin, product: '0.0.0', now: new Date() },
        join(folder, name),
      ),
    restore: (target: TestDatabase, path: string, replace = false) =>
      restoreBackup(
        {
          ...{ ownerUrl: target.url, store: objects.store, postgresBin, migrationsDir: migrations, replace },
          say: () => undefined,
        },
        path,
      ),
    /** The very rows and the very schema of the source, but no sessions; seen in a copy, since nobody is connected to a target. */
    async expectRestored(target: TestDatabase): Promise<void> {
      const copy = await makeDatabase(target.name)
      expect(differences(await readCatalogue(copy.admin), schema)).toEqual([])
      expect(await rowsOf(copy)).toEqual(rows)
      expect((await copy.admin.query('select from session.session')).rowCount).toBe(0)
      await copy.drop()
    },
    async stop() {
      await source.drop()
      await objects.stop()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

export type Backups = Awaited<ReturnType<typeof startBackups>>

/** A target of a restore as the start makes it, empty, to which nobody is connected. */
export async function withTarget(work: (target: TestDatabase) => Promise<void>): Promise<void> {
  const target = await makeDatabase()
  await target.leave()
  try {
    await work(target)
  } finally {
    await target.drop()
  }
}
