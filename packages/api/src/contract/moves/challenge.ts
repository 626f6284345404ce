import type { Move } from './define'
import type { SubmissionState } from './submission'

export const challengeStates = [
  'open',
  'answered',
  'resolved-by-evidence',
  'withdrawn',
  'unresolved',
] as const
export type ChallengeState = (typeof challengeStates)[number]

export type ChallengePrecondition =
  /** The submission waits for a decision and no decision is being confirmed. */
  | 'submission-under-review'
  /** One challenge at a time for each clause. */
  | 'clause-not-under-challenge'
  /** What is wrong, or the answer, in words. */
  | 'words-given'
  /** The submission is refused by the same act. */
  | 'submission-refused'

const customer = { side: 'customer', permission: 'reviews.decide' } as const
const supplier = { side: 'supplier', permission: 'reviews.answer' } as const

/** The life of a challenge to one clause result. */
export const challengeMoves = [
  {
    name: 'open',
    from: [],
    to: 'open',
    ...customer,
    preconditions: ['submission-under-review', 'clause-not-under-challenge', 'words-given'],
    event: 'challenge.opened',
    words: 'Challenge this result',
  },
  {
    name: 'answer',
    from: ['open'],
    to: 'answered',
    ...supplier,
    preconditions: ['submission-under-review', 'words-given'],
    event: 'challenge.answered',
    words: 'Send the answer',
  },
  {
    name: 'reply',
    from: ['answered'],
    to: 'open',
    ...customer,
    preconditions: ['submission-under-review', 'words-given'],
    event: 'challenge.replied',
    words: 'Reply, keep it open',
  },
  {
    name: 'settle',
    from: ['answered'],
    to: 'resolved-by-evidence',
    ...customer,
    preconditions: ['submission-under-review'],
    event: 'challenge.settled',
    words: 'The answer settles it',
  },
  {
    name: 'withdraw',
    from: ['open', 'answered'],
    to: 'withdrawn',
    ...customer,
    preconditions: ['submission-under-review'],
    event: 'challenge.withdrawn',
    words: 'Withdraw the challenge',
  },
  {
    name: 'leave-unresolved',
    from: ['answered'],
    to: 'unresolved',
    ...customer,
    preconditions: ['submission-refused'],
    event: 'challenge.left-unresolved',
    words: 'Leave unresolved',
  },
] as const satisfies readonly Move<ChallengeState, ChallengePrecondition>[]

export type ChallengeMove = (typeof challengeMoves)[number]
export type ChallengeMoveName = ChallengeMove['name']

type NamedMove<N extends ChallengeMoveName> = Extract<ChallengeMove, { name: N }>

/** The move of that name where the state allows it; null where there is no challenge yet. */
export const challengeMove = <N extends ChallengeMoveName>(
  name: N,
  state: ChallengeState | null,
): NamedMove<N> | undefined =>
  challengeMoves.find(
    (move): move is NamedMove<N> =>
      move.name === name &&
      (state === null ? move.from.length === 0 : (move.from as readonly ChallengeState[]).includes(state)),
  )

/** A challenge that still asks for something: the decision waits for it. */
export const isUnsettled = (state: ChallengeState): boolean => state === 'open' || state === 'answered'

/**
 * Where its challenges put a submission under review: challenged while one is open, answered once any has been
 * answered, and submitted where there is none or all were withdrawn before an answer.
 */
export function reviewState(
  challenges: readonly { state: ChallengeState; answered: boolean }[],
): Extract<SubmissionState, 'submitted' | 'challenged' | 'answered'> {
  if (challenges.some((each) => each.state === 'open')) return 'challenged'
  return challenges.some((each) => each.answered) ? 'answered' : 'submitted'
}
