import { asc } from 'drizzle-orm'
import type { About } from '../../../contract/agreements-rounds'
import type { Tenant } from '../../db/tenant'
import type { VersionRow } from './agreements.repository'
import { ofVersions, type RoundRow } from './agreements.rounds.repository'
import { agreementComments, agreementMarks } from './agreements.remarks.table'

export type CommentRow = typeof agreementComments.$inferSelect
export type MarkRow = typeof agreementMarks.$inferSelect

/** Comments on rounds of versions, in the order they were written. */
export async function selectComments({ tx }: Tenant, versions: readonly VersionRow[]): Promise<CommentRow[]> {
  if (versions.length === 0) return []
  return tx
    .select()
    .from(agreementComments)
    .where(ofVersions(agreementComments, versions))
    .orderBy(asc(agreementComments.at), asc(agreementComments.id))
}

/** Marks in rounds of versions, in the order they were made. */
export async function selectMarks({ tx }: Tenant, versions: readonly VersionRow[]): Promise<MarkRow[]> {
  if (versions.length === 0) return []
  return tx
    .select()
    .from(agreementMarks)
    .where(ofVersions(agreementMarks, versions))
    .orderBy(asc(agreementMarks.at), asc(agreementMarks.id))
}

const remark = (
  tenant: Tenant,
  { relationshipId, supplierOrgId, customerOrgId, versionId, id: roundId }: RoundRow,
  { kind, clauseKey }: About,
) => ({
  relationshipId,
  supplierOrgId,
  customerOrgId,
  versionId,
  roundId,
  about: kind,
  clauseKey,
  side: tenant.side,
  userId: tenant.userId,
  at: tenant.now,
})

export async function insertComment(
  tenant: Tenant,
  round: RoundRow,
  { about, text }: { about: About; text: string },
): Promise<CommentRow> {
  const [inserted] = await tenant.tx
    .insert(agreementComments)
    .values({ ...remark(tenant, round, about), text })
    .returning()
  if (!inserted) throw new Error('The comment was not stored.')
  return inserted
}

export async function insertMarks(
  tenant: Tenant,
  round: RoundRow,
  items: readonly { about: About; sha256: string }[],
  accepted: boolean,
): Promise<void> {
  await tenant.tx
    .insert(agreementMarks)
    .values(items.map(({ about, sha256 }) => ({ ...remark(tenant, round, about), sha256, accepted })))
}
