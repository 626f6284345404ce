import type pg from 'pg'
import { appliedMigrations, type Migration } from '../db/journal'
import { BackupProblem } from './backup.problem'

/** What a backup notes of the database beside its dump; read in the snapshot that the dump is of. */
export interface Noted {
  server: string
  migrations: Migration[]
  record: { chainId: string; sequence: number; hash: string }[]
  /** Keys of all files that any row names. */
  keys: string[]
}

/**
 * Reads it within the transaction that the client is in.
 *
 * @throws {BackupProblem} where there is nothing of the product
 */
export async function noteDatabase(client: pg.ClientBase): Promise<Noted> {
  const migrations = await appliedMigrations(client)
  if (migrations.length === 0) throw new BackupProblem('The database is empty: there is nothing to back up.')
  const { rows } = await client.query<{ server: string }>(
    "select current_setting('server_version') as server",
  )
  return {
    server: rows[0]?.server ?? '',
    migrations,
    record: await readHeads(client),
    keys: await readKeys(client),
  }
}

/** Where every chain of the record ends. */
export async function readHeads(client: pg.ClientBase): Promise<Noted['record']> {
  const { rows } = await client.query<Noted['record'][number]>(
    'select chain_id as "chainId", sequence, hash from public.record_heads order by chain_id',
  )
  return rows
}

/** The keys in every column called storage_key, whichever tables have one. */
async function readKeys(client: pg.ClientBase): Promise<string[]> {
  const { rows: tables } = await client.query<{ name: string }>(
    `select attrelid::regclass::text as name from pg_attribute a join pg_class c on c.oid = a.attrelid
     where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' and a.attname = 'storage_key' order by 1`,
  )
  const union = tables.map(({ name }) => `select storage_key as key from ${name}`).join(' union ')
  if (!union) return []
  const { rows } = await client.query<{ key: string }>(
    `select key from (${union}) k where key is not null order by key`,
  )
  return rows.map(({ key }) => key)
}
