import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { organisations } from './organisations.table'

export type OrganisationRow = typeof organisations.$inferSelect

/** This organisation's own row. */
export async function selectOrganisation({ tx, organisationId }: Tenant): Promise<OrganisationRow> {
  const [row] = await tx.select().from(organisations).where(eq(organisations.id, organisationId))
  if (!row) throw new Error('The organisation is not visible to itself.')
  return row
}

/** Changes this organisation where it still has the version the sender saw; undefined where it has not. */
export async function updateOrganisation(
  { tx, organisationId }: Tenant,
  expectedVersion: number,
  values: Pick<OrganisationRow, 'name' | 'timeZone'>,
): Promise<OrganisationRow | undefined> {
  const [updated] = await tx
    .update(organisations)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(and(eq(organisations.id, organisationId), eq(organisations.rowVersion, expectedVersion)))
    .returning()
  return updated
}

/** The time zone in which this organisation's own days are judged. */
export async function selectTimeZone({ tx, organisationId }: Tenant): Promise<string> {
  const [row] = await tx
    .select({ timeZone: organisations.timeZone })
    .from(organisations)
    .where(eq(organisations.id, organisationId))
  if (!row) throw new Error('The organisation is not visible to itself.')
  return row.timeZone
}
