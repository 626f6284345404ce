import { randomUUID } from 'node:crypto'
import { readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import pg from 'pg'
import { restoreDatabase } from '../../packages/api/src/server/backup/restore-database'
import { migrateDatabase } from '../../packages/api/src/server/db/migrate'

export const root = fileURLToPath(new URL('../..', import.meta.url))
export const migrations = `${root}infra/migrations`
/** The releases whose databases every later version must be able to take over, each with the backup kept of it. */
export const releases = readdirSync(`${root}tests/upgrade`)
  .filter((name) => name.startsWith('release-'))
  .map((name) => ({ version: name.replace('release-', ''), backup: `${root}tests/upgrade/${name}/backup` }))
/** The backup of the first release. */
export const backup = `${root}tests/upgrade/release-0.1.0/backup`
/** Folder of PostgreSQL's programs; without one they are looked up on the path. */
export const postgresBin = process.env.TEST_POSTGRES_BIN

function need(name: string): string {
  const value = process.env[name]
  if (!value) throw new Error(`${name} is missing: run the tests through npm test.`)
  return value
}

export interface TestDatabase {
  name: string
  url: string
  /** A connection of the superuser's, for what the owner may not do either. */
  admin: pg.Client
  /** Leaves the database alone, so that it can be copied or replaced. */
  leave: () => Promise<void>
  drop: () => Promise<void>
}

export const adminUrl = (name: string): string => {
  const url = new URL(need('TEST_POSTGRES_ADMIN_URL'))
  url.pathname = `/${name}`
  return url.href
}

async function onServer(...statements: string[]): Promise<void> {
  const client = new pg.Client({ connectionString: need('TEST_POSTGRES_ADMIN_URL') })
  await client.connect()
  for (const statement of statements) await client.query(statement)
  await client.end()
}

/** Makes a database: empty, as the start makes it, or a copy of another that nobody is connected to. */
export async function makeDatabase(template?: string): Promise<TestDatabase> {
  const name = `test_${randomUUID().replaceAll('-', '')}`
  await onServer(
    `create database ${name} owner evenrule_migrator${template ? ` template ${template}` : ''}`,
    `revoke all on database ${name} from public`,
    `grant connect on database ${name} to evenrule_app, evenrule_system, evenrule_session`,
  )
  const admin = new pg.Client({ connectionString: adminUrl(name) })
  admin.on('error', () => undefined)
  await admin.connect()
  const url = new URL(adminUrl(name))
  url.username = 'evenrule_migrator'
  url.password = ''
  return {
    ...{ name, url: url.href, admin },
    leave: () => admin.end(),
    async drop() {
      await admin.end().catch(() => undefined)
      await onServer(`drop database if exists ${name} with (force)`)
    },
  }
}

/** A database that was made and migrated by this very version. */
export const freshDatabase = () => makeDatabase(need('TEST_TEMPLATE_DATABASE'))

/** The database of a release as it was dumped. */
export async function releasedDatabase(from = backup): Promise<TestDatabase> {
  const database = await makeDatabase()
  await restoreDatabase(database.url, `${from}/database.dump`, postgresBin)
  return database
}

/** The database of the first release, brought up to date as `npm start` does. */
export async function upgradedDatabase(): Promise<TestDatabase> {
  const database = await releasedDatabase()
  await migrateDatabase(database.url, migrations)
  return database
}
