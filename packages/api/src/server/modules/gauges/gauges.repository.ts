import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { gauges } from './gauges.table'

export type GaugeRow = typeof gauges.$inferSelect

export async function selectGauge(tenant: Tenant, gaugeId: string): Promise<GaugeRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(gauges)
    .where(and(eq(gauges.orgId, tenant.organisationId), eq(gauges.id, gaugeId)))
  return row
}
