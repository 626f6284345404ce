import {
  challengeMove,
  isUnsettled,
  type ChallengeMove,
  type ChallengePrecondition,
} from '../../../contract/moves/challenge'
import { unmet, type Facts } from '../../../contract/moves/define'
import { underReview } from '../../../contract/moves/submission'
import type { BodyOf } from '../../../contract/define'
import type { Challenge, openChallenge } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, wrongState } from '../../errors'
import { wrongSubmissionState } from '../submissions/submissions.errors'
import { selectClauses } from '../submissions/submissions.frozen.repository'
import { lockedSubmission, openForMove } from '../submissions/submissions.move.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { concludeChallenge, recordChallenge, type Spoken } from './challenges.follow.service'
import {
  insertChallenge,
  insertMessage,
  selectChallenges,
  updateChallenge,
  type ChallengeRow,
} from './challenges.repository'
import { clauseUnderChallenge } from './reviews.errors'

/** Challenges the result of one clause of a submission. */
export async function challenge(
  tenant: Tenant,
  id: string,
  { expectedVersion, clauseKey, reasonKind, text }: BodyOf<typeof openChallenge>,
): Promise<Challenge> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const clauses = await selectClauses(tenant, submission)
  if (!clauses.some((clause) => clause.clauseKey === clauseKey))
    throw invalidInput([{ path: 'body.clauseKey', message: 'Choose a clause of this submission.' }])
  const before = await selectChallenges(tenant, submission)
  const move = challengeMove('open', null)
  if (!move) throw new Error('No move makes a challenge.')
  const isThere = before.some((each) => each.clauseKey === clauseKey && isUnsettled(each.state))
  allow(submission, move, {
    'submission-under-review': canBeChallenged(submission),
    'clause-not-under-challenge': !isThere,
    'words-given': text !== '',
  })
  const opened = await insertChallenge(tenant, submission, {
    ...{ number: before.length + 1, clauseKey, reasonKind, state: move.to },
  })
  await insertMessage(tenant, opened, text)
  return concludeChallenge(tenant, submission, opened, move, text, { clauseKey, reasonKind })
}

/** The supplier answers an open challenge in words. */
export const answer = (tenant: Tenant, id: string, challengeId: string, said: Said): Promise<Challenge> =>
  moveChallenge(tenant, id, challengeId, 'answer', said)

/** The customer replies to an answer that does not settle it. */
export const reply = (tenant: Tenant, id: string, challengeId: string, said: Said): Promise<Challenge> =>
  moveChallenge(tenant, id, challengeId, 'reply', said)

/** The answer settles the challenge. */
export const settle = (tenant: Tenant, id: string, challengeId: string, said: Said): Promise<Challenge> =>
  moveChallenge(tenant, id, challengeId, 'settle', said)

/** The customer withdraws the challenge. */
export const withdraw = (tenant: Tenant, id: string, challengeId: string, said: Said): Promise<Challenge> =>
  moveChallenge(tenant, id, challengeId, 'withdraw', said)

interface Said {
  expectedVersion: number
  text: string
}

/** Challenges whose answers did not settle them when the submission was refused. */
export async function leaveUnresolved(tenant: Tenant, refused: SubmissionRow): Promise<void> {
  for (const row of await selectChallenges(tenant, refused)) {
    const move = challengeMove('leave-unresolved', row.state)
    if (!move) continue
    allow(refused, move, { 'submission-refused': refused.state === 'refused' })
    const left = await updateChallenge(tenant, row, { state: move.to, ...closing(tenant, move) })
    recordChallenge(tenant, refused, left, move)
  }
}

async function moveChallenge(
  tenant: Tenant,
  id: string,
  challengeId: string,
  name: Spoken,
  { expectedVersion, text }: Said,
): Promise<Challenge> {
  const submission = await lockedSubmission(tenant, id)
  const row = (await selectChallenges(tenant, submission)).find((each) => each.id === challengeId)
  if (!row) throw notFound('challenge')
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('challenge')
  const move = challengeMove(name, row.state)
  if (!move || move.side !== tenant.side) throw wrongState('challenge', stateWords[row.state])
  allow(submission, move, {
    'submission-under-review': canBeChallenged(submission),
    'words-given': text !== '',
  })
  const moved = await updateChallenge(tenant, row, {
    state: move.to,
    ...(name === 'answer' ? { answeredAt: tenant.now } : closing(tenant, move)),
  })
  if (text !== '') await insertMessage(tenant, moved, text)
  return concludeChallenge(tenant, submission, moved, move, text)
}

const stateWords: Record<ChallengeRow['state'], string> = {
  open: 'open',
  answered: 'answered',
  'resolved-by-evidence': 'settled',
  withdrawn: 'withdrawn',
  unresolved: 'left unresolved',
}

const closing = ({ userId, now }: Tenant, { to }: ChallengeMove) =>
  isUnsettled(to) ? {} : { closedBy: userId, closedAt: now }

const canBeChallenged = ({ state }: SubmissionRow): boolean =>
  underReview.includes(state) && state !== 'awaiting-second-person'

function allow(submission: SubmissionRow, move: ChallengeMove, facts: Facts<ChallengePrecondition>): void {
  const [lacking] = unmet<ChallengePrecondition>(move, facts)
  if (lacking === undefined) return
  throw lacking === 'clause-not-under-challenge'
    ? clauseUnderChallenge()
    : wrongSubmissionState(submission.state)
}
