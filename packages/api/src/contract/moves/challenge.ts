import type { Move } from './define'
import type { SubmissionState } from './submission'

export const challengeStates = [
  'open',
  'answered',
  /** The customer's approver proposes to leave it unresolved; the supplier's approver has to agree. */
  'unresolved-proposed',
  'resolved-by-evidence',
  'resolved-by-correction',
  'withdrawn',
  'unresolved',
] as const
export type ChallengeState = (typeof challengeStates)[number]

export type ChallengePrecondition =
  /** The submission waits for a decision and no decision is being confirmed or agreed. */
  | 'submission-under-review'
  /** One challenge at a time about the same thing. */
  | 'target-not-under-challenge'
  /** What is wrong, or the answer, in words. */
  | 'words-given'
  /** Answered by files: at least one is there. */
  | 'files-given'
  /** Something that was frozen differs in the corrected revision. */
  | 'data-corrected'
  /** The signer is not among those who took the readings, or the agreement lets them sign. */
  | 'did-not-take-readings'
  /** The hash that the person saw is the hash of what is signed. */
  | 'as-seen'
  /** The last answer was a corrected revision, or another kind of answer. */
  | 'corrected'
  | 'not-corrected'
  /** The submission is refused by the same act. */
  | 'submission-refused'

const customer = { side: 'customer', permission: 'reviews.decide' } as const
const customerApprover = { side: 'customer', permission: 'reviews.approve' } as const
const supplier = { side: 'supplier', permission: 'reviews.answer' } as const
const supplierApprover = { side: 'supplier', permission: 'submissions.sign' } as const

/** The life of a challenge to one named thing in a submission. */
export const challengeMoves = [
  {
    name: 'open',
    from: [],
    to: 'open',
    ...customer,
    preconditions: ['submission-under-review', 'target-not-under-challenge', 'words-given'],
    event: 'challenge.opened',
    words: 'Send the challenge',
  },
  {
    name: 'answer',
    from: ['open'],
    to: 'answered',
    ...supplier,
    preconditions: ['submission-under-review', 'words-given', 'files-given'],
    event: 'challenge.answered',
    words: 'Send the answer',
  },
  {
    name: 'correct',
    from: ['open'],
    to: 'answered',
    ...supplierApprover,
    preconditions: [
      'submission-under-review',
      'data-corrected',
      'did-not-take-readings',
      'as-seen',
      'words-given',
    ],
    event: 'challenge.answered-by-correction',
    words: 'Sign the correction',
  },
  {
    name: 'reply',
    from: ['answered', 'unresolved-proposed'],
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
    preconditions: ['submission-under-review', 'not-corrected'],
    event: 'challenge.settled',
    words: 'The answer settles it',
  },
  {
    name: 'settle',
    from: ['answered'],
    to: 'resolved-by-correction',
    ...customer,
    preconditions: ['submission-under-review', 'corrected'],
    event: 'challenge.settled',
    words: 'The correction settles it',
  },
  {
    name: 'withdraw',
    from: ['open', 'answered', 'unresolved-proposed'],
    to: 'withdrawn',
    ...customer,
    preconditions: ['submission-under-review'],
    event: 'challenge.withdrawn',
    words: 'Withdraw the challenge',
  },
  {
    name: 'propose-unresolved',
    from: ['open', 'answered'],
    to: 'unresolved-proposed',
    ...customerApprover,
    preconditions: ['submission-under-review', 'words-given'],
    event: 'challenge.unresolved-proposed',
    words: 'Propose to leave it unresolved',
  },
  {
    name: 'agree-unresolved',
    from: ['unresolved-proposed'],
    to: 'unresolved',
    ...supplierApprover,
    preconditions: ['submission-under-review'],
    event: 'challenge.left-unresolved',
    words: 'Agree to leave it unresolved',
  },
  {
    name: 'decline-unresolved',
    from: ['unresolved-proposed'],
    to: 'answered',
    ...supplierApprover,
    preconditions: ['submission-under-review', 'words-given'],
    event: 'challenge.unresolved-declined',
    words: 'Do not agree',
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

/** Every row of that name that may start from the state; null where there is no challenge yet. */
export const challengeMovesNamed = <N extends ChallengeMoveName>(
  name: N,
  state: ChallengeState | null,
): Extract<ChallengeMove, { name: N }>[] =>
  challengeMoves.filter(
    (move): move is Extract<ChallengeMove, { name: N }> =>
      move.name === name &&
      (state === null ? move.from.length === 0 : (move.from as readonly ChallengeState[]).includes(state)),
  )

/** The first such row; for names that have one row from each state, and to ask whether there is any. */
export const challengeMove = <N extends ChallengeMoveName>(
  name: N,
  state: ChallengeState | null,
): Extract<ChallengeMove, { name: N }> | undefined => challengeMovesNamed(name, state)[0]

const unsettled: readonly ChallengeState[] = ['open', 'answered', 'unresolved-proposed']

/** A challenge that still asks for something: the decision waits for it. */
export const isUnsettled = (state: ChallengeState): boolean => unsettled.includes(state)

/** A challenge whose next step is the supplier's. */
export const waitsOnSupplier = (state: ChallengeState): boolean =>
  state === 'open' || state === 'unresolved-proposed'

/**
 * Where its challenges put a submission under review: challenged while one waits for the supplier, answered once any
 * has been answered, and submitted where there is none or all were withdrawn before an answer.
 */
export function reviewState(
  challenges: readonly { state: ChallengeState; answered: boolean }[],
): Extract<SubmissionState, 'submitted' | 'challenged' | 'answered'> {
  if (challenges.some((each) => waitsOnSupplier(each.state))) return 'challenged'
  return challenges.some((each) => each.answered) ? 'answered' : 'submitted'
}
