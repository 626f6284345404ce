import type { AgreementPrecondition, AgreementVersionState } from '../../../contract/moves/agreement-version'
import { defineError, wrongState, type ProblemError } from '../../errors'

export const draftExists = defineError(
  'draft-exists',
  409,
  'Your side has a draft for this already. Open it and go on there, or discard it first.',
)
export const negotiationOpen = defineError(
  'negotiation-open',
  409,
  'A proposal for this scope is under negotiation already. Answer it, or wait until it is signed or withdrawn.',
)
const notYourTurn = defineError(
  'not-your-turn',
  409,
  'Your own side’s proposal stands, so the other side answers next. Withdraw it to propose something else.',
)
const noDraft = defineError('no-draft', 409, 'There is no unsent draft of your side here. Load it again.')
const clausesCannotBeAgreed = defineError(
  'clauses-cannot-be-agreed',
  409,
  'A clause of this proposal cannot be computed for its characteristics any more. Answer with a changed proposal.',
)
const effectiveDatePast = defineError(
  'effective-date-past',
  409,
  'The first day in force has passed. Answer with a proposal that has a later day, or withdraw this one.',
)
const notAsSeen = defineError(
  'not-as-seen',
  409,
  'The text you had before you is not the one that stands here. Load it again, read it, then sign.',
)
const limitsChanged = defineError(
  'limits-changed',
  409,
  'Characteristics or their limits changed since this was agreed. Withdraw it and propose it again.',
)
const ownSideHasSigned = defineError(
  'own-side-has-signed',
  409,
  'Your side has signed this already; one signature of each side is enough.',
)
const ownSideDoesNotStand = defineError(
  'own-side-does-not-stand',
  409,
  'The other side has answered meanwhile, so your proposal does not stand any more. Load it again.',
)
export const roundReplaced = defineError(
  'round-replaced',
  409,
  'The proposal you had before you was replaced meanwhile. Look at the one that stands now, then go on.',
)
const clausesDoNotRemain = defineError(
  'last-clause',
  409,
  'Nothing would be left of the proposal. Withdraw it as a whole instead.',
)
const notASentRound = defineError(
  'not-a-sent-round',
  409,
  'Only what stands in a proposal that was sent can be commented on.',
)
const reasonMissing = defineError('reason-missing', 422, 'Say why, in words.')

const stateWords: Record<AgreementVersionState, string> = {
  draft: 'a draft',
  proposed: 'proposed',
  countered: 'countered',
  agreed: 'agreed and waits for signatures',
  signed: 'signed',
  withdrawn: 'withdrawn',
  'in-force': 'in force',
  superseded: 'superseded',
  lapsed: 'lapsed, because it was not signed in time',
}

export const wrongVersionState = (state: AgreementVersionState): ProblemError =>
  wrongState('version of the agreement', stateWords[state])

/** What to say where a condition of a move does not hold; null where only the state can be at fault. */
export const refusals: Record<AgreementPrecondition, (() => ProblemError) | null> = {
  'no-own-draft': draftExists,
  'no-open-version': negotiationOpen,
  'own-draft': noDraft,
  'answering-side': notYourTurn,
  'own-side-stands': ownSideDoesNotStand,
  'round-stands': roundReplaced,
  'clauses-remain': clausesDoNotRemain,
  'sent-round': notASentRound,
  'clauses-can-be-agreed': clausesCannotBeAgreed,
  'effective-date-not-past': effectiveDatePast,
  'reason-given': reasonMissing,
  'as-seen': notAsSeen,
  'limits-unchanged': limitsChanged,
  'own-side-has-not-signed': ownSideHasSigned,
  'other-side-has-not-signed': null,
  'other-side-has-signed': null,
}
