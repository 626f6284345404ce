import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import {
  blockingWarnings,
  clauseWarnings,
  problemsOfClause,
  repeatedClauses,
  safetyFlags,
  type CheckedCharacteristic,
} from './agreement-check'

const characteristic = (characteristicId: string, more: Partial<CheckedCharacteristic> = {}) => ({
  characteristicId,
  lowerLimit: '23.975',
  upperLimit: '24.025',
  unit: 'mm',
  class: 'ordinary' as const,
  processStandardDeviation: null,
  ...more,
})
const bore = characteristic('bore')
const oneSided = characteristic('one-sided', { lowerLimit: null })
const safety = characteristic('safety', { class: 'safety' })
const share: Clause = { type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } }
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const within = (margin: object) =>
  ({ type: 'bias-equivalence', parameters: { margin, confidence: 0.95 } }) as Clause

describe('a clause as written', () => {
  it('is faultless where only a characteristic could be at odds with it', () => {
    for (const clause of [share, zeroTest, within({ base: 'absolute', value: 1, unit: 'N' })])
      expect(problemsOfClause(clause)).toEqual([])
  })

  it('is told every field that is wrong', () => {
    expect(
      problemsOfClause({ type: 'bias-zero-test', parameters: { alpha: 0, more: 1 } }).map(({ path }) => path),
    ).toEqual(['parameters.alpha', 'parameters.more'])
    expect(problemsOfClause(within({ base: 'absolute', value: 1, unit: 'ell' }))).toMatchObject([
      { code: 'unit-unknown', path: 'parameters.margin.unit' },
    ])
  })

  it('stands once for what it judges', () => {
    expect(repeatedClauses([zeroTest, share])).toEqual([])
    expect(repeatedClauses([zeroTest, share, within({ base: 'tolerance', share: 0.05 }), zeroTest])).toEqual([
      2, 3,
    ])
  })
})

describe('clauses for a scope', () => {
  it('warn once for all characteristics with the same obstacle', () => {
    const other = characteristic('other', { upperLimit: null })
    expect(clauseWarnings([zeroTest, share], [bore, oneSided, other])).toMatchObject([
      {
        clause: 1,
        code: 'no-tolerance-width',
        path: 'parameters.base',
        characteristicIds: ['one-sided', 'other'],
      },
    ])
  })

  it('block only where no characteristic is left, however different the obstacles', () => {
    const blocked = (of: CheckedCharacteristic[], clauses: Clause[] = [share]) =>
      blockingWarnings(clauseWarnings(clauses, of), of).length
    expect(blocked([bore, oneSided])).toBe(0)
    expect(blocked([oneSided])).toBe(1)
    expect(blocked([])).toBe(0)
    const newtons = within({ base: 'absolute', value: 1, unit: 'N' })
    const inGrams = characteristic('grams', { unit: 'g' })
    expect(blocked([bore, inGrams], [newtons])).toBe(2)
  })

  it('are flagged for class safety where they rest on a zero-difference test', () => {
    expect(safetyFlags([share, zeroTest], [bore, safety])).toEqual([
      { clause: 1, code: 'zero-difference', count: 1, characteristicIds: ['safety'] },
    ])
    expect(safetyFlags([zeroTest], [bore])).toEqual([])
    expect(safetyFlags([within({ base: 'tolerance', share: 0.05 })], [safety])).toEqual([])
  })

  it('are flagged for class safety where they rest on a point estimate, an index by the basis it names', () => {
    const point: Clause = {
      type: 'bias-point',
      parameters: { margin: { base: 'tolerance', share: 0.05 } },
    }
    const index = (basis: 'estimate' | 'bound'): Clause => ({
      type: 'bias-index',
      parameters: {
        ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: 1.33, leastCgk: 1.33, confidence: 0.95 },
        basis,
      },
    })
    const flags = safetyFlags([point, index('estimate'), index('bound')], [safety])
    expect(flags.map(({ clause, code }) => [clause, code])).toEqual([
      [0, 'point-estimate'],
      [1, 'point-estimate'],
    ])
  })
})
