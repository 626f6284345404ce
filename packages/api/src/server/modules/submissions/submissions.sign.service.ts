import type { BodyOf } from '../../../contract/define'
import type { Moved } from '../../../contract/reviews'
import type { signSubmission, withdrawSubmission } from '../../../contract/submissions'
import type { Tenant } from '../../db/tenant'
import { sha256 } from '../record/record.append'
import { answerRequests } from '../requests/requests.answers.service'
import { shareAtSigning } from '../standing/standing.share.service'
import { whatSigningFreezes } from './submissions.content.service'
import { replaceChosen } from './submissions.draft.repository'
import type { Frozen } from './submissions.freeze'
import { insertFrozen, insertSignature } from './submissions.frozen.repository'
import { about, submissionMessages, tell } from './submissions.messages'
import { asMoved, makeMove, openForMove, permittedMove } from './submissions.move.service'
import { preparedFacts } from './submissions.prepare.service'

/**
 * Signs and submits. What was seen is computed again from what stands in the database now; where its hash is the one
 * that the approver saw, it is frozen for good and the customer sees it.
 */
export async function sign(
  tenant: Tenant,
  id: string,
  { expectedVersion, sha256: seen }: BodyOf<typeof signSubmission>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion, { alone: true })
  const prepared = await whatSigningFreezes(tenant, submission)
  const move = permittedMove(tenant, 'sign', submission, {
    ...preparedFacts(prepared),
    'did-not-take-readings': maySignFor(tenant, prepared),
    'as-seen': prepared.sha256 === seen,
  })
  await replaceChosen(tenant, submission, prepared.chosen)
  await insertFrozen(tenant, submission, prepared)
  const { revision, sha256: signed } = prepared
  await insertSignature(tenant, submission, { meaning: 'submits', revision, sha256: signed })
  const { verdict, clausesMet, clausesTotal, content } = prepared
  const moved = await makeMove(
    tenant,
    submission,
    move,
    {
      ...{ verdict, clausesMet, clausesTotal, criteria: content.criteria },
      number: content.number,
      safety: content.characteristic.class === 'safety',
      submittedAt: tenant.now,
    },
    {
      ...frozenData(prepared),
      criteria: content.criteria,
    },
  )
  await answerRequests(tenant, moved, content.requests)
  await shareAtSigning(tenant, moved)
  const words = about('supplier', submissionMessages.signed(content.criteria, clausesMet, clausesTotal))
  await tell(tenant, moved, 'other side', 'submission', words)
  return asMoved(moved)
}

/** What the record keeps of a signed text: its hash, and those of everything it rests on. */
export const frozenData = ({ sha256: hash, verdict, content }: Frozen): Record<string, unknown> => ({
  ...{ sha256: hash, verdict },
  clauses: content.clauses.map(({ clauseKey, verdict: each, outputSha256, engineSha256 }) => ({
    ...{ clauseKey, verdict: each, outputSha256, engineSha256 },
  })),
  data: content.studies.map(({ code, data }) => ({ study: code, sha256: data.sha256 })),
  files: content.files.map(({ role, sha256: file }) => ({ role, sha256: file })),
})

/** Whoever took the readings does not sign for them, unless the agreement lets them. */
export const maySignFor = ({ userId }: Tenant, { content, takenBy }: Frozen): boolean =>
  content.terms.readingsTakerMaySign || !takenBy.includes(userId)

/** Takes back what is not decided yet; both sides keep it and its reason. */
export async function withdraw(
  tenant: Tenant,
  id: string,
  { expectedVersion, reason }: BodyOf<typeof withdrawSubmission>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const move = permittedMove(tenant, 'withdraw', submission, { 'reason-given': reason !== '' })
  const moved = await makeMove(
    tenant,
    submission,
    move,
    { withdrawalReason: reason },
    { reasonSha256: sha256(reason) },
  )
  const words = about('supplier', submissionMessages.withdrawn(reason))
  await tell(tenant, moved, 'other side', 'submission', words)
  return asMoved(moved)
}
