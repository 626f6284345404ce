import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'
import { appliedMigrations, JournalProblem, knownMigrations, requireContinuation } from './journal'

/** Held while migrating: of two programs that start at once, one migrates and the other finds it done. */
const migrating = 4370

/** How long a migration waits for a table in use before it gives up; everybody else waits behind it. */
const patience = '30s'
const lockNotAvailable = '55P03'

/**
 * Brings a database up to date as its owner, all migrations in one transaction: cut off at any moment it leaves
 * the schema that was or the one that is to be.
 *
 * @returns how many migrations the database has had by now
 * @throws {JournalProblem} before anything is changed, where this program cannot continue what the database has had
 */
export async function migrateDatabase(url: string, folder: string): Promise<number> {
  const client = new pg.Client({ connectionString: url, application_name: 'evenrule migrate' })
  // A server that goes away also fails the query under way, which is what is told.
  client.on('error', () => undefined)
  await client.connect()
  try {
    await client.query('select pg_advisory_lock($1)', [migrating])
    const known = await knownMigrations(folder)
    requireContinuation('The database', await appliedMigrations(client), known)
    await client.query(`set lock_timeout = '${patience}'`)
    await migrate(drizzle(client), { migrationsFolder: folder }).catch(inWords)
    const count = (await appliedMigrations(client)).length
    // The migrator compares timestamps and skips older ones in silence.
    if (count !== known.length)
      throw new Error(`${count} migrations are applied, the journal names ${known.length}.`)
    return count
  } finally {
    await client.end()
  }
}

function inWords(error: unknown): never {
  const cause = error instanceof Error && error.cause !== undefined ? error.cause : error
  if ((cause as { code?: unknown }).code === lockNotAvailable)
    throw new JournalProblem(
      'A table was in use for 30 seconds, so the migration gave up and changed nothing. Try again when no long work is under way.',
    )
  throw error
}
