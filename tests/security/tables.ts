import type pg from 'pg'

/** Tables whose rows belong to no organisation, with the reason. */
export const notOfTenants: Record<string, string> = {
  users: 'people; each sees their own row, and belongs to any number of organisations',
  security_events: 'a log of sign-ins and refusals that only the owner of the database reads',
}

/** Every table of the product. */
export async function allTables(owner: pg.Pool): Promise<string[]> {
  const { rows } = await owner.query<{ name: string }>(
    `select c.relname as name from pg_class c join pg_namespace n on n.oid = c.relnamespace
     where n.nspname = 'public' and c.relkind in ('r', 'p') order by 1`,
  )
  return rows.map(({ name }) => name)
}

export const tenantTables = async (owner: pg.Pool): Promise<string[]> =>
  (await allTables(owner)).filter((name) => !(name in notOfTenants))
