import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { selectPartyNames, selectRelationship, type RelationshipRow } from './relationships.repository'

/** One relationship of this organisation on its side; 404 for those of others. */
export async function relationshipById(tenant: Tenant, relationshipId: string): Promise<RelationshipRow> {
  const row = await selectRelationship(tenant, relationshipId)
  if (!row) throw notFound('business relationship')
  return row
}

/** Today as the relationship's calendar has it; agreements are judged by it. */
export const todayIn = ({ timeZone }: Pick<RelationshipRow, 'timeZone'>, tenant: Tenant): string =>
  dayIn(timeZone, tenant.now)

export interface Parties {
  supplier: { id: string; name: string }
  customer: { id: string; name: string }
}

/** The two parties of a relationship by name. */
export async function partiesOf(tenant: Tenant, relationship: RelationshipRow): Promise<Parties> {
  const named = await selectPartyNames(tenant, relationship)
  const party = (id: string) => ({ id, name: named.find((each) => each.id === id)?.name ?? '' })
  return { supplier: party(relationship.supplierOrgId), customer: party(relationship.customerOrgId) }
}
