import type { Move } from './define'
import { acceptedStates, underReview, type SubmissionState } from './submission'

export const requestStates = ['open', 'answered', 'closed', 'withdrawn'] as const
export type RequestState = (typeof requestStates)[number]

/** How far the answer to a request has come for one of its measuring tasks. */
export const requestTaskStates = ['open', 'refused', 'answered', 'accepted'] as const
export type RequestTaskState = (typeof requestTaskStates)[number]

export type RequestPrecondition =
  /** Active measuring tasks of the relationship, each named once. */
  | 'tasks-of-the-relationship'
  /** The day is not over yet, in the relationship's time zone. */
  | 'day-to-come'
  /** A sentence that says why. */
  | 'reason-given'
  /** The submission signed names the request; the last that was missing answers the whole. */
  | 'task-of-the-request'
  | 'last-one-missing'
  | 'others-missing'
  /** The decision on a submission that names the request. */
  | 'every-task-accepted'
  | 'submission-refused'
  | 'submission-withdrawn'

const asker = { side: 'customer', permission: 'requests.ask' } as const
const signer = { side: 'supplier', permission: 'submissions.sign' } as const
const reviewer = { side: 'customer', permission: 'reviews.decide' } as const

/**
 * The life of a request. Only `withdrawn` is stored; the other states follow from the submissions that name it, by
 * `requestState`, so its rows are moved by the signing, the withdrawal and the decision of a submission.
 */
export const requestMoves = [
  {
    name: 'ask',
    from: [],
    to: 'open',
    ...asker,
    preconditions: ['tasks-of-the-relationship', 'day-to-come'],
    event: 'request.asked',
    words: 'Ask for proof',
  },
  {
    name: 'move-date',
    from: ['open'],
    to: 'open',
    ...asker,
    preconditions: ['day-to-come', 'reason-given'],
    event: 'request.date-moved',
    words: 'Move the date',
  },
  {
    name: 'withdraw',
    from: ['open', 'answered'],
    to: 'withdrawn',
    ...asker,
    preconditions: ['reason-given'],
    event: 'request.withdrawn',
    words: 'Withdraw the request',
  },
  {
    name: 'answer',
    from: ['open'],
    to: 'open',
    ...signer,
    preconditions: ['task-of-the-request', 'others-missing'],
    event: 'request.answered',
    words: 'Sign and submit',
  },
  {
    name: 'answer',
    from: ['open', 'answered'],
    to: 'answered',
    ...signer,
    preconditions: ['task-of-the-request', 'last-one-missing'],
    event: 'request.answered',
    words: 'Sign and submit',
  },
  {
    name: 'take-back-answer',
    from: ['open', 'answered'],
    to: 'open',
    side: 'supplier',
    permission: 'submissions.prepare',
    preconditions: ['submission-withdrawn'],
    event: 'submission.withdrawn',
    words: 'Withdraw the submission',
  },
  {
    name: 'refuse-answer',
    from: ['open', 'answered'],
    to: 'open',
    ...reviewer,
    preconditions: ['submission-refused'],
    event: 'submission.refused',
    words: 'Refuse',
  },
  {
    name: 'close',
    from: ['answered'],
    to: 'closed',
    ...reviewer,
    preconditions: ['every-task-accepted'],
    event: 'submission.accepted',
    words: 'Accept',
  },
] as const satisfies readonly Move<RequestState, RequestPrecondition>[]

export type RequestMove = (typeof requestMoves)[number]
export type RequestMoveName = RequestMove['name']

type NamedMove<N extends RequestMoveName> = Extract<RequestMove, { name: N }>

/** The moves of that name where the state allows them; null where there is no request yet. */
export const requestMovesNamed = <N extends RequestMoveName>(
  name: N,
  state: RequestState | null,
): NamedMove<N>[] =>
  requestMoves.filter(
    (move): move is NamedMove<N> =>
      move.name === name &&
      (state === null ? move.from.length === 0 : (move.from as readonly RequestState[]).includes(state)),
  )

/**
 * What a submission that names the request says for its task; one that is not signed, or was taken back, says
 * nothing. One that was superseded was accepted before.
 */
export function saidBy(state: SubmissionState): Exclude<RequestTaskState, 'open'> | null {
  if (acceptedStates.includes(state) || state === 'superseded') return 'accepted'
  if (underReview.includes(state)) return 'answered'
  return state === 'refused' ? 'refused' : null
}

/**
 * The state of one measuring task of a request, from the states of the submissions that name the request, the newest
 * first. An acceptance stays; otherwise the newest counts, and a refused one asks for another.
 */
export function requestTaskState(submissions: readonly SubmissionState[]): RequestTaskState {
  const states = submissions.map(saidBy).filter((state) => state !== null)
  return states.includes('accepted') ? 'accepted' : (states[0] ?? 'open')
}

/** A task for which the supplier still owes an answer. */
export const isOwed = (state: RequestTaskState): boolean => state === 'open' || state === 'refused'

/** The state of a request from those of its measuring tasks. */
export function requestState(withdrawn: boolean, tasks: readonly RequestTaskState[]): RequestState {
  if (withdrawn) return 'withdrawn'
  if (tasks.some(isOwed)) return 'open'
  return tasks.every((state) => state === 'accepted') ? 'closed' : 'answered'
}
