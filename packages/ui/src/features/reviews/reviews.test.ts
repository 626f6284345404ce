import { allows, type reviews, type Role, type Side } from '@evenrule/api/contract'
import { challengeMoves } from '@evenrule/api/contract/moves/challenge'
import { conditionMoves } from '@evenrule/api/contract/moves/condition'
import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { challengeReasonWords, describeTarget, targetKindWords } from '../../strings/challenges'
import { emptyTarget, missingIn, targetOf } from './challengeForm'
import {
  challengesOf,
  challengesOfStudy,
  isCorrected,
  isUnderChallenge,
  mayChallenge,
  possibleSayings,
  readingsInQuestion,
  sayings,
} from './challenges'
import { conditionActNames, possibleConditionActs } from './conditions'

const holding = (side: Side, ...roles: Role[]) =>
  [side, (permission: Parameters<typeof allows>[0]) => allows(permission, side, roles)] as const
const reviewer = holding('customer', 'quality-representative')
const approves = holding('customer', 'customer-approver')
const engineer = holding('supplier', 'gauge-engineer')
const approver = holding('supplier', 'supplier-approver')
const reader = holding('customer', 'reader')

type Challenge = reviews.Challenge
const challenge = (number: number, fields: Partial<Challenge>): Challenge => ({
  id: `00000000-0000-4000-8000-00000000000${number}`,
  number,
  target: { kind: 'clause', clauseKey: 'bias/mean' },
  reasonKind: 'other',
  revision: 1,
  dueOn: '2026-12-15',
  overdue: false,
  state: 'open',
  openedAt: '2026-12-01T08:00:00.000Z',
  openedBy: null,
  laboratory: null,
  closedAt: null,
  closedBy: null,
  rowVersion: 1,
  messages: [],
  ...fields,
})
const readings = (places: number[]) => ({ kind: 'readings' as const, study: 'S-1', readings: places })

describe('what can be said in a challenge', () => {
  it('follows its state, the side and the role', () => {
    expect(possibleSayings('challenged', 'open', ...engineer)).toEqual(['answer', 'correct'])
    expect(possibleSayings('challenged', 'open', ...reviewer)).toEqual(['withdraw'])
    expect(possibleSayings('challenged', 'open', ...approves)).toEqual(['withdraw', 'propose-unresolved'])
    expect(possibleSayings('answered', 'answered', ...reviewer)).toEqual(['settle', 'reply', 'withdraw'])
    expect(possibleSayings('answered', 'answered', ...engineer)).toEqual([])
    expect(possibleSayings('answered', 'answered', ...reader)).toEqual([])
  })
  it('leaves it unresolved only with an approver of each side', () => {
    expect(possibleSayings('challenged', 'unresolved-proposed', ...approver)).toEqual([
      'agree-unresolved',
      'decline-unresolved',
    ])
    expect(possibleSayings('challenged', 'unresolved-proposed', ...engineer)).toEqual([])
    expect(possibleSayings('challenged', 'unresolved-proposed', ...reviewer)).toEqual(['reply', 'withdraw'])
  })
  it('is nothing once a decision is made or being confirmed', () => {
    for (const state of ['awaiting-second-person', 'awaiting-other-side', 'refused', 'accepted'] as const)
      expect(possibleSayings(state, 'open', ...engineer)).toEqual([])
  })
  it('covers every move of the table that starts from a challenge', () => {
    const names = new Set(
      challengeMoves.filter(({ from }) => from.length > 0).map(({ name }) => name as string),
    )
    // A refusal leaves challenges unresolved by the same act.
    expect([...names].filter((name) => name !== 'leave-unresolved').sort()).toEqual([...sayings].sort())
  })
  it('knows a correction by the last answer', () => {
    const message = (answerKind: Challenge['messages'][number]['answerKind']) =>
      ({ answerKind }) as Challenge['messages'][number]
    expect(
      isCorrected({ messages: [message('words'), message(null), message('correction'), message(null)] }),
    ).toBe(true)
    expect(isCorrected({ messages: [message('correction'), message(null), message('words')] })).toBe(false)
    expect(isCorrected({ messages: [] })).toBe(false)
  })
})

describe('opening a challenge', () => {
  it('is the reviewer’s while the decision is to be made', () => {
    expect(mayChallenge('submitted', ...reviewer)).toBe(true)
    expect(mayChallenge('challenged', ...reviewer)).toBe(true)
    expect(mayChallenge('awaiting-second-person', ...reviewer)).toBe(false)
    expect(mayChallenge('submitted', ...engineer)).toBe(false)
    expect(mayChallenge('submitted', ...reader)).toBe(false)
  })
  it('waits until the one before about the same thing is settled', () => {
    const challenges = [
      challenge(1, { state: 'withdrawn' }),
      challenge(2, { state: 'answered' }),
      challenge(3, {
        state: 'resolved-by-evidence',
        target: { kind: 'clause', clauseKey: 'design/minimum' },
      }),
      challenge(4, { target: readings([2, 6]) }),
    ]
    expect(isUnderChallenge({ challenges }, { kind: 'clause', clauseKey: 'bias/mean' })).toBe(true)
    expect(isUnderChallenge({ challenges }, { kind: 'calculation', clauseKey: 'bias/mean' })).toBe(false)
    expect(isUnderChallenge({ challenges }, { kind: 'clause', clauseKey: 'design/minimum' })).toBe(false)
    expect(isUnderChallenge({ challenges }, readings([6]))).toBe(true)
    expect(isUnderChallenge({ challenges }, readings([7]))).toBe(false)
    expect(challengesOfStudy({ challenges }, 'S-1').map(({ number }) => number)).toEqual([4])
  })
  it('asks for what its kind needs, by the field that is missing', () => {
    const draft = { kind: '' as const, clauseKey: '', study: '', readings: [] }
    expect(Object.keys(missingIn(draft))).toEqual(['target.kind'])
    expect(Object.keys(missingIn({ ...draft, kind: 'calculation' }))).toEqual(['target.clauseKey'])
    expect(Object.keys(missingIn({ ...draft, kind: 'standard' }))).toEqual(['target.study'])
    expect(Object.keys(missingIn({ ...draft, kind: 'readings', study: 'S-1' }))).toEqual(['target.readings'])
    expect(missingIn({ ...draft, kind: 'readings', study: 'S-1', readings: [0] })).toEqual({})
  })
  it('sends only what its kind has', () =>
    expect(targetOf({ kind: 'readings', clauseKey: 'x', study: 'S-1', readings: [2] })).toEqual(
      readings([2]),
    ))
  it('has its only study chosen', () => {
    const content = { studies: [{ code: 'S-1' }] } as Parameters<typeof emptyTarget>[1]['content']
    expect(emptyTarget({}, { content } as Parameters<typeof emptyTarget>[1]).study).toBe('S-1')
  })
})

describe('what is in question', () => {
  it('concerns the clauses whose figure comes from it', () => {
    const content = {
      clauses: [
        { clauseKey: 'bias/mean', study: 'S-1' },
        { clauseKey: 'calibration/in-date', study: 'S-1' },
      ],
      advisory: [],
    } as unknown as Parameters<typeof challengesOf>[0]['content']
    const submission = { challenges: [challenge(1, {}), challenge(2, { target: readings([2]) })] }
    const numbers = (clauseKey: string, clause: Clause) =>
      challengesOf({ submission, content }, { clauseKey, clause }).map(({ number }) => number)
    const bias: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
    expect(numbers('bias/mean', bias)).toEqual([2, 1])
    const calibration: Clause = { type: 'calibration-in-date', parameters: { gauge: true, standard: true } }
    // It looks at certificates, not at readings.
    expect(numbers('calibration/in-date', calibration)).toEqual([])
  })
  it('marks readings only in the revision that was challenged, and not once withdrawn', () => {
    const challenges = [
      challenge(1, { target: readings([2, 6]) }),
      challenge(2, { target: readings([6]), state: 'resolved-by-correction' }),
      challenge(3, { target: readings([9]), state: 'withdrawn' }),
      challenge(4, { target: readings([4]), revision: 2 }),
    ]
    expect([...readingsInQuestion({ challenges }, 'S-1', 1)]).toEqual([
      [2, 'challenge 1'],
      [6, 'challenge 1, challenge 2'],
    ])
    expect([...readingsInQuestion({ challenges }, 'S-2', 1)]).toEqual([])
  })
  it.each([
    [readings([2]), 'reading 3 of study S-1'],
    [readings([2, 6]), 'readings 3 and 7 of study S-1'],
    [readings([0, 1, 2, 3, 4, 5, 6]), '7 readings of study S-1'],
    [{ kind: 'set-up', study: 'S-1' }, 'the set-up of study S-1'],
    [{ kind: 'calculation', clauseKey: 'k' }, 'the calculation of “Bias within”'],
  ] as const)('is told in words', (target, text) =>
    expect(describeTarget(target as Challenge['target'], 'Bias within')).toBe(text),
  )
  it('has words for every kind and reason', () => {
    expect(Object.keys(targetKindWords)).toHaveLength(5)
    expect(Object.values(challengeReasonWords).every((text) => text.length > 5)).toBe(true)
  })
})

describe('conditions', () => {
  const condition = { state: 'open', owner: 'supplier' } as const
  it('are reported by who owes them and confirmed by the customer', () => {
    expect(possibleConditionActs('accepted-with-conditions', condition, ...engineer)).toEqual(['report'])
    expect(possibleConditionActs('accepted-with-conditions', condition, ...reviewer)).toEqual([])
    expect(
      possibleConditionActs('accepted-with-conditions', { ...condition, owner: 'customer' }, ...reviewer),
    ).toEqual(['report'])
    expect(
      possibleConditionActs('accepted-with-conditions', { ...condition, state: 'reported' }, ...reviewer),
    ).toEqual(['confirm', 'return'])
    expect(possibleConditionActs('superseded', condition, ...engineer)).toEqual([])
    expect(possibleConditionActs('accepted-with-conditions', condition, ...reader)).toEqual([])
  })
  it('have a button for every move of their table', () =>
    expect([...new Set(conditionMoves.map(({ name }) => name))].sort()).toEqual(
      [...conditionActNames].sort(),
    ))
})
