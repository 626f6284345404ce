import { and, eq, inArray, sql } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { memberships } from './organisations.table'

/**
 * Names of people by id, of those who are members of this organisation or of one it has a relationship with. Who is
 * not in the map (erased, or a stranger by now) may not be named.
 */
export async function namesOfPeople(
  { tx }: Tenant,
  ids: readonly (string | null)[],
): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id) => id !== null))]
  if (wanted.length === 0) return new Map()
  const { rows } = await tx.execute<{ id: string; name: string }>(
    sql`select id, name from names_of_people(${sql.param(wanted)}::uuid[])`,
  )
  return new Map(rows.map(({ id, name }) => [id, name]))
}

/** Of people by id those who are members of this organisation. */
export async function selectMembersAmong(
  { tx, organisationId }: Tenant,
  ids: readonly string[],
): Promise<Set<string>> {
  if (ids.length === 0) return new Set()
  const rows = await tx
    .select({ userId: memberships.userId })
    .from(memberships)
    .where(and(eq(memberships.orgId, organisationId), inArray(memberships.userId, [...ids])))
  return new Set(rows.map(({ userId }) => userId))
}
