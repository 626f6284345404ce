import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import type { Side } from '../../../contract/access'
import { noTerms } from '../../../contract/terms'
import { acceptanceOf } from './agreements.acceptance'

type Sent = Parameters<typeof acceptanceOf>[0][number]
type Mark = Parameters<typeof acceptanceOf>[1][number]

const zeroTest = (alpha = 0.05): Clause => ({ type: 'bias-zero-test', parameters: { alpha } })
const design = (readings = 20): Clause => ({
  type: 'design-minimum',
  parameters: { readings, registeredBeforehand: true },
})
const round = (number: number, side: Side, clauses: Clause[], more: Partial<Sent> = {}): Sent => ({
  id: `round-${number}`,
  number,
  side,
  clauses,
  terms: noTerms,
  effectiveOn: '2027-01-01',
  createdBy: side,
  createdAt: `2026-11-0${number}T08:00:00.000Z`,
  sentAt: `2026-11-0${number}T09:00:00.000Z`,
  ...more,
})
/** Marks of a side on everything, or one clause, of the last of these rounds. */
const marksOn = (sent: Sent[], side: Side, key?: string, accepted = true): Mark[] =>
  (acceptanceOf(sent, [])?.items ?? [])
    .filter(({ clauseKey }) => key === undefined || clauseKey === key)
    .map(({ kind, clauseKey, sha256 }) => ({
      roundId: sent.at(-1)?.id ?? '',
      about: kind,
      clauseKey,
      sha256,
      side,
      accepted,
      userId: side,
      at: '2026-11-05T10:00:00.000Z',
    }))
const stateOf = (sent: Sent[], marks: Mark[], side: Side) =>
  Object.fromEntries(
    (acceptanceOf(sent, marks)?.items ?? []).map((item) => [
      `${item.clauseKey ?? item.kind}${item.present ? '' : ' left out'}`,
      item[side] && `${item[side].how} in ${item[side].round}`,
    ]),
  )

describe('who has accepted what', () => {
  it('is nothing where nothing was sent', () => expect(acceptanceOf([], [])).toBeNull())

  it('is everything by writing it, and nothing by the other side', () => {
    const first = [round(1, 'customer', [design(), zeroTest()])]
    expect(acceptanceOf(first, [])?.everythingBy).toEqual(['customer'])
    expect(stateOf(first, [], 'supplier')).toEqual({
      'design/readings': null,
      'bias/mean': null,
      'effective-on': null,
    })
  })

  it('stays with a clause from round to round while its bytes are the same, and falls with a change', () => {
    const first = round(1, 'customer', [design(), zeroTest()])
    const marks = marksOn([first], 'supplier', 'design/readings')
    const second = round(2, 'supplier', [design(), zeroTest(0.01)])
    expect(stateOf([first, second], marks, 'customer')).toEqual({
      'design/readings': 'written in 1',
      'bias/mean': null,
      'effective-on': 'written in 1',
    })
    expect(stateOf([first, second], marks, 'supplier')).toMatchObject({ 'design/readings': 'marked in 1' })
    const third = round(3, 'customer', [design(25), zeroTest()])
    expect(stateOf([first, second, third], marks, 'supplier')).toEqual({
      'design/readings': null,
      // The customer goes back to what it first said; the supplier has moved on from it.
      'bias/mean': null,
      'effective-on': 'written in 2',
    })
    const fourth = round(4, 'supplier', [design(), zeroTest()])
    // The mark was for the very same bytes, but a change came in between.
    expect(stateOf([first, second, third, fourth], marks, 'customer')['design/readings']).toBeNull()
    expect(stateOf([first, second, third, fourth], marks, 'customer')['bias/mean']).toBe('written in 3')
  })

  it('ends with a mark taken back, even for what one wrote oneself, and begins again with the next', () => {
    const sent = [round(1, 'customer', [design()]), round(2, 'supplier', [design()])]
    const back = marksOn(sent, 'customer', 'design/readings', false)
    expect(stateOf(sent, back, 'customer')['design/readings']).toBeNull()
    const again = marksOn(sent, 'customer', 'design/readings')
    expect(stateOf(sent, [...back, ...again], 'customer')['design/readings']).toBe('marked in 2')
  })

  it('is not moved by a mark for other bytes, of another round, or of the other side', () => {
    const sent = [round(1, 'customer', [design()])]
    const [mark] = marksOn(sent, 'supplier', 'design/readings')
    if (!mark) throw new Error('no mark')
    for (const other of [
      { ...mark, sha256: 'f'.repeat(64) },
      { ...mark, roundId: 'round-9' },
      { ...mark, side: 'customer' as const },
      { ...mark, clauseKey: 'bias/mean' },
    ])
      expect(stateOf(sent, [other], 'supplier')['design/readings']).toBeNull()
    expect(stateOf(sent, [mark], 'supplier')['design/readings']).toBe('marked in 1')
  })

  it('asks for a clause left out only from a side that had wanted it', () => {
    const first = round(1, 'customer', [design(), zeroTest()])
    const second = round(2, 'supplier', [design()])
    expect(stateOf([first, second], [], 'customer')).toEqual({
      'design/readings': 'written in 1',
      'bias/mean left out': null,
      'effective-on': 'written in 1',
    })
    expect(acceptanceOf([first, second], [])?.everythingBy).toEqual(['supplier'])
    const accepted = marksOn([first, second], 'customer', 'bias/mean')
    expect(acceptanceOf([first, second], accepted)?.everythingBy).toEqual(['supplier', 'customer'])
    // Its own side took it out again before anybody answered: nobody else had wanted it.
    const withdrawn = round(2, 'customer', [design()])
    expect(stateOf([first, withdrawn], [], 'supplier')).toEqual({
      'design/readings': null,
      'effective-on': null,
    })
  })

  it('counts terms as one thing, once anybody says any', () => {
    const terms = { ...noTerms, validityMonths: 12 }
    const first = round(1, 'customer', [design()])
    const second = round(2, 'supplier', [design()], { terms })
    expect(stateOf([first, second], [], 'customer')).toMatchObject({ terms: null })
    const marks = marksOn([first, second], 'customer')
    expect(acceptanceOf([first, second], marks)?.everythingBy).toEqual(['supplier', 'customer'])
    const third = round(3, 'customer', [design()], { terms: { ...terms, moved: 'stays' } })
    expect(stateOf([first, second, third], marks, 'supplier')).toMatchObject({ terms: null })
  })
})
