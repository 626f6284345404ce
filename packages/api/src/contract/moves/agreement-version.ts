import { sides, type Permission, type Side } from '../access'
import type { Move } from './define'

/** What is stored of a version's state. */
export const storedVersionStates = [
  'draft',
  'proposed',
  'countered',
  'agreed',
  'signed',
  'withdrawn',
] as const
export type StoredVersionState = (typeof storedVersionStates)[number]

/**
 * States as both sides see them. The last three follow from dates and are never stored: a signed version is in force
 * from its effective date on, superseded once a later signed version has taken effect, and an agreed one that was not
 * signed by both before its effective date had passed has lapsed.
 */
export const agreementVersionStates = [...storedVersionStates, 'in-force', 'superseded', 'lapsed'] as const
export type AgreementVersionState = (typeof agreementVersionStates)[number]

export type AgreementPrecondition =
  /** The side has no unsent draft of a version for this scope. */
  | 'no-own-draft'
  /** No version of this scope is proposed, countered, or agreed and waiting for signatures. */
  | 'no-open-version'
  /** The draft is this side's own. */
  | 'own-draft'
  /** The standing proposal is the other side's. */
  | 'answering-side'
  /** The standing proposal is this side's own. */
  | 'own-side-stands'
  /** An answer is to the round that stands, and a mark names exactly what stands there. */
  | 'round-stands'
  /** What is to be taken out is in the standing proposal, and something is left of it. */
  | 'clauses-remain'
  /** What a comment is about stands in a round that was sent. */
  | 'sent-round'
  /** Something is said; at most one clause for each subject and measure, each computable for the scope. */
  | 'clauses-can-be-agreed'
  /** The first day in force is today or later, in the relationship's time zone. */
  | 'effective-date-not-past'
  /** A sentence that says why. */
  | 'reason-given'
  /** The hash that the signer saw is the hash of what is signed. */
  | 'as-seen'
  /** The limits in the agreed text are those that the characteristics still have. */
  | 'limits-unchanged'
  | 'own-side-has-not-signed'
  | 'other-side-has-not-signed'
  | 'other-side-has-signed'

export const agreementMoveNames = [
  'keep-draft',
  'discard-draft',
  'propose',
  'counter',
  'withdraw-clauses',
  'comment',
  'mark',
  'accept',
  'withdraw',
  'sign',
] as const
export type AgreementMoveName = (typeof agreementMoveNames)[number]

/** A discarded draft leaves no row behind; nobody but its own side ever knew of it. */
export interface AgreementMove extends Move<StoredVersionState | 'discarded', AgreementPrecondition> {
  name: AgreementMoveName
}

const propose: Permission = 'agreements.propose'
const sign: Permission = 'agreements.sign'

const rows: Omit<AgreementMove, 'side'>[] = [
  {
    name: 'keep-draft',
    from: [],
    to: 'draft',
    permission: propose,
    preconditions: ['no-own-draft', 'no-open-version'],
    event: 'agreement.drafted',
    words: 'Keep as a draft',
  },
  ...(['draft', 'proposed', 'countered'] as const).map((state): Omit<AgreementMove, 'side'> => ({
    name: 'keep-draft',
    from: [state],
    to: state,
    permission: propose,
    preconditions: [state === 'draft' ? 'own-draft' : 'answering-side'],
    event: 'agreement.draft-kept',
    words: 'Keep as a draft',
  })),
  ...(['draft', 'proposed', 'countered'] as const).map((state): Omit<AgreementMove, 'side'> => ({
    name: 'discard-draft',
    from: [state],
    to: state === 'draft' ? 'discarded' : state,
    permission: propose,
    preconditions: ['own-draft'],
    event: 'agreement.draft-discarded',
    words: 'Discard the draft',
  })),
  {
    name: 'propose',
    from: ['draft'],
    to: 'proposed',
    permission: propose,
    preconditions: ['own-draft', 'no-open-version', 'clauses-can-be-agreed', 'effective-date-not-past'],
    event: 'agreement.proposed',
    words: 'Send the proposal',
  },
  {
    name: 'counter',
    from: ['proposed', 'countered'],
    to: 'countered',
    permission: propose,
    preconditions: ['answering-side', 'round-stands', 'clauses-can-be-agreed', 'effective-date-not-past'],
    event: 'agreement.countered',
    words: 'Send a changed proposal',
  },
  ...(['proposed', 'countered'] as const).map((state): Omit<AgreementMove, 'side'> => ({
    name: 'withdraw-clauses',
    from: [state],
    to: state,
    permission: propose,
    preconditions: [
      'own-side-stands',
      'clauses-remain',
      'clauses-can-be-agreed',
      'effective-date-not-past',
      'reason-given',
    ],
    event: 'agreement.clauses-withdrawn',
    words: 'Take clauses out',
  })),
  ...(['proposed', 'countered', 'agreed'] as const).map((state): Omit<AgreementMove, 'side'> => ({
    name: 'comment',
    from: [state],
    to: state,
    permission: propose,
    preconditions: ['sent-round'],
    event: 'agreement.commented',
    words: 'Comment',
  })),
  ...(['proposed', 'countered'] as const).map((state): Omit<AgreementMove, 'side'> => ({
    name: 'mark',
    from: [state],
    to: state,
    permission: propose,
    preconditions: ['answering-side', 'round-stands'],
    event: 'agreement.marked',
    words: 'Mark as accepted',
  })),
  {
    name: 'accept',
    from: ['proposed', 'countered'],
    to: 'agreed',
    permission: propose,
    preconditions: ['answering-side', 'clauses-can-be-agreed', 'effective-date-not-past'],
    event: 'agreement.accepted',
    words: 'Accept the proposal',
  },
  {
    name: 'withdraw',
    from: ['proposed', 'countered', 'agreed'],
    to: 'withdrawn',
    permission: propose,
    preconditions: ['reason-given'],
    event: 'agreement.withdrawn',
    words: 'Withdraw',
  },
  {
    name: 'sign',
    from: ['agreed'],
    to: 'agreed',
    permission: sign,
    preconditions: [
      'as-seen',
      'effective-date-not-past',
      'limits-unchanged',
      'own-side-has-not-signed',
      'other-side-has-not-signed',
    ],
    event: 'agreement.signature-given',
    words: 'Sign',
  },
  {
    name: 'sign',
    from: ['agreed'],
    to: 'signed',
    permission: sign,
    preconditions: [
      'as-seen',
      'effective-date-not-past',
      'limits-unchanged',
      'own-side-has-not-signed',
      'other-side-has-signed',
    ],
    event: 'agreement.signed',
    words: 'Sign',
  },
]

/**
 * The life of an agreement's version. Either side may make every move, the answering ones in turn. Drafts, of a first
 * proposal as of an answer, stand in the journal of the side that writes them; from the first sending on, every move
 * stands in the record of the relationship.
 */
export const agreementMoves: readonly AgreementMove[] = sides.flatMap((side) =>
  rows.map((row) => ({ ...row, side })),
)

/** The move of that name from one state to another, where the table has it for the side. */
export const agreementMove = (
  name: AgreementMoveName,
  side: Side,
  from: AgreementVersionState | null,
  to: AgreementMove['to'],
): AgreementMove | undefined =>
  agreementMoves.find(
    (move) =>
      move.name === name &&
      move.side === side &&
      move.to === to &&
      (from === null ? move.from.length === 0 : (move.from as readonly string[]).includes(from)),
  )

/** States in which a version waits for an answer or for signatures: no other may be sent for the scope then. */
export const openVersionStates = ['proposed', 'countered', 'agreed'] as const satisfies StoredVersionState[]
