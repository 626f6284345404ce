import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { selectRelationship, type RelationshipRow } from './relationships.repository'

/** One relationship of this organisation on its side; 404 for those of others. */
export async function relationshipById(tenant: Tenant, relationshipId: string): Promise<RelationshipRow> {
  const row = await selectRelationship(tenant, relationshipId)
  if (!row) throw notFound('business relationship')
  return row
}

/** Today as the relationship's calendar has it; agreements are judged by it. */
export const todayIn = ({ timeZone }: Pick<RelationshipRow, 'timeZone'>, tenant: Tenant): string =>
  dayIn(timeZone, tenant.now)
