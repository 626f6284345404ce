import { describe, expect, it } from 'vitest'
import { chooseMove } from './define'
import {
  movesNamed,
  submissionMove,
  submissionMoves,
  type SubmissionMove,
  type SubmissionPrecondition,
} from './submission'
import {
  challengeMove,
  challengeMovesNamed,
  reviewState,
  type ChallengeMove,
  type ChallengePrecondition,
} from './challenge'

const choose = (
  name: SubmissionMove['name'],
  from: Parameters<typeof movesNamed>[1],
  facts: SubmissionPrecondition[],
) =>
  chooseMove<SubmissionPrecondition, SubmissionMove>(
    movesNamed(name, from),
    Object.fromEntries(facts.map((each) => [each, true])),
  )
const decidable = ['as-seen', 'challenges-settled', 'no-newer-accepted'] as const

describe('of moves with one name', () => {
  it('the conditions tell which it is', () => {
    expect(
      choose('accept', 'submitted', [...decidable, 'criteria-agreed', 'not-safety-class']).move?.to,
    ).toBe('accepted')
    expect(choose('accept', 'submitted', [...decidable, 'criteria-agreed', 'safety-class']).move?.to).toBe(
      'awaiting-second-person',
    )
    expect(
      choose('accept', 'submitted', [...decidable, 'no-criteria-agreed', 'not-safety-class']).move,
    ).toMatchObject({
      ...{ to: 'awaiting-other-side', permission: 'reviews.approve' },
    })
  })
  it('the most particular counts where several may be made', () => {
    expect(choose('send-back', 'awaiting-second-person', ['reason-given']).move?.to).toBe('answered')
    expect(
      choose('send-back', 'awaiting-second-person', ['reason-given', 'no-challenge-was-answered']).move?.to,
    ).toBe('submitted')
  })
  it('what keeps the nearest one back is told, and nothing where none may start', () => {
    expect(choose('accept', 'answered', ['as-seen', 'criteria-agreed', 'safety-class'])).toEqual({
      move: null,
      refused: 'challenges-settled',
      lacking: ['challenges-settled', 'no-newer-accepted'],
    })
    expect(choose('accept', 'challenged', [...decidable])).toEqual({ move: null, refused: null, lacking: [] })
  })
})

describe('the table of a submission’s moves', () => {
  it('has one row for each name, start, end and permission', () => {
    const rows = submissionMoves.flatMap(({ name, from, to, permission }) =>
      (from.length ? from : ['nothing']).map((start) => `${name}: ${start} → ${to} by ${permission}`),
    )
    expect(new Set(rows).size).toBe(rows.length)
  })
  it('finds the move that makes one, and none out of an end', () => {
    expect(submissionMove('prepare', null, 'draft')?.event).toBe('submission.prepared')
    for (const end of ['refused', 'withdrawn', 'superseded'] as const)
      expect(submissionMoves.filter((move) => (move.from as readonly string[]).includes(end))).toEqual([])
  })
})

describe('challenges', () => {
  it('are settled by what the last answer was', () => {
    const settle = (fact: ChallengePrecondition) =>
      chooseMove<ChallengePrecondition, ChallengeMove>(challengeMovesNamed('settle', 'answered'), {
        'submission-under-review': true,
        [fact]: true,
      }).move?.to
    expect(settle('corrected')).toBe('resolved-by-correction')
    expect(settle('not-corrected')).toBe('resolved-by-evidence')
  })
  it('begin by being opened and end in no further move', () => {
    expect(challengeMove('open', null)?.to).toBe('open')
    expect(challengeMove('answer', 'answered')).toBeUndefined()
    expect(challengeMove('settle', 'answered')?.to).toBe('resolved-by-evidence')
  })
  it.each([
    [[], 'submitted'],
    [[{ state: 'open', answered: true }], 'challenged'],
    [[{ state: 'unresolved-proposed', answered: true }], 'challenged'],
    [[{ state: 'unresolved', answered: true }], 'answered'],
    [[{ state: 'withdrawn', answered: false }], 'submitted'],
    [[{ state: 'withdrawn', answered: true }], 'answered'],
    [
      [
        { state: 'answered', answered: true },
        { state: 'open', answered: false },
      ],
      'challenged',
    ],
  ] as const)('%j put the review to %s', (challenges, state) => expect(reviewState(challenges)).toBe(state))
})
