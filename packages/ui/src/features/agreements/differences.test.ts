import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { describeParameter } from '../../strings/fields'
import { compareClauses, countChanges, parameterChanges } from './differences'

const zeroTest = (alpha = 0.05): Clause => ({ type: 'bias-zero-test', parameters: { alpha } })
const equivalence = (share = 0.05, confidence = 0.95): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share }, confidence },
})
const resolution = (share = 0.1): Clause => ({
  type: 'resolution-share',
  parameters: { share, base: 'tolerance' },
})
const design = (readings: number, attempts?: number): Clause => ({
  type: 'design-minimum',
  parameters: { readings, registeredBeforehand: true, ...(attempts === undefined ? {} : { attempts }) },
})

describe('two sets of clauses side by side', () => {
  it('stand matched by what they are about, the decisive subject first', () => {
    const rows = compareClauses([design(15), zeroTest()], [equivalence(), design(15), resolution()])
    expect(rows.map(({ subject, change }) => [subject, change])).toEqual([
      ['bias', 'changed'],
      ['resolution', 'added'],
      ['design', 'same'],
    ])
    expect(rows[0]).toMatchObject({ before: zeroTest(), after: equivalence() })
  })

  it('name what is left out', () => {
    const rows = compareClauses([equivalence(), resolution()], [equivalence()])
    expect(countChanges(rows)).toEqual({ same: 1, changed: 0, added: 0, removed: 1 })
  })

  it('are all new where nothing is in force', () =>
    expect(compareClauses([], [zeroTest(), design(10)]).map(({ change }) => change)).toEqual([
      'added',
      'added',
    ]))
})

describe('differences to the parameter', () => {
  it('name the field with its value before and after', () => {
    const [margin, ...more] = parameterChanges(equivalence(0.05), equivalence(0.1))
    expect(more).toEqual([])
    expect(margin?.field.name).toBe('margin')
    expect([margin?.before, margin?.after].map((value) => describeParameter(margin!.field, value))).toEqual([
      '±5\u202F% of tolerance',
      '±10\u202F% of tolerance',
    ])
  })

  it('see a limit that was left open before', () => {
    const [attempts] = parameterChanges(design(15), design(15, 2))
    expect(describeParameter(attempts!.field, attempts!.before)).toBe('any')
    expect(describeParameter(attempts!.field, attempts!.after)).toBe('2')
  })

  it('do not mind the order of keys', () => {
    const turned = {
      type: 'bias-equivalence',
      parameters: { confidence: 0.95, margin: { share: 0.05, base: 'tolerance' } },
    } as Clause
    expect(parameterChanges(equivalence(), turned)).toEqual([])
  })

  it('are not sought between clauses of different types', () =>
    expect(parameterChanges(zeroTest(), equivalence())).toEqual([]))
})
