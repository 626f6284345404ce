import { reviews, type Permission, type Side, type submissions } from '@evenrule/api/contract'
import { challengeMoves, isUnsettled, type ChallengeState } from '@evenrule/api/contract/moves/challenge'
import { possibleMoves, type Move } from '@evenrule/api/contract/moves/define'
import type { SubmissionState } from '@evenrule/api/contract/moves/submission'

type Challenge = reviews.Challenge

/** What can be said in a challenge by a button, in the order offered. */
export const sayings = ['answer', 'settle', 'reply', 'withdraw'] as const
export type Saying = (typeof sayings)[number]

/** The endpoint behind each. */
export const sayingEndpoints = {
  answer: reviews.answerChallenge,
  reply: reviews.replyToAnswer,
  settle: reviews.settleChallenge,
  withdraw: reviews.withdrawChallenge,
} as const

/** States in which challenges can be opened and talked about: the decision is still to be made. */
const reviewing: readonly SubmissionState[] = ['submitted', 'challenged', 'answered']

/** What a person may say in a challenge as it and its submission stand. */
export function possibleSayings(
  submission: SubmissionState,
  challenge: ChallengeState,
  side: Side,
  holds: (permission: Permission) => boolean,
): Saying[] {
  if (!reviewing.includes(submission)) return []
  const names = possibleMoves<Move<ChallengeState>>(challengeMoves, challenge, side, holds).map(
    ({ name }) => name,
  )
  return sayings.filter((saying) => names.includes(saying))
}

/** Whether a person may open a challenge here at all. */
export function mayChallenge(
  submission: SubmissionState,
  side: Side,
  holds: (permission: Permission) => boolean,
): boolean {
  const open = challengeMoves.find(({ name }) => name === 'open')
  return reviewing.includes(submission) && open !== undefined && open.side === side && holds(open.permission)
}

/** The challenges of one clause, the newest first. */
export const challengesOf = (
  { challenges }: Pick<submissions.Submission, 'challenges'>,
  clauseKey: string,
): Challenge[] =>
  challenges.filter((each) => each.clauseKey === clauseKey).sort((a, b) => b.number - a.number)

/** One challenge at a time for each clause: whether a clause has one that is not settled. */
export const isUnderChallenge = (
  submission: Pick<submissions.Submission, 'challenges'>,
  clauseKey: string,
): boolean => challengesOf(submission, clauseKey).some(({ state }) => isUnsettled(state))
