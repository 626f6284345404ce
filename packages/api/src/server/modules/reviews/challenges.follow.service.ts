import { reviewState, type ChallengeMove, type ChallengeMoveName } from '../../../contract/moves/challenge'
import type { SubmissionMoveName } from '../../../contract/moves/submission'
import type { Challenge } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { sha256 } from '../record/record.append'
import { about, tell } from '../submissions/submissions.messages'
import { makeMove, permittedMove } from '../submissions/submissions.move.service'
import { updateSubmission, type SubmissionRow } from '../submissions/submissions.repository'
import { challengeAnswers } from './challenges.read'
import { selectChallenges, selectMessages, type ChallengeRow } from './challenges.repository'
import { challengeFacts } from './reviews.facts.service'
import { challengeMessages } from './reviews.messages'

/** Moves of a challenge that somebody makes; the rest follows from a decision. */
export type Spoken = Exclude<ChallengeMoveName, 'leave-unresolved'>

/** The move of the submission that follows from a move of one of its challenges. */
const following: Record<Spoken, SubmissionMoveName | null> = {
  open: 'challenge',
  answer: 'answer',
  reply: 'challenge',
  settle: null,
  withdraw: 'resume',
}

/** What follows from a move of a challenge: event, message, and where the challenges put the submission now. */
export async function concludeChallenge(
  tenant: Tenant,
  submission: SubmissionRow,
  row: ChallengeRow,
  move: Extract<ChallengeMove, { name: Spoken }>,
  text: string,
  data: Record<string, unknown> = {},
): Promise<Challenge> {
  recordChallenge(tenant, submission, row, move, {
    ...data,
    ...(text === '' ? {} : { textSha256: sha256(text) }),
  })
  const all = await selectChallenges(tenant, submission)
  const next = reviewState(all.map(({ state, answeredAt }) => ({ state, answered: answeredAt !== null })))
  const name = following[move.name]
  if (next !== submission.state && name)
    await makeMove(tenant, submission, permittedMove(tenant, name, submission, challengeFacts(all)))
  // Who decides must have seen what was said last, so every word gives the submission a new version.
  else if (!(await updateSubmission(tenant, submission, {}))) throw changedMeanwhile('submission')
  const words = about(tenant.side, challengeMessages[move.name](text))
  await tell(tenant, submission, 'other side', 'challenge', words)
  return asAnswer(tenant, submission, row)
}

/** Writes a move of a challenge into the record of the relationship. */
export function recordChallenge(
  tenant: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId, taskId, number }: SubmissionRow,
  { id: challengeId, number: challengeNumber }: ChallengeRow,
  { event }: ChallengeMove,
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

async function asAnswer(tenant: Tenant, submission: SubmissionRow, row: ChallengeRow): Promise<Challenge> {
  const messages = await selectMessages(tenant, submission, [row.id])
  const names = await namesOfPeople(tenant, [row.closedBy, ...messages.map(({ userId }) => userId)])
  const [answer] = challengeAnswers([row], messages, (userId) => names.get(userId ?? '') ?? null)
  if (!answer) throw new Error('A challenge was lost on its way out.')
  return answer
}
