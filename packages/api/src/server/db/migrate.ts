import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'

/** Applies every migration as the owner and proves that as many are applied as the journal names. */
export async function migrateDatabase(url: string, folder: string): Promise<number> {
  const pool = new pg.Pool({ connectionString: url, max: 1 })
  try {
    await migrate(drizzle(pool), { migrationsFolder: folder })
    const journal = JSON.parse(await readFile(join(folder, 'meta/_journal.json'), 'utf8')) as {
      entries: unknown[]
    }
    const applied = await pool.query<{ count: string }>('select count(*) from drizzle.__drizzle_migrations')
    const count = Number(applied.rows[0]?.count)
    // The migrator compares timestamps and skips older ones in silence.
    if (count !== journal.entries.length)
      throw new Error(`${count} migrations are applied, the journal names ${journal.entries.length}.`)
    return count
  } finally {
    await pool.end()
  }
}
