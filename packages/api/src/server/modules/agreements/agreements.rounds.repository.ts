import { and, asc, eq, inArray, sql, type AnyColumn } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { Tenant } from '../../db/tenant'
import type { VersionRow } from './agreements.repository'
import { agreementRounds, agreementSignatures } from './agreements.table'

export type RoundRow = typeof agreementRounds.$inferSelect
export type SignatureRow = typeof agreementSignatures.$inferSelect

/** Rows of the versions of one agreement. */
export const ofVersions = (
  table: { relationshipId: AnyColumn; versionId: AnyColumn },
  versions: readonly VersionRow[],
) =>
  and(
    eq(table.relationshipId, versions[0]?.relationshipId),
    inArray(
      table.versionId,
      versions.map(({ id }) => id),
    ),
  )

/** Rounds of versions that this side may see, in the order they were sent, a draft last. */
export async function selectRounds({ tx }: Tenant, versions: readonly VersionRow[]): Promise<RoundRow[]> {
  if (versions.length === 0) return []
  return tx
    .select()
    .from(agreementRounds)
    .where(ofVersions(agreementRounds, versions))
    .orderBy(sql`${agreementRounds.state} = 'draft'`, asc(agreementRounds.number))
}

export async function insertRound(
  { tx }: Tenant,
  row: typeof agreementRounds.$inferInsert,
): Promise<RoundRow> {
  const [inserted] = await tx.insert(agreementRounds).values(row).returning()
  if (!inserted) throw new Error('The proposal was not stored.')
  return inserted
}

/** Changes a round that still is as it was loaded; undefined where it is not. */
export async function updateRound(
  { tx }: Tenant,
  { relationshipId, id, rowVersion }: RoundRow,
  values: Partial<RoundRow>,
): Promise<RoundRow | undefined> {
  const [updated] = await tx
    .update(agreementRounds)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(
      and(
        eq(agreementRounds.relationshipId, relationshipId),
        eq(agreementRounds.id, id),
        eq(agreementRounds.rowVersion, rowVersion),
      ),
    )
    .returning()
  return updated
}

export async function deleteRound({ tx }: Tenant, { relationshipId, id }: RoundRow): Promise<void> {
  await tx
    .delete(agreementRounds)
    .where(and(eq(agreementRounds.relationshipId, relationshipId), eq(agreementRounds.id, id)))
}

/** Signatures of versions, in the order they were given. */
export async function selectSignatures(
  { tx }: Tenant,
  versions: readonly VersionRow[],
): Promise<SignatureRow[]> {
  if (versions.length === 0) return []
  return tx
    .select()
    .from(agreementSignatures)
    .where(ofVersions(agreementSignatures, versions))
    .orderBy(asc(agreementSignatures.signedAt), asc(agreementSignatures.id))
}

/** The signature of one side under a version. */
export async function insertSignature(
  tenant: Tenant,
  { relationshipId, supplierOrgId, customerOrgId, id: versionId }: VersionRow,
  { side, sha256 }: { side: Side; sha256: string },
): Promise<void> {
  await tenant.tx.insert(agreementSignatures).values({
    relationshipId,
    supplierOrgId,
    customerOrgId,
    versionId,
    side,
    sha256,
    userId: tenant.userId,
    signedAt: tenant.now,
    authenticatedAt: tenant.authenticatedAt,
  })
}
