import type { TestDatabase } from './stand'

/** How many rows every table of the product has, and one hash over them all. */
export async function rowsOf({ admin }: TestDatabase): Promise<Map<string, { count: number; hash: string }>> {
  const { rows: tables } = await admin.query<{ name: string }>(
    `select oid::regclass::text as name from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by 1`,
  )
  const found = new Map<string, { count: number; hash: string }>()
  for (const { name } of tables) {
    const { rows } = await admin.query<{ count: number; hash: string }>(
      `select count(*)::integer as count, md5(coalesce(string_agg(t::text, '|' order by t::text), '')) as hash from ${name} t`,
    )
    found.set(name, rows[0] ?? { count: 0, hash: '' })
  }
  return found
}
