import type { HouseTermsPrecondition } from '../../../contract/moves/house-terms'
import { defineError, wrongState, type ProblemError } from '../../errors'

const draftExists = defineError(
  'draft-exists',
  409,
  'There is a draft of the next house terms already. Open it and go on there, or discard it first.',
)
const saysNothing = defineError(
  'says-nothing',
  409,
  'There is nothing to publish yet. Add at least one clause, or one of the terms.',
)

/** What to say where a condition of a move does not hold. */
export const refusals: Record<HouseTermsPrecondition, () => ProblemError> = {
  'no-draft': draftExists,
  'says-something': saysNothing,
}

export const wrongHouseTermsState = (state: 'draft' | 'published'): ProblemError =>
  wrongState('version of your house terms', state === 'draft' ? 'a draft' : 'published')
