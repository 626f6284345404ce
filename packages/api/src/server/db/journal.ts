import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { readMigrationFiles } from 'drizzle-orm/migrator'
import type pg from 'pg'

/** A migration by what tells it from all others: when it was made (its place in the order) and what it holds. */
export interface Migration {
  madeAt: number
  sha256: string
}
export interface KnownMigration extends Migration {
  tag: string
}

/** A database that this program may not touch, in one line that says why and what to do. */
export class JournalProblem extends Error {
  override name = 'JournalProblem'
}

/** The migrations that this program brings along, in their order. */
export async function knownMigrations(folder: string): Promise<KnownMigration[]> {
  const { entries } = JSON.parse(await readFile(join(folder, 'meta/_journal.json'), 'utf8')) as {
    entries: { tag: string }[]
  }
  return readMigrationFiles({ migrationsFolder: folder }).map(({ folderMillis, hash }, at) => ({
    madeAt: folderMillis,
    sha256: hash,
    tag: entries[at]?.tag ?? '',
  }))
}

/** The migrations that a database has had, in their order; none where it is empty. */
export async function appliedMigrations(client: pg.ClientBase): Promise<Migration[]> {
  const table = await client.query<{ there: boolean }>(
    "select to_regclass('drizzle.__drizzle_migrations') is not null as there",
  )
  if (!table.rows[0]?.there) return []
  const { rows } = await client.query<{ madeAt: string; sha256: string }>(
    'select created_at as "madeAt", hash as sha256 from drizzle.__drizzle_migrations order by created_at, id',
  )
  return rows.map(({ madeAt, sha256 }) => ({ madeAt: Number(madeAt), sha256 }))
}

const dayOf = (instant: number): string => new Date(instant).toISOString().slice(0, 16).replace('T', ' ')

/**
 * Refuses what this program's migrations cannot continue: a newer database, one that had other migrations, and one
 * that lacks a migration though it had a later one, which the migrator would skip in silence.
 *
 * @throws {JournalProblem} in words for whoever starts the product
 */
export function requireContinuation(
  what: string,
  applied: readonly Migration[],
  known: readonly KnownMigration[],
): void {
  const latest = known.at(-1)?.madeAt ?? 0
  const newer = applied.find(({ madeAt }) => madeAt > latest)
  if (newer)
    throw new JournalProblem(
      `${what} is newer than this program: it has had a migration made ${dayOf(newer.madeAt)} UTC, after the last one known here (${known.at(-1)?.tag}). Use the version of Evenrule that made it, or a later one. Nothing was changed.`,
    )
  applied.forEach(({ madeAt, sha256 }, at) => {
    const own = known.find((each) => each.madeAt === madeAt)
    if (!own)
      throw new JournalProblem(
        `${what} has had a migration made ${dayOf(madeAt)} UTC that this program does not know: it belongs to another line of development. Use the program that made it. Nothing was changed.`,
      )
    if (own.sha256 !== sha256)
      throw new JournalProblem(
        `Migration ${own.tag} is not the one that ${what.toLowerCase()} has had: its file was edited since. Put the file back as it was released, and write what is to change as a new migration. Nothing was changed.`,
      )
    const due = known[at]
    if (due?.madeAt !== madeAt)
      throw new JournalProblem(
        `${what} lacks migration ${due?.tag} though it has had ${own.tag}, which comes later; a new migration must sort last. Make it anew with npm run db:generate. Nothing was changed.`,
      )
  })
}
