import { spawn } from 'node:child_process'
import { cpSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { Manifest } from '../../packages/api/src/server/backup/backup.manifest'
import { restoreDatabase } from '../../packages/api/src/server/backup/restore-database'
import { startBackups, withTarget, type Backups } from './backup.world'
import { makeDatabase, postgresBin, root, type TestDatabase } from './stand'

let world: Backups
let made: string
let manifest: Manifest

beforeAll(async () => {
  world = await startBackups()
  manifest = await world.backUp('mine')
  made = join(world.folder, 'mine')
})
afterAll(() => world.stop())

describe('a restore', () => {
  describe('into a database that holds something', () => {
    let target: TestDatabase
    let look: TestDatabase['admin']
    beforeEach(async () => {
      target = await makeDatabase()
      await restoreDatabase(target.url, join(made, manifest.database.file), postgresBin)
      // Rows of before, and things that came after the backup was made.
      await target.admin.query(
        `set role evenrule_migrator; update organisations set name = 'Old ' || name;
         create table public.later (id integer); create type public.later_kind as enum ('a'); create schema later;
         create function later() returns integer language sql as 'select 1';
         grant usage on schema public to evenrule_session; reset role`,
      )
      look = target.admin
    })
    afterEach(() => target.drop())

    const isOld = async () => {
      const { rows: found } = await look.query<{ old: boolean }>(
        `select bool_and(name like 'Old %') and to_regclass('public.later') is not null as old from organisations`,
      )
      return found[0]?.old
    }

    it('is refused without --replace, and while others are connected; with it nothing of before is left', async () => {
      await expect(world.restore(target, made)).rejects.toThrow(
        /^The database is not empty: it holds 6 organisations and 759 events of the record\. .* add --replace\. .* Nothing was changed\.$/,
      )
      await expect(world.restore(target, made, true)).rejects.toThrow(
        /^Others are connected to the database: postgres \(1\)\./,
      )
      expect(await isOld()).toBe(true)
      await target.leave()
      await world.restore(target, made, true)
      await world.expectRestored(target)
    })

    it('that is killed in the middle leaves what was; the same command then does it', async () => {
      // The restore waits for this lock in the midst of removing what was.
      await look.query('begin; lock table submission_texts in access share mode')
      const program = join(world.folder, 'killed.mts')
      writeFileSync(
        program,
        `import { restoreDatabase } from '${root}packages/api/src/server/backup/restore-database'
         await restoreDatabase(process.env.TARGET, process.env.DUMP, process.env.BIN || undefined)`,
      )
      const child = spawn(process.execPath, [join(root, 'node_modules/tsx/dist/cli.mjs'), program], {
        ...{ cwd: root, stdio: 'ignore', detached: true },
        env: {
          ...process.env,
          TARGET: target.url,
          DUMP: join(made, manifest.database.file),
          BIN: postgresBin,
        },
      })
      const waiting = async () =>
        (
          await look.query<{ pid: number }>(
            `select pid from pg_locks where relation = 'submission_texts'::regclass and not granted`,
          )
        ).rows[0]?.pid
      await expect.poll(waiting, { timeout: 60_000 }).toBeTypeOf('number')
      const backend = await waiting()
      const ended = new Promise((done) => child.once('exit', done))
      process.kill(-(child.pid ?? 0), 'SIGKILL')
      await ended
      await look.query('commit')
      const isThere = async () =>
        (await look.query('select from pg_stat_activity where pid = $1', [backend])).rowCount
      await expect.poll(isThere, { timeout: 10_000 }).toBe(0)
      expect(await isOld()).toBe(true)
      await target.leave()
      const { status, said } = await world.command('restore', target.url, made, '--replace')
      expect([status, said]).toEqual([0, said])
      await world.expectRestored(target)
    })

    it('from a dump that breaks off leaves what was', async () => {
      const dump = readFileSync(join(made, manifest.database.file))
      const path = join(world.folder, 'short.dump')
      writeFileSync(path, dump.subarray(0, Math.floor(dump.length * 0.6)))
      await expect(restoreDatabase(target.url, path, postgresBin)).rejects.toThrow(/^pg_restore failed/)
      expect(await isOld()).toBe(true)
    })
  })

  it.each<[string, (path: string) => void, RegExp]>([
    [
      'whose dump was changed',
      (path) => writeFileSync(join(path, 'database.dump'), 'PGDMP'),
      /is damaged: database\.dump does not have the hash that was noted for it\. Nothing was changed;/,
    ],
    [
      'that lacks files',
      (path) => manifest.files.slice(0, 3).forEach(({ key }) => rmSync(join(path, key))),
      /is damaged: files\/\S+ is missing, and 2 more\. Nothing was changed;/,
    ],
    [
      'with a manifest cut short',
      (path) => writeFileSync(join(path, 'manifest.json'), '{'),
      /manifest\.json cannot be read/,
    ],
    [
      'of a newer program',
      (path) => {
        const later = { madeAt: 2_000_000_000_000, sha256: 'f'.repeat(64) }
        const database = { ...manifest.database, migrations: [...manifest.database.migrations, later] }
        writeFileSync(join(path, 'manifest.json'), JSON.stringify({ ...manifest, database }))
      },
      /^The backup is newer than this program: .* Nothing was changed\.$/,
    ],
    [
      'whose manifest is that of another',
      (path) => {
        const record = manifest.record.map((end) => ({ ...end, sequence: end.sequence + 1 }))
        writeFileSync(join(path, 'manifest.json'), JSON.stringify({ ...manifest, record }))
      },
      /^The restored record does not end where the backup says/,
    ],
  ])('of a backup %s is refused', async (_name, spoil, words) => {
    const path = join(world.folder, 'spoilt')
    rmSync(path, { recursive: true, force: true })
    cpSync(made, path, { recursive: true })
    spoil(path)
    await withTarget((target) => expect(world.restore(target, path)).rejects.toThrow(words))
  })

  it('says which object of the store is damaged, before the database is touched', async () => {
    const path = world.objects.pathOf(manifest.files[5]?.key ?? '')
    const whole = readFileSync(path)
    writeFileSync(path, 'other bytes')
    await withTarget(async (target) => {
      await expect(world.restore(target, made)).rejects.toThrow(
        /^The file store does not take files\/\S+: .* The database was not touched\./,
      )
      // Still empty.
      await expect(world.backUp('none', target)).rejects.toThrow('The database is empty')
    })
    writeFileSync(path, whole)
  })
})
