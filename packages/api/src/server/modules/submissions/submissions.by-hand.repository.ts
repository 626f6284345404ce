import { and, asc, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { files } from '../files/files.table'
import type { SubmissionRow } from './submissions.repository'
import { submissionByHand } from './submissions.table'

export type ByHandRow = typeof submissionByHand.$inferSelect

const ofSubmission = (tenant: Tenant, submissionId: string) =>
  and(eq(submissionByHand.orgId, tenant.organisationId), eq(submissionByHand.submissionId, submissionId))

/** What was judged by hand for a draft, each with its document. */
export async function byHandOf(tenant: Tenant, submissionId: string) {
  return tenant.tx
    .select({ entry: submissionByHand, file: files })
    .from(submissionByHand)
    .innerJoin(files, and(eq(files.orgId, submissionByHand.orgId), eq(files.id, submissionByHand.fileId)))
    .where(ofSubmission(tenant, submissionId))
    .orderBy(asc(submissionByHand.clauseKey))
}

/** Enters a judgement by hand; another one for the same clause gives way to it. */
export async function upsertByHand(
  { tx, organisationId: orgId, userId: enteredBy, now: enteredAt }: Tenant,
  { id: submissionId, relationshipId }: Pick<SubmissionRow, 'id' | 'relationshipId'>,
  entry: Pick<ByHandRow, 'clauseKey' | 'verdict' | 'reason' | 'fileId'>,
): Promise<void> {
  const { verdict, reason, fileId } = entry
  await tx
    .insert(submissionByHand)
    .values({ orgId, relationshipId, submissionId, ...entry, enteredBy, enteredAt })
    .onConflictDoUpdate({
      target: [submissionByHand.orgId, submissionByHand.submissionId, submissionByHand.clauseKey],
      set: { verdict, reason, fileId, enteredBy, enteredAt },
    })
}

/** Takes a judgement back; whether there was one. */
export async function deleteByHand(tenant: Tenant, submissionId: string, key: string): Promise<boolean> {
  const deleted = await tenant.tx
    .delete(submissionByHand)
    .where(and(ofSubmission(tenant, submissionId), eq(submissionByHand.clauseKey, key)))
    .returning({ clauseKey: submissionByHand.clauseKey })
  return deleted.length > 0
}
