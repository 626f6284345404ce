import { and, desc, eq, sql } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { columnMappings } from './mappings.table'

type NewMapping = Pick<typeof columnMappings.$inferInsert, 'purpose' | 'signature' | 'mapping'>

/** The newest mappings of a purpose; more than these nobody comes back to. */
export async function selectMappings(
  tenant: Tenant,
  purpose: string,
): Promise<{ signature: string; mapping: unknown }[]> {
  return tenant.tx
    .select({ signature: columnMappings.signature, mapping: columnMappings.mapping })
    .from(columnMappings)
    .where(and(eq(columnMappings.orgId, tenant.organisationId), eq(columnMappings.purpose, purpose)))
    .orderBy(desc(columnMappings.updatedAt))
    .limit(500)
}

export async function upsertMapping(tenant: Tenant, row: NewMapping): Promise<void> {
  await tenant.tx
    .insert(columnMappings)
    .values({ ...row, orgId: tenant.organisationId, updatedAt: tenant.now, updatedBy: tenant.userId })
    .onConflictDoUpdate({
      target: [columnMappings.orgId, columnMappings.purpose, columnMappings.signature],
      set: {
        mapping: sql`excluded.mapping`,
        updatedAt: sql`excluded.updated_at`,
        updatedBy: sql`excluded.updated_by`,
      },
    })
}

export async function deleteMapping(tenant: Tenant, purpose: string, signature: string): Promise<void> {
  await tenant.tx
    .delete(columnMappings)
    .where(
      and(
        eq(columnMappings.orgId, tenant.organisationId),
        eq(columnMappings.purpose, purpose),
        eq(columnMappings.signature, signature),
      ),
    )
}
