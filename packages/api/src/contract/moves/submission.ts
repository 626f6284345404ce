import type { Side } from '../access'
import type { Move } from './define'

export const submissionStates = [
  'draft',
  'for-signature',
  'submitted',
  'challenged',
  'answered',
  'awaiting-second-person',
  /** Accepted without agreed criteria by the customer; an approver of the supplier has to agree. */
  'awaiting-other-side',
  'accepted',
  'accepted-with-conditions',
  'refused',
  'withdrawn',
  'superseded',
] as const
export type SubmissionState = (typeof submissionStates)[number]

export type SubmissionPrecondition =
  /** The measuring task is in use; one that was archived needs no proof. */
  | 'task-in-use'
  /** The studies it rests on: at least one where there are no criteria, or it would show nothing at all. */
  | 'something-to-judge'
  /** One unsigned submission per measuring task at a time. */
  | 'no-other-draft'
  /** A sentence that says why. */
  | 'reason-given'
  /** The signer is not among those who took the readings, or the agreement lets them sign. */
  | 'did-not-take-readings'
  /** The hash that the person saw is the hash of what is signed. */
  | 'as-seen'
  /** Challenges of the submission, as they stand after the move. */
  | 'a-challenge-is-open'
  | 'no-challenge-open'
  | 'no-challenge-was-answered'
  /** Every challenge has ended. */
  | 'challenges-settled'
  | 'safety-class'
  | 'not-safety-class'
  /** Whether signed criteria judged it; without them an approver of each side decides. */
  | 'criteria-agreed'
  | 'no-criteria-agreed'
  /** No submission of the same task that was signed later is accepted already. */
  | 'no-newer-accepted'
  | 'newer-accepted'
  /** What was proposed decides which acceptance it becomes. */
  | 'without-conditions'
  | 'with-conditions'
  /** The second person is not the first. */
  | 'another-person'

const engineer = { side: 'supplier', permission: 'submissions.prepare' } as const
const signer = { side: 'supplier', permission: 'submissions.sign' } as const
const reviewer = { side: 'customer', permission: 'reviews.decide' } as const
const approver = { side: 'customer', permission: 'reviews.approve' } as const

const undecided = [
  'submitted',
  'challenged',
  'answered',
  'awaiting-second-person',
  'awaiting-other-side',
] as const
const decidable = ['submitted', 'answered'] as const
/** What every acceptance rests on. */
const ready = ['as-seen', 'challenges-settled', 'no-newer-accepted'] as const
const confirmable = ['as-seen', 'another-person', 'no-newer-accepted'] as const

/**
 * The life of a submission. A name with several rows leads to several states; the preconditions tell which.
 * Until it is signed it is the supplier's own; from then on every move stands in the relationship's record.
 */
export const submissionMoves = [
  {
    name: 'prepare',
    from: [],
    to: 'draft',
    ...engineer,
    preconditions: ['task-in-use', 'no-other-draft'],
    event: 'submission.prepared',
    words: 'Prepare a submission',
  },
  {
    name: 'send-for-signature',
    from: ['draft'],
    to: 'for-signature',
    ...engineer,
    preconditions: ['task-in-use', 'something-to-judge'],
    event: 'submission.sent-for-signature',
    words: 'Send for signature',
  },
  {
    name: 'return',
    from: ['for-signature'],
    to: 'draft',
    ...engineer,
    preconditions: ['reason-given'],
    event: 'submission.returned',
    words: 'Return with a note',
  },
  {
    name: 'sign',
    from: ['for-signature'],
    to: 'submitted',
    ...signer,
    preconditions: ['task-in-use', 'something-to-judge', 'did-not-take-readings', 'as-seen'],
    event: 'submission.signed',
    words: 'Sign and submit',
  },
  {
    name: 'discard',
    from: ['draft', 'for-signature'],
    to: 'withdrawn',
    ...engineer,
    preconditions: [],
    event: 'submission.discarded',
    words: 'Discard',
  },
  {
    name: 'withdraw',
    from: undecided,
    to: 'withdrawn',
    ...engineer,
    preconditions: ['reason-given'],
    event: 'submission.withdrawn',
    words: 'Withdraw the submission',
  },
  {
    name: 'challenge',
    from: ['submitted', 'answered', 'challenged'],
    to: 'challenged',
    ...reviewer,
    preconditions: ['a-challenge-is-open'],
    event: 'submission.challenged',
    words: 'Challenge a result',
  },
  {
    name: 'answer',
    from: ['challenged'],
    to: 'answered',
    side: 'supplier',
    permission: 'reviews.answer',
    preconditions: ['no-challenge-open'],
    event: 'submission.answered',
    words: 'Answer',
  },
  {
    name: 'resume',
    from: ['challenged'],
    to: 'answered',
    ...reviewer,
    preconditions: ['no-challenge-open'],
    event: 'submission.review-resumed',
    words: 'Go on with the review',
  },
  {
    name: 'resume',
    from: ['challenged'],
    to: 'submitted',
    ...reviewer,
    preconditions: ['no-challenge-open', 'no-challenge-was-answered'],
    event: 'submission.review-resumed',
    words: 'Go on with the review',
  },
  {
    name: 'accept',
    from: decidable,
    to: 'accepted',
    ...reviewer,
    preconditions: [...ready, 'criteria-agreed', 'not-safety-class'],
    event: 'submission.accepted',
    words: 'Accept',
  },
  {
    name: 'accept',
    from: decidable,
    to: 'awaiting-second-person',
    ...reviewer,
    preconditions: [...ready, 'criteria-agreed', 'safety-class'],
    event: 'submission.second-person-asked',
    words: 'Accept',
  },
  {
    name: 'accept',
    from: decidable,
    to: 'awaiting-other-side',
    ...approver,
    preconditions: [...ready, 'no-criteria-agreed', 'not-safety-class'],
    event: 'submission.one-off-proposed',
    words: 'Accept',
  },
  {
    name: 'accept',
    from: decidable,
    to: 'awaiting-second-person',
    ...approver,
    preconditions: [...ready, 'no-criteria-agreed', 'safety-class'],
    event: 'submission.second-person-asked',
    words: 'Accept',
  },
  {
    name: 'accept-with-conditions',
    from: decidable,
    to: 'accepted-with-conditions',
    ...approver,
    preconditions: [...ready, 'criteria-agreed', 'not-safety-class'],
    event: 'submission.accepted-with-conditions',
    words: 'Accept with conditions',
  },
  {
    name: 'accept-with-conditions',
    from: decidable,
    to: 'awaiting-other-side',
    ...approver,
    preconditions: [...ready, 'no-criteria-agreed', 'not-safety-class'],
    event: 'submission.one-off-proposed',
    words: 'Accept with conditions',
  },
  {
    name: 'accept-with-conditions',
    from: decidable,
    to: 'awaiting-second-person',
    ...approver,
    preconditions: [...ready, 'safety-class'],
    event: 'submission.second-person-asked',
    words: 'Accept with conditions',
  },
  {
    name: 'refuse',
    from: decidable,
    to: 'refused',
    ...reviewer,
    preconditions: ['as-seen', 'no-challenge-open', 'reason-given', 'criteria-agreed'],
    event: 'submission.refused',
    words: 'Refuse',
  },
  {
    name: 'refuse',
    from: decidable,
    to: 'refused',
    ...approver,
    preconditions: ['as-seen', 'no-challenge-open', 'reason-given', 'no-criteria-agreed'],
    event: 'submission.refused',
    words: 'Refuse',
  },
  {
    name: 'confirm',
    from: ['awaiting-second-person'],
    to: 'accepted',
    ...reviewer,
    preconditions: [...confirmable, 'criteria-agreed', 'without-conditions'],
    event: 'submission.accepted',
    words: 'Confirm as second person',
  },
  {
    name: 'confirm',
    from: ['awaiting-second-person'],
    to: 'accepted-with-conditions',
    ...reviewer,
    preconditions: [...confirmable, 'criteria-agreed', 'with-conditions'],
    event: 'submission.accepted-with-conditions',
    words: 'Confirm as second person',
  },
  {
    name: 'confirm',
    from: ['awaiting-second-person'],
    to: 'awaiting-other-side',
    ...reviewer,
    preconditions: [...confirmable, 'no-criteria-agreed'],
    event: 'submission.one-off-proposed',
    words: 'Confirm as second person',
  },
  {
    name: 'agree-one-off',
    from: ['awaiting-other-side'],
    to: 'accepted',
    ...signer,
    preconditions: ['as-seen', 'no-newer-accepted', 'without-conditions'],
    event: 'submission.one-off-agreed',
    words: 'Agree and sign',
  },
  {
    name: 'agree-one-off',
    from: ['awaiting-other-side'],
    to: 'accepted-with-conditions',
    ...signer,
    preconditions: ['as-seen', 'no-newer-accepted', 'with-conditions'],
    event: 'submission.one-off-agreed',
    words: 'Agree and sign',
  },
  {
    name: 'decline-one-off',
    from: ['awaiting-other-side'],
    to: 'submitted',
    ...signer,
    preconditions: ['reason-given', 'no-challenge-was-answered'],
    event: 'submission.one-off-declined',
    words: 'Do not agree',
  },
  {
    name: 'decline-one-off',
    from: ['awaiting-other-side'],
    to: 'answered',
    ...signer,
    preconditions: ['reason-given'],
    event: 'submission.one-off-declined',
    words: 'Do not agree',
  },
  {
    name: 'send-back',
    from: ['awaiting-second-person'],
    to: 'submitted',
    ...reviewer,
    preconditions: ['reason-given', 'no-challenge-was-answered'],
    event: 'submission.second-person-declined',
    words: 'Send back to review',
  },
  {
    name: 'send-back',
    from: ['awaiting-second-person'],
    to: 'answered',
    ...reviewer,
    preconditions: ['reason-given'],
    event: 'submission.second-person-declined',
    words: 'Send back to review',
  },
  {
    name: 'supersede',
    from: ['accepted', 'accepted-with-conditions'],
    to: 'superseded',
    ...reviewer,
    preconditions: ['newer-accepted'],
    event: 'submission.superseded',
    words: 'Replace by a newer acceptance',
  },
  {
    // The supplier's approver is the last to sign where no criteria are agreed.
    name: 'supersede',
    from: ['accepted', 'accepted-with-conditions'],
    to: 'superseded',
    ...signer,
    preconditions: ['newer-accepted'],
    event: 'submission.superseded',
    words: 'Replace by a newer acceptance',
  },
] as const satisfies readonly Move<SubmissionState, SubmissionPrecondition>[]

export type SubmissionMove = (typeof submissionMoves)[number]
export type SubmissionMoveName = SubmissionMove['name']

/** The move of that name from one state to another, where the table has it. */
export const submissionMove = (
  name: SubmissionMoveName,
  from: SubmissionState | null,
  to: SubmissionState,
): SubmissionMove | undefined => movesNamed(name, from).find((move) => move.to === to)

/** Every row of that name that may start from the state; null where there is no submission yet. */
export const movesNamed = (name: SubmissionMoveName, from: SubmissionState | null): SubmissionMove[] =>
  submissionMoves.filter(
    (move) =>
      move.name === name &&
      (from === null ? move.from.length === 0 : (move.from as readonly SubmissionState[]).includes(from)),
  )

/** Which side the next step is up to; null where nothing waits. */
export const waitsOn: Record<SubmissionState, Side | null> = {
  draft: 'supplier',
  'for-signature': 'supplier',
  submitted: 'customer',
  challenged: 'supplier',
  answered: 'customer',
  'awaiting-second-person': 'customer',
  'awaiting-other-side': 'supplier',
  accepted: null,
  'accepted-with-conditions': null,
  refused: null,
  withdrawn: null,
  superseded: null,
}

/** States in which the decision is still to come. */
export const underReview: readonly SubmissionState[] = undecided
/** States in which the customer reviews and the supplier answers; nobody's decision waits for a second one. */
export const openToChallenge: readonly SubmissionState[] = ['submitted', 'challenged', 'answered']
/** States that count as accepted proof. */
export const acceptedStates: readonly SubmissionState[] = ['accepted', 'accepted-with-conditions']
