import { and, eq } from 'drizzle-orm'
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
