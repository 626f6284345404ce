import { spawnSync } from 'node:child_process'
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { readManifest } from '../../packages/api/src/server/backup/backup.manifest'
import { migrateDatabase } from '../../packages/api/src/server/db/migrate'
import { differences, readCatalogue, type Catalogue } from './catalogue'
import { journalFaults, type Release } from './journal-faults'
import { freshDatabase, migrations, releases, root, type TestDatabase } from './stand'

let released: Release[]
let folder: string

beforeAll(async () => {
  released = await Promise.all(
    releases.map(async ({ version, backup }) => ({
      version,
      migrations: (await readManifest(backup)).database.migrations,
    })),
  )
})
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'evenrule-migrations-'))
  cpSync(migrations, folder, { recursive: true })
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const path = (name: string) => join(folder, name)
const journal = () =>
  JSON.parse(readFileSync(path('meta/_journal.json'), 'utf8')) as {
    entries: { idx: number; when: number; tag: string; version: string; breakpoints: boolean }[]
  }

/** Adds a migration to the copy, as a colleague would. */
function add({ when, snapshot = true }: { when?: number; snapshot?: boolean } = {}): string {
  const all = journal()
  const last = all.entries.at(-1)
  const number = String(all.entries.length).padStart(4, '0')
  const tag = `${number}_more`
  all.entries.push({
    idx: all.entries.length,
    version: '7',
    breakpoints: true,
    tag,
    when: when ?? (last?.when ?? 0) + 1000,
  })
  writeFileSync(path('meta/_journal.json'), JSON.stringify(all))
  writeFileSync(path(`${tag}.sql`), 'create table more (id integer);')
  const before = JSON.parse(readFileSync(path(`meta/${last?.tag.slice(0, 4)}_snapshot.json`), 'utf8')) as {
    id: string
  }
  if (snapshot)
    writeFileSync(path(`meta/${number}_snapshot.json`), JSON.stringify({ id: 'next', prevId: before.id }))
  return tag
}

describe('the migrations', () => {
  it('of a release are never edited, and a new one sorts last', async () => {
    expect(released.map(({ version }) => version)).toContain('0.1.0')
    expect(await journalFaults(migrations, released)).toEqual([])
  })

  it('may be followed by another', async () => {
    add()
    expect(await journalFaults(folder, released)).toEqual([])
  })

  it.each<[string, () => void, RegExp]>([
    [
      'a released file that was edited, be it by a blank',
      () => writeFileSync(path('0001_access.sql'), `${readFileSync(path('0001_access.sql'), 'utf8')} `),
      /^0001_access was edited since release 0\.1\.0$/,
    ],
    ['a file that is gone', () => rmSync(path('0000_start.sql')), /^0000_start\.sql is gone$/],
    [
      'a file that is not in the journal',
      () => writeFileSync(path('0009_lost.sql'), ''),
      /^0009_lost\.sql is not in the journal$/,
    ],
    [
      'a new one that is older than the last',
      () => void add({ when: 1_796_130_240_625 }),
      /_more is not later than the one before it$/,
    ],
    ['a new one without its snapshot', () => void add({ snapshot: false }), /_more has no snapshot$/],
    [
      'two that were made beside one another',
      () => {
        add()
        const tag = add()
        const before = journal().entries.at(-3)?.tag.slice(0, 4)
        const { id } = JSON.parse(readFileSync(path(`meta/${before}_snapshot.json`), 'utf8')) as {
          id: string
        }
        writeFileSync(
          path(`meta/${tag.slice(0, 4)}_snapshot.json`),
          JSON.stringify({ id: 'other', prevId: id }),
        )
      },
      /^the snapshot of .*_more does not follow the one before it$/,
    ],
    [
      'a released one that was taken out of the journal',
      () => {
        const { entries, ...rest } = journal()
        writeFileSync(
          path('meta/_journal.json'),
          JSON.stringify({ ...rest, entries: entries.filter(({ idx }) => idx !== 1) }),
        )
      },
      /^0001_access\.sql is not in the journal$/,
    ],
  ])('are found faulty by the check: %s', async (_name, spoil, line) => {
    spoil()
    const faults = await journalFaults(folder, released)
    expect(faults.filter((fault) => line.test(fault))).toHaveLength(1)
  })
})

describe('the migrator', () => {
  let database: TestDatabase
  let before: Catalogue
  let had: { id: number; hash: string; created_at: string }[]
  const query = (text: string, values: unknown[] = []) => database.admin.query(text, values)
  beforeAll(async () => {
    database = await freshDatabase()
    had = (await query('select id, hash, created_at from drizzle.__drizzle_migrations order by id')).rows
  })
  afterEach(async () => {
    await query('truncate drizzle.__drizzle_migrations')
    for (const { id, hash, created_at: at } of had)
      await query('insert into drizzle.__drizzle_migrations (id, hash, created_at) values ($1, $2, $3)', [
        id,
        hash,
        at,
      ])
  })
  afterAll(() => database.drop())

  /** Spoils what is noted of the migrations; the migrator then says why not, and changes nothing. */
  async function refuses(statement: string, words: RegExp) {
    await query(statement)
    before = await readCatalogue(database.admin)
    await expect(migrateDatabase(database.url, migrations)).rejects.toThrow(words)
    expect(differences(await readCatalogue(database.admin), before)).toEqual([])
  }

  it('refuses a database that is newer than the program', () =>
    refuses(
      `insert into drizzle.__drizzle_migrations (hash, created_at) select 'f', max(created_at) + 60000 from drizzle.__drizzle_migrations`,
      /^The database is newer than this program: .* Use the version of Evenrule that made it, or a later one\. Nothing was changed\.$/,
    ))

  it('refuses a database whose migration was another than its file is now', () =>
    refuses(
      `update drizzle.__drizzle_migrations set hash = 'f' where id = 2`,
      /^Migration 0001_access is not the one that the database has had: its file was edited since\. .* Nothing was changed\.$/,
    ))

  it('refuses a database of another line of development', () =>
    refuses(
      `insert into drizzle.__drizzle_migrations (hash, created_at) select 'f', min(created_at) + 1 from drizzle.__drizzle_migrations`,
      /^The database has had a migration made .* UTC that this program does not know: it belongs to another line of development\./,
    ))

  it('refuses a database that lacks a migration before one it has had, which would be skipped in silence', () =>
    refuses(
      'delete from drizzle.__drizzle_migrations where id = 1',
      /^The database lacks migration 0000_start though it has had 0001_access, which comes later;/,
    ))

  it('says so in one line and with a failure when it is run as a program', async () => {
    await query(`update drizzle.__drizzle_migrations set hash = 'f'`)
    const { status, stdout, stderr } = spawnSync(
      join(root, 'node_modules/.bin/tsx'),
      [join(root, 'packages/api/src/server/migrate.ts')],
      {
        cwd: root,
        env: { ...process.env, MIGRATOR_DATABASE_URL: database.url, MIGRATIONS_DIR: migrations },
        encoding: 'utf8',
      },
    )
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' })
    expect(stderr).toMatch(/^Migration 0000_start is not the one that the database has had: .*\n$/)
  })

  it('applies what is missing, once, however often and by however many it is asked', async () => {
    add()
    const count = had.length + 1
    const asked = [1, 2, 3].map(() => migrateDatabase(database.url, folder))
    expect(await Promise.all(asked)).toEqual([count, count, count])
    expect(await migrateDatabase(database.url, folder)).toBe(count)
  })
})
