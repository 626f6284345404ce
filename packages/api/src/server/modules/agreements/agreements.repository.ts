import { and, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import type { ScopeOfCharacteristics } from '../parts/characteristics.repository'
import { relationships } from '../relationships/relationships.table'
import { stateToday } from './agreements.states'
import { agreementRounds, agreements, agreementVersions } from './agreements.table'

export type AgreementRow = typeof agreements.$inferSelect
export type VersionRow = typeof agreementVersions.$inferSelect

const theOne = (tenant: Tenant, agreementId: string) =>
  and(ownSide(tenant, agreements), eq(agreements.id, agreementId))

export async function selectAgreement(
  tenant: Tenant,
  agreementId: string,
): Promise<AgreementRow | undefined> {
  const [row] = await tenant.tx.select().from(agreements).where(theOne(tenant, agreementId))
  return row
}

/** The same, locked until the transaction ends: of two moves at once the second sees what the first did. */
export async function lockAgreement(tenant: Tenant, agreementId: string): Promise<AgreementRow | undefined> {
  const [row] = await tenant.tx.select().from(agreements).where(theOne(tenant, agreementId)).for('update')
  return row
}

/** Lets one sending of a relationship pass at a time: it gives numbers. Taken before any row is locked. */
export async function lockNumbering({ tx }: Tenant, relationshipId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${relationshipId}, 2))`)
}

/** The agreement of exactly this scope that was sent, or the unsent one of this side. */
export async function selectByScope(
  tenant: Tenant,
  { relationshipId, partId, characteristicId }: ScopeOfCharacteristics,
  which: 'sent' | 'own draft',
): Promise<AgreementRow | undefined> {
  const { number } = agreements
  const [row] = await tenant.tx
    .select()
    .from(agreements)
    .where(
      and(
        ownSide(tenant, agreements),
        eq(agreements.relationshipId, relationshipId),
        partId ? eq(agreements.partId, partId) : isNull(agreements.partId),
        characteristicId
          ? eq(agreements.characteristicId, characteristicId)
          : isNull(agreements.characteristicId),
        which === 'sent' ? isNotNull(number) : and(isNull(number), eq(agreements.begunBy, tenant.side)),
      ),
    )
  return row
}

export async function insertAgreement(
  { tx }: Tenant,
  row: typeof agreements.$inferInsert,
): Promise<AgreementRow> {
  const [inserted] = await tx.insert(agreements).values(row).returning()
  if (!inserted) throw new Error('The agreement was not stored.')
  return inserted
}

/** Gives the agreement the next number of its relationship. */
export async function numberAgreement({ tx }: Tenant, agreement: AgreementRow): Promise<AgreementRow> {
  const { relationshipId, id } = agreement
  const [row] = await tx
    .update(agreements)
    .set({
      number: sql`(select coalesce(max(a.number), 0) + 1 from agreements a where a.relationship_id = ${relationshipId})`,
    })
    .where(and(eq(agreements.relationshipId, relationshipId), eq(agreements.id, id)))
    .returning()
  if (!row) throw new Error('The agreement was not numbered.')
  return row
}

export async function deleteAgreement({ tx }: Tenant, { relationshipId, id }: AgreementRow): Promise<void> {
  await tx.delete(agreements).where(and(eq(agreements.relationshipId, relationshipId), eq(agreements.id, id)))
}

/** Every version of an agreement that this side may see, with its state today; drafts first, then the newest. */
export async function selectVersions(tenant: Tenant, { relationshipId, id }: AgreementRow) {
  return tenant.tx
    .select({ version: agreementVersions, state: stateToday(tenant) })
    .from(agreementVersions)
    .innerJoin(relationships, eq(relationships.id, agreementVersions.relationshipId))
    .where(and(eq(agreementVersions.relationshipId, relationshipId), eq(agreementVersions.agreementId, id)))
    .orderBy(sql`${desc(agreementVersions.number)} nulls first`)
}

export async function insertVersion(
  { tx }: Tenant,
  row: typeof agreementVersions.$inferInsert,
): Promise<VersionRow> {
  const [inserted] = await tx.insert(agreementVersions).values(row).returning()
  if (!inserted) throw new Error('The version was not stored.')
  return inserted
}

/** Changes a version that still is as it was loaded; undefined where it is not. */
export async function updateVersion(
  { tx }: Tenant,
  { relationshipId, id, rowVersion }: VersionRow,
  values: Partial<VersionRow>,
): Promise<VersionRow | undefined> {
  const [updated] = await tx
    .update(agreementVersions)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(
      and(
        eq(agreementVersions.relationshipId, relationshipId),
        eq(agreementVersions.id, id),
        eq(agreementVersions.rowVersion, rowVersion),
      ),
    )
    .returning()
  return updated
}

/** Deletes a draft that was never sent, with its round. */
export async function deleteVersion(tenant: Tenant, { relationshipId, id }: VersionRow): Promise<void> {
  const { tx } = tenant
  await tx
    .delete(agreementRounds)
    .where(and(eq(agreementRounds.relationshipId, relationshipId), eq(agreementRounds.versionId, id)))
  await tx
    .delete(agreementVersions)
    .where(and(eq(agreementVersions.relationshipId, relationshipId), eq(agreementVersions.id, id)))
}
