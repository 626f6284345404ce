import { and, desc, eq, sql } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { houseTerms } from './house-terms.table'

export type HouseTermsRow = typeof houseTerms.$inferSelect

const published = (customerOrgId: string) =>
  and(eq(houseTerms.orgId, customerOrgId), eq(houseTerms.state, 'published'))

/** One published version of a customer; for a supplier only where a relationship with it exists. */
export async function selectPublished(
  { tx }: Tenant,
  customerOrgId: string,
  houseTermsId: string,
): Promise<HouseTermsRow | undefined> {
  const [row] = await tx
    .select()
    .from(houseTerms)
    .where(and(published(customerOrgId), eq(houseTerms.id, houseTermsId)))
  return row
}

/** The published version with the highest number. */
export async function selectCurrent(
  { tx }: Tenant,
  customerOrgId: string,
): Promise<HouseTermsRow | undefined> {
  const [row] = await tx
    .select()
    .from(houseTerms)
    .where(published(customerOrgId))
    .orderBy(desc(houseTerms.number))
    .limit(1)
  return row
}

/** Lets one change of this customer's house terms pass at a time: publishing gives numbers. */
export async function lockHouseTerms({ tx, organisationId }: Tenant): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${organisationId}, 3))`)
}

/** One version of this organisation's own, draft or published. */
export async function selectOwn(
  { tx, organisationId }: Tenant,
  houseTermsId: string,
): Promise<HouseTermsRow | undefined> {
  const [row] = await tx
    .select()
    .from(houseTerms)
    .where(and(eq(houseTerms.orgId, organisationId), eq(houseTerms.id, houseTermsId)))
  return row
}

export async function selectOwnDraft({ tx, organisationId }: Tenant): Promise<HouseTermsRow | undefined> {
  const [row] = await tx
    .select()
    .from(houseTerms)
    .where(and(eq(houseTerms.orgId, organisationId), eq(houseTerms.state, 'draft')))
  return row
}

export async function insertHouseTerms(
  { tx }: Tenant,
  row: typeof houseTerms.$inferInsert,
): Promise<HouseTermsRow> {
  const [inserted] = await tx.insert(houseTerms).values(row).returning()
  if (!inserted) throw new Error('The house terms were not stored.')
  return inserted
}

/** Changes a draft that still is as it was loaded; undefined where it is not. */
export async function updateHouseTerms(
  { tx, organisationId }: Tenant,
  { id, rowVersion }: Pick<HouseTermsRow, 'id' | 'rowVersion'>,
  values: Partial<HouseTermsRow>,
): Promise<HouseTermsRow | undefined> {
  const [updated] = await tx
    .update(houseTerms)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(
      and(
        eq(houseTerms.orgId, organisationId),
        eq(houseTerms.id, id),
        eq(houseTerms.state, 'draft'),
        eq(houseTerms.rowVersion, rowVersion),
      ),
    )
    .returning()
  return updated
}

/** Deletes a draft. */
export async function deleteDraft({ tx, organisationId }: Tenant, id: string): Promise<void> {
  await tx
    .delete(houseTerms)
    .where(and(eq(houseTerms.orgId, organisationId), eq(houseTerms.id, id), eq(houseTerms.state, 'draft')))
}

export async function highestNumber({ tx, organisationId }: Tenant): Promise<number> {
  const [row] = await tx
    .select({ number: sql<number>`coalesce(max(${houseTerms.number}), 0)::integer` })
    .from(houseTerms)
    .where(eq(houseTerms.orgId, organisationId))
  return row?.number ?? 0
}
