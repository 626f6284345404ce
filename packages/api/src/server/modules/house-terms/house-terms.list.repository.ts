import { and, eq, exists, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listHouseTerms } from '../../../contract/house-terms'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { relationships } from '../relationships/relationships.table'
import { houseTerms } from './house-terms.table'

/** Of a customer its own; for a supplier the published ones of customers it has a relationship with. */
const visible = (tenant: Tenant, relationshipId?: string) => {
  const { tx, side, organisationId } = tenant
  const withCustomer = tx
    .select({ id: relationships.id })
    .from(relationships)
    .where(
      and(
        eq(relationships.customerOrgId, houseTerms.orgId),
        side === 'supplier' ? eq(relationships.supplierOrgId, organisationId) : undefined,
        relationshipId ? eq(relationships.id, relationshipId) : undefined,
      ),
    )
  return side === 'customer'
    ? and(eq(houseTerms.orgId, organisationId), relationshipId ? exists(withCustomer) : undefined)
    : and(eq(houseTerms.state, 'published'), exists(withCustomer))
}

const current = sql<boolean>`(${houseTerms.state} = 'published' and not exists (
  select 1 from house_terms later where later.org_id = ${houseTerms.orgId} and later.number > ${houseTerms.number}))`

const fields = {
  row: houseTerms,
  customer: { id: organisations.id, name: organisations.name },
  current,
  total: totalOverPages,
}

export type HouseTermsListed = Omit<Awaited<ReturnType<typeof selectPage>>[number], 'total'>

/** One page of house terms, a draft before the published ones; every row carries the total. */
export async function selectPage(tenant: Tenant, query: QueryOf<typeof listHouseTerms>) {
  const { number, publishedAt, words } = houseTerms
  return tenant.tx
    .select(fields)
    .from(houseTerms)
    .innerJoin(organisations, eq(organisations.id, houseTerms.orgId))
    .where(
      and(
        visible(tenant, query.relationshipId),
        query.show === 'current' ? current : undefined,
        containing(query.search, organisations.name, words, sql`${number}::text`),
      ),
    )
    .orderBy(
      sql`${number} is not null`,
      ...orderOf({ number, publishedAt, customer: organisations.name }, query.sort, houseTerms.id),
    )
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** One version that this organisation may see on its side. */
export async function selectVisible(
  tenant: Tenant,
  houseTermsId: string,
): Promise<HouseTermsListed | undefined> {
  const [row] = await tenant.tx
    .select(fields)
    .from(houseTerms)
    .innerJoin(organisations, eq(organisations.id, houseTerms.orgId))
    .where(and(visible(tenant), eq(houseTerms.id, houseTermsId)))
  return row
}
