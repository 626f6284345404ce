import { and, asc, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import type { FileRow } from '../files/files.repository'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { reviewFiles } from './reviews.table'

export type ReviewFileRow = typeof reviewFiles.$inferSelect
type Of = { messageId: string } | { reportId: string }

/** Files that go with what was said in the review of a submission, by name. */
export async function selectReviewFiles(
  { tx }: Tenant,
  { relationshipId, id }: Pick<SubmissionRow, 'relationshipId' | 'id'>,
): Promise<ReviewFileRow[]> {
  return tx
    .select()
    .from(reviewFiles)
    .where(and(eq(reviewFiles.relationshipId, relationshipId), eq(reviewFiles.submissionId, id)))
    .orderBy(asc(reviewFiles.name), asc(reviewFiles.id))
}

/** Shows files of this organisation to both sides, with a message or a report. */
export async function insertReviewFiles(
  { tx, side }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: SubmissionRow,
  of: Of,
  files: readonly FileRow[],
): Promise<void> {
  if (files.length === 0) return
  await tx.insert(reviewFiles).values(
    files.map(({ name, contentType, size, sha256, storageKey }) => ({
      ...{ submissionId: id, relationshipId, supplierOrgId, customerOrgId, side },
      ...of,
      ...{ name, contentType, size, sha256, storageKey },
    })),
  )
}
