import type { Move } from './define'

export const conditionStates = ['open', 'reported', 'confirmed'] as const
export type ConditionState = (typeof conditionStates)[number]

export type ConditionPrecondition =
  /** The acceptance it belongs to is final and nothing newer has taken its place. */
  | 'acceptance-holds'
  /** Whoever owes it reports it. */
  | 'owed-by-supplier'
  | 'owed-by-customer'
  /** What was done, or what is missing, in words. */
  | 'words-given'

const customer = { side: 'customer', permission: 'reviews.decide' } as const

/**
 * The life of one condition of an acceptance: whoever owes it reports it done, the customer confirms it. That it is
 * overdue follows from the calendar and is no state.
 */
export const conditionMoves = [
  {
    name: 'report',
    from: ['open'],
    to: 'reported',
    side: 'supplier',
    permission: 'conditions.report',
    preconditions: ['acceptance-holds', 'owed-by-supplier', 'words-given'],
    event: 'condition.reported',
    words: 'Report it done',
  },
  {
    name: 'report',
    from: ['open'],
    to: 'reported',
    side: 'customer',
    permission: 'conditions.report',
    preconditions: ['acceptance-holds', 'owed-by-customer', 'words-given'],
    event: 'condition.reported',
    words: 'Report it done',
  },
  {
    name: 'confirm',
    from: ['reported'],
    to: 'confirmed',
    ...customer,
    preconditions: ['acceptance-holds'],
    event: 'condition.confirmed',
    words: 'Confirm it is fulfilled',
  },
  {
    name: 'return',
    from: ['reported'],
    to: 'open',
    ...customer,
    preconditions: ['acceptance-holds', 'words-given'],
    event: 'condition.returned',
    words: 'Not fulfilled yet',
  },
] as const satisfies readonly Move<ConditionState, ConditionPrecondition>[]

export type ConditionMove = (typeof conditionMoves)[number]
export type ConditionMoveName = ConditionMove['name']

/** Every row of that name that may start from the state. */
export const conditionMovesNamed = (name: ConditionMoveName, from: ConditionState): ConditionMove[] =>
  conditionMoves.filter(
    (move) => move.name === name && (move.from as readonly ConditionState[]).includes(from),
  )
