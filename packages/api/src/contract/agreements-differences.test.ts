import { describe, expect, it } from 'vitest'
import type { Clause } from '@evenrule/metrology'
import { countChanges, differences } from './agreements-differences'
import { noTerms } from './terms'

const equivalence = (share: number, confidence = 0.95): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share }, confidence },
})
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const design: Clause = {
  type: 'design-minimum',
  parameters: { readings: 25, registeredBeforehand: true },
}
const round = { clauses: [design, equivalence(0.05)], terms: noTerms, effectiveOn: '2027-01-01' }

describe('the differences between two rounds', () => {
  it('are none between a round and its copy, whatever the order of clauses and of members', () => {
    const copy = {
      ...round,
      clauses: [
        {
          parameters: { confidence: 0.95, margin: { share: 0.05, base: 'tolerance' } },
          type: 'bias-equivalence',
        },
        design,
      ] satisfies Clause[],
      terms: { ...noTerms },
    }
    expect(differences(round, copy).same).toBe(true)
  })

  it('are marked to the parameter', () => {
    const { same, clauses } = differences(round, { ...round, clauses: [design, equivalence(0.1)] })
    expect(same).toBe(false)
    const changed = clauses.filter(({ change }) => change !== 'same')
    expect(changed.map(({ key, change }) => [key, change])).toEqual([['bias/mean', 'changed']])
    expect(changed[0]?.parameters.map(({ field, before, after }) => [field.name, before, after])).toEqual([
      ['margin', { base: 'tolerance', share: 0.05 }, { base: 'tolerance', share: 0.1 }],
    ])
  })

  it('pair clauses of different types that judge the same thing, without parameters', () => {
    const { clauses } = differences(round, { ...round, clauses: [zeroTest] })
    expect(clauses.map(({ key, change, parameters }) => [key, change, parameters])).toEqual([
      ['design/readings', 'removed', []],
      ['bias/mean', 'changed', []],
    ])
    expect(countChanges(clauses)).toEqual({ same: 0, changed: 1, added: 0, removed: 1 })
  })

  it('cover the terms field by field, and the date', () => {
    const before = { ...round, terms: { ...noTerms, validityMonths: 12, moved: 'stays' as const } }
    const after = {
      ...round,
      terms: { ...noTerms, validityMonths: 24, readingsTakerMaySign: false },
      effectiveOn: '2027-02-01',
    }
    const found = differences(before, after)
    expect(found.terms.filter(({ change }) => change !== 'same')).toEqual([
      { field: 'validityMonths', before: 12, after: 24, change: 'changed' },
      { field: 'moved', before: 'stays', after: null, change: 'removed' },
      // No is something that is said, unlike nothing.
      { field: 'readingsTakerMaySign', before: null, after: false, change: 'added' },
    ])
    expect(found.effectiveOn).toEqual({ before: '2027-01-01', after: '2027-02-01', change: 'changed' })
  })

  it('turned round tell the same rows the other way', () => {
    const other = {
      clauses: [zeroTest],
      terms: { ...noTerms, moved: 'stays' as const },
      effectiveOn: '2027-02-01',
    }
    const there = differences(round, other)
    const back = differences(other, round)
    const turned = { same: 'same', changed: 'changed', added: 'removed', removed: 'added' } as const
    expect(new Map(back.clauses.map(({ key, change }) => [key, change]))).toEqual(
      new Map(there.clauses.map(({ key, change }) => [key, turned[change]])),
    )
    expect(back.terms.map(({ change }) => change)).toEqual(there.terms.map(({ change }) => turned[change]))
  })
})
