import type { reviews } from '@evenrule/api/contract'
import { type Permission, type Side, type submissions } from '@evenrule/api/contract'
import { clausesConcerned, sameTarget, type ChallengeTarget } from '@evenrule/api/contract/challenge-targets'
import { challengeMoves, isUnsettled, type ChallengeState } from '@evenrule/api/contract/moves/challenge'
import { possibleMoves, type Move } from '@evenrule/api/contract/moves/define'
import { openToChallenge, type SubmissionState } from '@evenrule/api/contract/moves/submission'
import { clauseSubject } from '@evenrule/metrology'
import { describeClause } from '../../strings/clauses'
import { challengeMark, describeTarget } from '../../strings/challenges'
import type { ClauseResult } from '../results'
import type { ReadSubmission } from '../submissions/reading'

export type Challenge = reviews.Challenge
type Challenged = Pick<submissions.Submission, 'challenges'>

/** What can be said in a challenge by a button, in the order offered. */
export const sayings = [
  'answer',
  'correct',
  'agree-unresolved',
  'decline-unresolved',
  'settle',
  'reply',
  'withdraw',
  'propose-unresolved',
] as const
export type Saying = (typeof sayings)[number]

/** What a person may say in a challenge as it and its submission stand. */
export function possibleSayings(
  submission: SubmissionState,
  challenge: ChallengeState,
  side: Side,
  holds: (permission: Permission) => boolean,
): Saying[] {
  if (!openToChallenge.includes(submission)) return []
  const names = possibleMoves<Move<ChallengeState>>(challengeMoves, challenge, side, holds).map(
    ({ name }) => name,
  )
  // Whoever may answer may begin a correction; signing it is an approver's.
  return sayings.filter((saying) => names.includes(saying === 'correct' ? 'answer' : saying))
}

/** Whether a person may open a challenge here at all. */
export function mayChallenge(
  submission: SubmissionState,
  side: Side,
  holds: (permission: Permission) => boolean,
): boolean {
  const open = challengeMoves.find(({ name }) => name === 'open')
  return (
    openToChallenge.includes(submission) && open !== undefined && open.side === side && holds(open.permission)
  )
}

/** Whether the last answer of a challenge was a corrected revision. */
export const isCorrected = ({ messages }: Pick<Challenge, 'messages'>): boolean =>
  messages.filter(({ answerKind }) => answerKind !== null).at(-1)?.answerKind === 'correction'

/** Clauses whose figure comes from the readings, or from the standard they were taken on. */
const restsOn = { readings: ['bias'], 'set-up': ['bias'], standard: ['bias', 'calibration'] } as const

/** The challenges that put the result of a clause in question, the newest first. */
export const challengesOf = (
  { submission, content }: Pick<ReadSubmission, 'content'> & { submission: Challenged },
  { clauseKey, clause }: Pick<ClauseResult, 'clauseKey' | 'clause'>,
): Challenge[] =>
  submission.challenges
    .filter(
      ({ target }) =>
        clausesConcerned(target, content).includes(clauseKey) &&
        ('clauseKey' in target || restsOn[target.kind].some((subject) => subject === clauseSubject(clause))),
    )
    .sort((a, b) => b.number - a.number)

/** The challenges about one study or its readings, the newest first. */
export const challengesOfStudy = ({ challenges }: Challenged, study: string): Challenge[] =>
  challenges
    .filter(({ target }) => 'study' in target && target.study === study)
    .sort((a, b) => b.number - a.number)

/** One challenge at a time about the same thing: whether a target has one that is not settled. */
export const isUnderChallenge = ({ challenges }: Challenged, target: ChallengeTarget): boolean =>
  challenges.some((each) => isUnsettled(each.state) && sameTarget(each.target, target))

/** What single readings of a study are in question for, by their zero-based places in the revision shown. */
export function readingsInQuestion(
  { challenges }: Challenged,
  study: string,
  revision: number,
): Map<number, string> {
  const marks = new Map<number, string[]>()
  for (const { target, number, revision: of, state } of challenges)
    if (target.kind === 'readings' && target.study === study && of === revision && state !== 'withdrawn')
      for (const at of target.readings) marks.set(at, [...(marks.get(at) ?? []), challengeMark(number)])
  return new Map([...marks].map(([at, texts]) => [at, texts.join(', ')]))
}

/** What a challenge is about, in words. */
export function targetText(target: ChallengeTarget, { results, advisory }: ReadSubmission): string {
  const key = 'clauseKey' in target ? target.clauseKey : ''
  const result = [...results, ...advisory].find(({ clauseKey }) => clauseKey === key)
  return describeTarget(target, result ? describeClause(result.clause, result.input) : key)
}
