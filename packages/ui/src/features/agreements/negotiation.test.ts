import type { agreements } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { changeSentences } from './changeSentences'
import { compareClauses } from './differences'
import { effectiveClauses, ownDraft, standingRound, versionAtHand, widerClauses } from './negotiation'
import { askedFrom, roomAnswer } from './roomAnswer'
import { agreement, design, equivalence, resolution, round, version, zeroTest } from './rooms.fixture'

describe('the version at hand', () => {
  const inForce = version('old', 'in-force', [round(1, [zeroTest], { state: 'accepted' })])
  const open = version('new', 'countered', [round(1, [zeroTest]), round(2, [equivalence])])
  const draft = version('draft', 'draft', [round(1, [], { state: 'draft' })], { number: null })
  const force = { versionId: 'old', number: 1, effectiveOn: '2026-01-01' }

  it('is the one under negotiation, before drafts and what is in force', () => {
    expect(versionAtHand(agreement([draft, open, inForce], { inForce: force }))?.id).toBe('new')
    expect(versionAtHand(agreement([draft, inForce], { inForce: force }))?.id).toBe('draft')
    expect(versionAtHand(agreement([inForce], { inForce: force }))?.id).toBe('old')
  })

  it('is the one the address names', () =>
    expect(versionAtHand(agreement([open, inForce], { inForce: force }), 'old')?.id).toBe('old'))

  it('stands on its last sent round; an unsent answer is apart', () => {
    const answered = version('new', 'countered', [...open.rounds, round(3, [], { state: 'draft' })])
    expect(standingRound(answered)?.number).toBe(2)
    expect(ownDraft(answered)?.number).toBe(3)
    expect(standingRound(draft)?.state).toBe('draft')
  })
})

describe('clauses of wider scopes', () => {
  const signed = (id: string, clauses: Clause[], more: Partial<agreements.Agreement>) =>
    agreement([version(id, 'in-force', [round(1, clauses, { state: 'accepted' })])], {
      inForce: { versionId: id, number: 1, effectiveOn: '2026-01-01' },
      ...more,
    })
  const everything = signed('all', [zeroTest, resolution(0.1), design(15)], {
    number: 1,
    scope: { ...agreement([]).scope, kind: 'relationship' },
  })
  const part = signed('part', [equivalence], { number: 2 })

  it('stay where the narrower says nothing, each with its source', () => {
    const wider = widerClauses([everything, part])
    expect(wider.map(({ clause, agreementNumber }) => [clause.type, agreementNumber])).toEqual([
      ['bias-equivalence', 2],
      ['resolution-share', 1],
      ['design-minimum', 1],
    ])
    expect(effectiveClauses([resolution(0.05)], wider)).toEqual([resolution(0.05), equivalence, design(15)])
  })
})

describe('the answer of the room', () => {
  const inForce = { versionId: 'old', number: 1, effectiveOn: '2026-01-01' }
  const old = version('old', 'in-force', [round(1, [zeroTest, design(15)])])
  const open = version('new', 'countered', [round(1, [zeroTest]), round(2, [equivalence, design(15)])])
  const rows = compareClauses([zeroTest, design(15)], [equivalence, design(15)])

  it('says whose round waits for whom, what changes, and what stays in force', () => {
    const of = agreement([open, old], { inForce })
    expect(roomAnswer(of, open, 'customer', rows)).toEqual({
      strong: 'Round 2, from Tarnfield, waits for our answer.',
      rest: [
        'Of the clauses, one changes and one stays.',
        'Agreement 2, version 1, stays in force until both sides sign.',
      ],
    })
    expect(roomAnswer(of, open, 'supplier', rows).strong).toBe(
      'Round 2, ours, waits for an answer from Brackwell.',
    )
  })

  it('says whose signature an agreed text waits for, and by when', () => {
    const agreed = version('new', 'agreed', open.rounds, {
      effectiveOn: '2027-01-01',
      waitsOn: ['supplier'],
    })
    const answer = roomAnswer(agreement([agreed]), agreed, 'supplier', rows)
    expect(answer.strong).toBe('Agreed, and waits for our signature.')
    expect(answer.rest).toContain('Unless both sides sign by 1 Jan 2027, it lapses.')
  })

  it('counts what applies by wider agreements beside what is in force', () => {
    const applies = compareClauses([], [zeroTest, design(15), resolution(0.1)])
    expect(roomAnswer(agreement([old], { inForce }), old, 'supplier', applies)).toEqual({
      strong: 'Two clauses, signed by both sides, in force since 1 Jan 2027.',
      rest: ['One more applies by agreements for a wider scope.'],
    })
  })

  it('asks from a first day that is still to come only', () => {
    expect(askedFrom({ today: '2026-12-01' }, open)).toBe('2027-01-01')
    expect(askedFrom({ today: '2026-12-01' }, old)).toBeNull()
    expect(askedFrom({ today: '2027-02-01' }, open)).toBeNull()
  })
})

describe('what a round changes of the one before', () => {
  const seen = (text: string) => text.replaceAll('\u202F', '_')
  it('is told to the parameter, with clauses that come and go, and the day', () => {
    const before = round(1, [zeroTest, resolution(0.1)])
    const after = round(2, [equivalence, resolution(0.05), design(15)], { effectiveOn: '2027-02-01' })
    expect(changeSentences(before, after).map(seen)).toEqual([
      'Bias: zero-difference test, α 0.05 → equivalence within ±5_% of tolerance, 95_%',
      'Resolution at most: 10_% → 5_%',
      'New: At least 15 readings, registered beforehand',
      'First day in force: 1 Jan 2027 → 1 Feb 2027',
    ])
    expect(changeSentences(after, round(3, [equivalence, design(15)])).map(seen)[0]).toBe(
      'Falls away: Resolution at most 5_% of tolerance',
    )
  })

  it('is nothing where the clauses stay', () =>
    expect(changeSentences(round(1, [zeroTest]), round(2, [zeroTest]))).toEqual([
      'The clauses stay as in the round before.',
    ]))
})
