import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { referenceStandards } from './gauges.table'

export type StandardRow = typeof referenceStandards.$inferSelect

export async function selectStandard(tenant: Tenant, standardId: string): Promise<StandardRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(referenceStandards)
    .where(and(eq(referenceStandards.orgId, tenant.organisationId), eq(referenceStandards.id, standardId)))
  return row
}
