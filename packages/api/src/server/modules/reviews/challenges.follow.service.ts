import { reviewState, type ChallengeMove, type ChallengeMoveName } from '../../../contract/moves/challenge'
import type { SubmissionMoveName } from '../../../contract/moves/submission'
import type { Challenge } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile } from '../../errors'
import { sha256 } from '../record/record.append'
import { about, tell } from '../submissions/submissions.messages'
import { makeMove, permittedMove } from '../submissions/submissions.move.service'
import { updateSubmission, type SubmissionRow } from '../submissions/submissions.repository'
import { selectChallenges, type ChallengeRow } from './challenges.repository'
import { challengeFacts } from './reviews.facts.service'
import { challengeMessages } from './reviews.messages'
import { readChallenge } from './reviews.read.service'

/** Moves of a challenge that somebody makes; the rest follows from a decision. */
export type Spoken = Exclude<ChallengeMoveName, 'leave-unresolved'>

/** The move of the submission that follows from a move of one of its challenges. */
const following: Record<Spoken, SubmissionMoveName | null> = {
  open: 'challenge',
  answer: 'answer',
  correct: 'answer',
  reply: 'challenge',
  settle: null,
  withdraw: 'resume',
  'propose-unresolved': 'challenge',
  'agree-unresolved': 'answer',
  'decline-unresolved': 'answer',
}

export interface Concluding {
  /** What was said. */
  text: string
  /** What the event holds beside it. */
  data?: Record<string, unknown>
  /** What else of the submission changes by it. */
  values?: Parameters<typeof updateSubmission>[2]
}

/** What follows from a move of a challenge: event, message, and where the challenges put the submission now. */
export async function concludeChallenge(
  tenant: Tenant,
  submission: SubmissionRow,
  row: ChallengeRow,
  move: Extract<ChallengeMove, { name: Spoken }>,
  { text, data = {}, values = {} }: Concluding,
): Promise<Challenge> {
  recordChallenge(tenant, submission, row, move, {
    ...data,
    ...(text === '' ? {} : { textSha256: sha256(text) }),
  })
  const all = await selectChallenges(tenant, submission)
  const next = reviewState(all.map(({ state, answeredAt }) => ({ state, answered: answeredAt !== null })))
  const name = following[move.name]
  if (next !== submission.state && name)
    await makeMove(tenant, submission, permittedMove(tenant, name, submission, challengeFacts(all)), values)
  // Who decides must have seen what was said last, so every word gives the submission a new version.
  else if (!(await updateSubmission(tenant, submission, values))) throw changedMeanwhile('submission')
  const words = about(tenant.side, challengeMessages[move.name](text, row))
  await tell(tenant, submission, 'other side', 'challenge', words)
  return readChallenge(tenant, submission, row.id)
}

/** Writes a move of a challenge into the record of the relationship. */
export function recordChallenge(
  tenant: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId, taskId, number }: SubmissionRow,
  { id: challengeId, number: challengeNumber }: ChallengeRow,
  { event }: Pick<ChallengeMove, 'event'>,
  data: Record<string, unknown> = {},
): void {
  tenant.record({
    type: event,
    relationship: { id: relationshipId, supplierOrgId, customerOrgId },
    subject: { type: 'challenge', id: challengeId },
    taskId,
    data: { submissionId: id, number, challenge: challengeNumber, ...data },
  })
}
