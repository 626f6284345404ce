import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import * as schema from './schema'

export type Database = NodePgDatabase<typeof schema>
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]

/** A pool of its own per role. Only `tenant.ts`, the worker and the health check may hold a database. */
export function openDatabase(url: string, size = 10): { database: Database; pool: pg.Pool } {
  const pool = new pg.Pool({ connectionString: url, max: size, application_name: 'evenrule' })
  // An idle client that loses its server must not take the process down; the next query reconnects.
  pool.on('error', () => undefined)
  return { database: drizzle(pool, { schema, casing: 'snake_case' }), pool }
}
