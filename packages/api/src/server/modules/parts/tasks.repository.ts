import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { measuringTasks } from './parts.table'

export type TaskRow = typeof measuringTasks.$inferSelect

/** Rows of the relationships in which this organisation stands on the side it acts on. */
export const ownTasks = (tenant: Tenant) =>
  eq(
    tenant.side === 'supplier' ? measuringTasks.supplierOrgId : measuringTasks.customerOrgId,
    tenant.organisationId,
  )

export async function selectTask(tenant: Tenant, taskId: string): Promise<TaskRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(measuringTasks)
    .where(and(ownTasks(tenant), eq(measuringTasks.id, taskId)))
  return row
}
