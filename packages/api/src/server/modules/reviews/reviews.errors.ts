import { defineError } from '../../errors'

export const clauseUnderChallenge = defineError(
  'clause-under-challenge',
  409,
  'The result of this clause is under challenge already. Go on with that challenge.',
)
