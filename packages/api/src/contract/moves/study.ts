import type { Move } from './define'

export const studyStates = ['registered', 'collecting', 'computed', 'abandoned'] as const
export type StudyState = (typeof studyStates)[number]

export type StudyPrecondition =
  /** Criteria and limits of every task are frozen with it. */
  | 'tasks-share-the-gauge'
  /** At least one reading, all of them numbers. */
  | 'readable-readings'
  /** A sentence that says why. */
  | 'reason-given'

const supplier = { side: 'supplier', permission: 'studies.change' } as const

/**
 * The life of a study. Results are computed once its collection is finished and not before, so that nobody stops
 * when the figures happen to look right; a computed study stays as an attempt, so it cannot be abandoned.
 */
export const studyMoves = [
  {
    name: 'register',
    from: [],
    to: 'registered',
    ...supplier,
    preconditions: ['tasks-share-the-gauge'],
    event: 'study.registered',
    words: 'Register the study',
  },
  {
    name: 'keep-readings',
    from: ['registered', 'collecting'],
    to: 'collecting',
    ...supplier,
    preconditions: ['readable-readings'],
    event: 'study.readings-kept',
    words: 'Keep these readings, more will follow',
  },
  {
    name: 'compute',
    from: ['registered', 'collecting'],
    to: 'computed',
    ...supplier,
    preconditions: ['readable-readings'],
    event: 'study.computed',
    words: 'Store the readings and compute',
  },
  {
    name: 'correct',
    from: ['computed'],
    to: 'computed',
    ...supplier,
    preconditions: ['readable-readings', 'reason-given'],
    event: 'study.corrected',
    words: 'Store corrected readings',
  },
  {
    name: 'abandon',
    from: ['registered', 'collecting'],
    to: 'abandoned',
    ...supplier,
    preconditions: ['reason-given'],
    event: 'study.abandoned',
    words: 'Abandon the study',
  },
] as const satisfies readonly Move<StudyState, StudyPrecondition>[]

export type StudyMove = (typeof studyMoves)[number]
export type StudyMoveName = StudyMove['name']

/** The move of that name where the state allows it. */
export const studyMove = (name: StudyMoveName, state: StudyState): StudyMove | undefined =>
  studyMoves.find((move) => move.name === name && (move.from as readonly StudyState[]).includes(state))

/** The move that makes a study. */
export const registration = studyMoves[0]
