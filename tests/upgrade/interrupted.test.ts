import { spawn } from 'node:child_process'
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { migrateDatabase } from '../../packages/api/src/server/db/migrate'
import { differences, readCatalogue, type Catalogue } from './catalogue'
import { freshDatabase, migrations, root, type TestDatabase } from './stand'

let database: TestDatabase
let old: Catalogue
let folder: string

/** At this number a migration below waits for as long as the test holds it. */
const gate = 97_531
const wait = `select pg_advisory_xact_lock(${gate});`
const steps = [
  'create table first_step (id integer primary key);',
  'alter table files add column extra text; grant insert on submission_texts to evenrule_system;',
  'create policy extra on files for select to evenrule_session using (true); update files set extra = name;',
]

beforeEach(async () => {
  database = await freshDatabase()
  old = await readCatalogue(database.admin)
  folder = mkdtempSync(join(tmpdir(), 'evenrule-interrupted-'))
  cpSync(migrations, folder, { recursive: true })
})
afterEach(async () => {
  await database.drop()
  rmSync(folder, { recursive: true, force: true })
})

/** Two further migrations, the second of which waits at one place. */
function addWaiting(place: number): void {
  const path = join(folder, 'meta/_journal.json')
  const journal = JSON.parse(readFileSync(path, 'utf8')) as { entries: { when: number }[] }
  const when = journal.entries.at(-1)?.when ?? 0
  const bodies = [
    ['9000_before', ['create table before_it (id integer);']],
    ['9001_waiting', [...steps.slice(0, place), wait, ...steps.slice(place)]],
  ] as const
  bodies.forEach(([tag, body], at) => {
    writeFileSync(join(folder, `${tag}.sql`), body.join('\n--> statement-breakpoint\n'))
    const entry = {
      idx: journal.entries.length,
      version: '7',
      when: when + 1000 * (at + 1),
      tag,
      breakpoints: true,
    }
    journal.entries.push(entry)
  })
  writeFileSync(path, JSON.stringify(journal))
}

/** The migrator as a process of its own, which can be killed; gives how it ended. */
function startKillable() {
  const child = spawn(
    process.execPath,
    [join(root, 'node_modules/tsx/dist/cli.mjs'), join(root, 'packages/api/src/server/migrate.ts')],
    {
      cwd: root,
      env: { ...process.env, MIGRATOR_DATABASE_URL: database.url, MIGRATIONS_DIR: folder },
      stdio: 'ignore',
      detached: true,
    },
  )
  const ended = new Promise<string>((done) => child.once('exit', (code, signal) => done(`${signal ?? code}`)))
  return { kill: () => process.kill(-(child.pid ?? 0), 'SIGKILL'), ended }
}

const waitingBackend = async () => {
  const { rows } = await database.admin.query<{ pid: number }>(
    `select pid from pg_locks where locktype = 'advisory' and objid = ${gate} and not granted
     and database = (select oid from pg_database where datname = current_database())`,
  )
  return rows[0]?.pid
}
const isThere = (pid: number) =>
  database.admin
    .query('select from pg_stat_activity where pid = $1', [pid])
    .then(({ rowCount }) => rowCount === 1)

/** Holds the migration at its gate while something happens, then lets go of it, and waits until its session is gone. */
async function atTheGate(happens: (backend: number) => Promise<void>): Promise<void> {
  await expect.poll(waitingBackend, { timeout: 60_000 }).toBeTypeOf('number')
  const backend = (await waitingBackend()) ?? 0
  await happens(backend)
  await database.admin.query('select pg_advisory_unlock($1)', [gate])
  await expect.poll(() => isThere(backend), { timeout: 10_000 }).toBe(false)
}

/** The schema is the old one; the next start makes it the new one. */
async function expectOldThenNew(): Promise<void> {
  expect(differences(await readCatalogue(database.admin), old)).toEqual([])
  await migrateDatabase(database.url, folder)
  const found = differences(await readCatalogue(database.admin), old).map((line) => line.split(' is')[0])
  expect(found).toEqual(
    expect.arrayContaining([
      ...['relation public.before_it', 'relation public.first_step'],
      ...['column public.files.extra', 'policy extra on files'],
    ]),
  )
}

describe('a migration that is interrupted leaves the old schema, and the next start brings the new one', () => {
  beforeEach(() => database.admin.query('select pg_advisory_lock($1)', [gate]))

  it.each([0, steps.length])('when its program is killed after %i of its steps', async (place) => {
    addWaiting(place)
    const { kill, ended } = startKillable()
    await atTheGate(async () => {
      kill()
      expect(await ended).toBe('SIGKILL')
    })
    await expectOldThenNew()
  })

  it('when the server ends its session in the middle', async () => {
    addWaiting(2)
    const outcome = expect(migrateDatabase(database.url, folder)).rejects.toThrow()
    await atTheGate(async (backend) => {
      await database.admin.query('select pg_terminate_backend($1)', [backend])
      await outcome
    })
    await expectOldThenNew()
  })
})
