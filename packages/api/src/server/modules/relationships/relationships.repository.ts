import { and, eq, inArray } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listRelationships } from '../../../contract/relationships'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { relationships } from './relationships.table'

/** One page of the relationships in which this organisation stands on its side, with the other's name. */
export async function selectRelationships(tenant: Tenant, query: QueryOf<typeof listRelationships>) {
  const { supplierOrgId, customerOrgId, createdAt } = relationships
  const [own, other] =
    tenant.side === 'supplier' ? [supplierOrgId, customerOrgId] : [customerOrgId, supplierOrgId]
  return tenant.tx
    .select({
      relationship: relationships,
      partner: { id: organisations.id, name: organisations.name },
      total: totalOverPages,
    })
    .from(relationships)
    .innerJoin(organisations, eq(organisations.id, other))
    .where(and(eq(own, tenant.organisationId), containing(query.search, organisations.name)))
    .orderBy(...orderOf({ partner: organisations.name, createdAt }, query.sort, relationships.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export type RelationshipRow = typeof relationships.$inferSelect

/** One relationship in which this organisation stands on its side. */
export async function selectRelationship(
  tenant: Tenant,
  relationshipId: string,
): Promise<RelationshipRow | undefined> {
  const own = tenant.side === 'supplier' ? relationships.supplierOrgId : relationships.customerOrgId
  const [row] = await tenant.tx
    .select()
    .from(relationships)
    .where(and(eq(own, tenant.organisationId), eq(relationships.id, relationshipId)))
  return row
}

/** Names of the two parties of a relationship. */
export async function selectPartyNames(
  { tx }: Tenant,
  { supplierOrgId, customerOrgId }: RelationshipRow,
): Promise<{ id: string; name: string }[]> {
  return tx
    .select({ id: organisations.id, name: organisations.name })
    .from(organisations)
    .where(inArray(organisations.id, [supplierOrgId, customerOrgId]))
}

/** Names of this organisation's partners by id. */
export async function selectNames({ tx }: Tenant, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map()
  const rows = await tx
    .select({ id: organisations.id, name: organisations.name })
    .from(organisations)
    .where(inArray(organisations.id, [...ids]))
  return new Map(rows.map(({ id, name }) => [id, name]))
}
