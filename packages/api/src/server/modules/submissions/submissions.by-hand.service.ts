import type { ByHand, clearByHand, judgeByHand } from '../../../contract/by-hand'
import type { BodyOf } from '../../../contract/define'
import type { Moved } from '../../../contract/reviews'
import type { Submission } from '../../../contract/submissions'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, notFound } from '../../errors'
import { ownFile } from '../files/attachments.service'
import { sha256 } from '../record/record.append'
import { byHandOf, deleteByHand, upsertByHand } from './submissions.by-hand.repository'
import { whatSigningFreezes, type Prepared } from './submissions.content.service'
import { wrongSubmissionState } from './submissions.errors'
import { asMoved, openForMove, recordSubmission } from './submissions.move.service'
import { updateSubmission, type SubmissionRow } from './submissions.repository'

/** Judges a clause of a draft by hand, on a document of this organisation. */
export async function judge(
  tenant: Tenant,
  id: string,
  clauseKey: string,
  { expectedVersion, verdict, reason, fileId }: BodyOf<typeof judgeByHand>,
): Promise<Moved> {
  const submission = await openDraft(tenant, id, expectedVersion)
  const prepared = await whatSigningFreezes(tenant, submission)
  if (!asksByHand(prepared).some((clause) => clause.clauseKey === clauseKey))
    throw notFound('clause that is judged by hand')
  const document = await ownFile(tenant, fileId, 'body.fileId')
  await upsertByHand(tenant, submission, { clauseKey, verdict, reason, fileId })
  return changed(tenant, submission, 'submission.judged-by-hand', {
    ...{ clauseKey, verdict, reasonSha256: sha256(reason), documentSha256: document.sha256 },
  })
}

/** Takes a judgement by hand back. */
export async function clear(
  tenant: Tenant,
  id: string,
  clauseKey: string,
  { expectedVersion }: BodyOf<typeof clearByHand>,
): Promise<Moved> {
  const submission = await openDraft(tenant, id, expectedVersion)
  if (!(await deleteByHand(tenant, id, clauseKey))) throw notFound('judgement by hand')
  return changed(tenant, submission, 'submission.by-hand-cleared', { clauseKey })
}

/** Clauses of a draft that ask for a judgement by hand, with what was entered so far. */
export async function byHandAsked(
  tenant: Tenant,
  submissionId: string,
  prepared: Prepared,
): Promise<Submission['byHand']> {
  const entered = await byHandOf(tenant, submissionId)
  return asksByHand(prepared).map(({ clauseKey, clause }) => {
    const found = entered.find(({ entry }) => entry.clauseKey === clauseKey)
    const judged: ByHand | null = found
      ? {
          ...{ clauseKey, verdict: found.entry.verdict, reason: found.entry.reason },
          document: documentOf(found.file),
        }
      : null
    return { clauseKey, clause, judged }
  })
}

const documentOf = ({ id, name, size, sha256: hash }: ByHand['document']): ByHand['document'] => ({
  ...{ id, name, size, sha256: hash },
})

const asksByHand = ({ content }: Prepared) =>
  content.clauses.filter(({ clause }) => clause.type === 'by-hand')

async function openDraft(tenant: Tenant, id: string, expectedVersion: number): Promise<SubmissionRow> {
  const submission = await openForMove(tenant, id, expectedVersion)
  if (submission.state !== 'draft') throw wrongSubmissionState(submission.state)
  return submission
}

async function changed(
  tenant: Tenant,
  submission: SubmissionRow,
  type: string,
  data: Record<string, unknown>,
): Promise<Moved> {
  const updated = await updateSubmission(tenant, submission, {})
  if (!updated) throw changedMeanwhile('submission')
  recordSubmission(tenant, updated, type, data)
  return asMoved(updated)
}
