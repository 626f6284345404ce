import type { Move } from './define'

/** What is stored of a version of house terms; that a later one was published follows from the numbers. */
export const houseTermsStates = ['draft', 'published'] as const
export type HouseTermsState = (typeof houseTermsStates)[number]

export type HouseTermsPrecondition =
  /** There is no draft yet: one at a time is written. */
  | 'no-draft'
  /** At least one clause, or one of the terms. */
  | 'says-something'

export const houseTermsMoveNames = ['keep-draft', 'discard-draft', 'publish', 'offer'] as const
export type HouseTermsMoveName = (typeof houseTermsMoveNames)[number]

export interface HouseTermsMove extends Move<HouseTermsState | 'discarded', HouseTermsPrecondition> {
  name: HouseTermsMoveName
}

const change = { side: 'customer', permission: 'house-terms.change' } as const

/** The life of one version of a customer's house terms. Published ones never change; they bind nobody. */
export const houseTermsMoves: readonly HouseTermsMove[] = [
  {
    ...change,
    name: 'keep-draft',
    from: [],
    to: 'draft',
    preconditions: ['no-draft'],
    event: 'house-terms.drafted',
    words: 'Keep as a draft',
  },
  {
    ...change,
    name: 'keep-draft',
    from: ['draft'],
    to: 'draft',
    preconditions: [],
    event: 'house-terms.draft-kept',
    words: 'Keep as a draft',
  },
  {
    ...change,
    name: 'discard-draft',
    from: ['draft'],
    to: 'discarded',
    preconditions: [],
    event: 'house-terms.draft-discarded',
    words: 'Discard the draft',
  },
  {
    ...change,
    name: 'publish',
    from: ['draft'],
    to: 'published',
    preconditions: ['says-something'],
    event: 'house-terms.published',
    words: 'Publish',
  },
  {
    ...change,
    name: 'offer',
    from: ['published'],
    to: 'published',
    permission: 'agreements.propose',
    preconditions: [],
    event: 'house-terms.offered',
    words: 'Offer to suppliers',
  },
]
