import pg from 'pg'
import { BackupProblem } from './backup.problem'

/** Runs work on a connection of the database's owner, which row security does not bind. */
export async function asOwner<T>(ownerUrl: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: ownerUrl, application_name: 'evenrule backup' })
  // A server that goes away also fails the query under way, which is what is told.
  client.on('error', () => undefined)
  await client.connect().catch((error: unknown) => {
    const why = error instanceof Error ? error.message : String(error)
    throw new BackupProblem(`The database does not answer (${why}). Nothing was changed.`)
  })
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}
