import { and, eq, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listSites } from '../../../contract/gauges'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { sites } from '../organisations/organisations.table'

/** One page of this organisation's sites; every row carries the total. */
export async function selectSites({ tx, organisationId }: Tenant, query: QueryOf<typeof listSites>) {
  return tx
    .select({ id: sites.id, name: sites.name, total: totalOverPages })
    .from(sites)
    .where(and(eq(sites.orgId, organisationId), containing(query.search, sites.name)))
    .orderBy(...orderOf({ name: sites.name }, query.sort, sites.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** The site of this name, made where the organisation has none of it yet. */
export async function siteNamed({ tx, organisationId }: Tenant, name: string): Promise<string> {
  const [row] = await tx
    .insert(sites)
    .values({ orgId: organisationId, name })
    .onConflictDoUpdate({ target: [sites.orgId, sites.name], set: { name: sql`excluded.name` } })
    .returning({ id: sites.id })
  if (!row) throw new Error('The site was not stored.')
  return row.id
}
