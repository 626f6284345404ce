import { reviews, submissions, type EndpointShape, type Permission, type Side } from '@evenrule/api/contract'
import { possibleMoves, type Move } from '@evenrule/api/contract/moves/define'
import { submissionMoves, type SubmissionState } from '@evenrule/api/contract/moves/submission'
import type { Client } from '../../session/client'
import { actNames, type ActName } from '../../strings/reviews'
import { askedConditions, type ConditionDraft } from './conditionDraft'

/** What a person may have to say with a move, by the names of the contract. */
export interface ActValues {
  note: string
  reason: string
  conditions: ConditionDraft[]
}

/** What a move names of the submission it is made on. */
export interface ActSeen {
  params: { organisationId: string; submissionId: string }
  expectedVersion: number
  /** Of the text that the person has before them. */
  sha256: string
}

interface Act {
  endpoint: EndpointShape
  /** The field of words that goes with it, and whether it may stay empty. */
  words: { field: 'note' | 'reason'; required: boolean } | null
  /** Names conditions. */
  conditions: boolean
  /** Cannot be taken back. */
  danger: boolean
  send(api: Client, seen: ActSeen, values: ActValues): Promise<reviews.Moved>
}

const plain = { words: null, conditions: false, danger: false } as const

/** How each move is sent; which of them are possible is the table of moves' to say. */
export const acts: Record<ActName, Act> = {
  'send-for-signature': {
    ...plain,
    endpoint: submissions.sendForSignature,
    words: { field: 'note', required: false },
    send: (api, { params, expectedVersion }, { note }) =>
      api.call(submissions.sendForSignature, { params, body: { expectedVersion, note } }),
  },
  return: {
    ...plain,
    endpoint: submissions.returnSubmission,
    words: { field: 'note', required: true },
    send: (api, { params, expectedVersion }, { note }) =>
      api.call(submissions.returnSubmission, { params, body: { expectedVersion, note } }),
  },
  sign: {
    ...plain,
    endpoint: submissions.signSubmission,
    send: (api, { params, expectedVersion, sha256 }) =>
      api.call(submissions.signSubmission, { params, body: { expectedVersion, sha256 } }),
  },
  discard: {
    ...plain,
    endpoint: submissions.discardSubmission,
    danger: true,
    send: (api, { params, expectedVersion }) =>
      api.call(submissions.discardSubmission, { params, body: { expectedVersion } }),
  },
  withdraw: {
    ...plain,
    endpoint: submissions.withdrawSubmission,
    words: { field: 'reason', required: true },
    danger: true,
    send: (api, { params, expectedVersion }, { reason }) =>
      api.call(submissions.withdrawSubmission, { params, body: { expectedVersion, reason } }),
  },
  accept: {
    ...plain,
    endpoint: reviews.accept,
    words: { field: 'reason', required: false },
    send: (api, { params, expectedVersion, sha256 }, { reason }) =>
      api.call(reviews.accept, { params, body: { expectedVersion, sha256, reason } }),
  },
  'accept-with-conditions': {
    ...plain,
    endpoint: reviews.acceptWithConditions,
    words: { field: 'reason', required: false },
    conditions: true,
    send: (api, { params, expectedVersion, sha256 }, { reason, conditions }) =>
      api.call(reviews.acceptWithConditions, {
        params,
        body: { expectedVersion, sha256, conditions: askedConditions(conditions), reason },
      }),
  },
  refuse: {
    ...plain,
    endpoint: reviews.refuse,
    words: { field: 'reason', required: true },
    danger: true,
    send: (api, { params, expectedVersion, sha256 }, { reason }) =>
      api.call(reviews.refuse, { params, body: { expectedVersion, sha256, reason } }),
  },
  confirm: {
    ...plain,
    endpoint: reviews.confirm,
    send: (api, { params, expectedVersion, sha256 }) =>
      api.call(reviews.confirm, { params, body: { expectedVersion, sha256 } }),
  },
  'agree-one-off': {
    ...plain,
    endpoint: reviews.agreeOneOff,
    send: (api, { params, expectedVersion, sha256 }) =>
      api.call(reviews.agreeOneOff, { params, body: { expectedVersion, sha256 } }),
  },
  'decline-one-off': {
    ...plain,
    endpoint: reviews.declineOneOff,
    words: { field: 'reason', required: true },
    send: (api, { params, expectedVersion }, { reason }) =>
      api.call(reviews.declineOneOff, { params, body: { expectedVersion, reason } }),
  },
  'send-back': {
    ...plain,
    endpoint: reviews.sendBack,
    words: { field: 'reason', required: true },
    send: (api, { params, expectedVersion }, { reason }) =>
      api.call(reviews.sendBack, { params, body: { expectedVersion, reason } }),
  },
}

export interface PossibleAct {
  name: ActName
  /** What the button says. */
  words: string
  /** Why it is not this person's to do right now. */
  hindrances: submissions.Hindrance['code'][]
}

const isAct = (name: string): name is ActName => (actNames as readonly string[]).includes(name)

/** Decisions that wait while a challenge does; they stay in sight, with the reason. */
const decisions: readonly string[] = ['accept', 'accept-with-conditions', 'refuse']

/** The moves that the state and the person's roles allow, each once, with what stands in their way. */
export function possibleActs(
  { state, hindrances }: Pick<submissions.Submission, 'hindrances'> & { state: SubmissionState },
  side: Side,
  holds: (permission: Permission) => boolean,
): PossibleAct[] {
  const found = new Map<ActName, PossibleAct>()
  for (const { name, words } of possibleMoves<Move<SubmissionState>>(submissionMoves, state, side, holds)) {
    if (!isAct(name) || found.has(name)) continue
    const codes = hindrances.filter(({ move }) => move === name).map(({ code }) => code)
    found.set(name, { name, words, hindrances: codes })
  }
  if (state === 'challenged')
    for (const { name, words } of possibleMoves<Move<SubmissionState>>(
      submissionMoves,
      'answered',
      side,
      holds,
    ))
      if (isAct(name) && decisions.includes(name))
        found.set(name, { name, words, hindrances: ['challenge-open'] })
  return [...found.values()]
}

/** The order in which acts are offered: what moves the work on first, what ends it last. */
const ranks: readonly ActName[] = [
  'sign',
  'send-for-signature',
  'confirm',
  'agree-one-off',
  'accept',
  'accept-with-conditions',
  'decline-one-off',
  'refuse',
  'return',
  'send-back',
  'withdraw',
  'discard',
]
export const inOrder = (possible: readonly PossibleAct[]): PossibleAct[] =>
  [...possible].sort((a, b) => ranks.indexOf(a.name) - ranks.indexOf(b.name))

/** How long a sign-in counts as fresh; the server has the last word. */
const freshFor = 5 * 60_000

/** Whether a sign-in is recent enough for a signature, as far as this browser's clock can tell. */
export const isFresh = (authenticatedAt: string | undefined, now: number): boolean =>
  authenticatedAt !== undefined && now - Date.parse(authenticatedAt) <= freshFor
