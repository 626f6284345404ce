import { clauseTypes, type Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { addableGroups } from './addable'
import {
  alternatives,
  dayAfter,
  marginUnits,
  readTyped,
  startingTypes,
  typedClause,
  typedClauses,
} from './proposalDraft'

const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'absolute', value: 0.0025, unit: 'mm' }, confidence: 0.95 },
}

describe('a proposal as typed', () => {
  it('reads back the clauses it was made from', () => {
    const clauses: Clause[] = [
      equivalence,
      { type: 'design-minimum', parameters: { readings: 15, registeredBeforehand: false } },
    ]
    expect(readTyped(typedClauses(clauses, 'mm'))).toEqual({ clauses, places: [0, 1], problems: {} })
  })

  it('names the field of what cannot be read, and keeps the others', () => {
    const broken = typedClause('bias-zero-test')
    broken.parameters.alpha = 'two'
    const read = readTyped([broken, ...typedClauses([equivalence])])
    expect(Object.keys(read.problems)).toEqual(['clauses.0.parameters.alpha'])
    expect(read.clauses).toEqual([equivalence])
    expect(read.places).toEqual([1])
  })

  it('starts with clauses that can stand as they are', () =>
    expect(readTyped(startingTypes.map((type) => typedClause(type, 'mm'))).problems).toEqual({}))
})

describe('kinds of clauses', () => {
  it('are all offered by subject; what judges the same already is named as taken', () => {
    const groups = addableGroups([{ type: 'bias-zero-test' }])
    const types = groups.flatMap((group) => group.types)
    expect(types.map(({ type }) => type).sort()).toEqual([...clauseTypes].sort())
    expect(types.find(({ type }) => type === 'bias-equivalence')?.taken).toBe('bias-zero-test')
    expect(types.find(({ type }) => type === 'resolution-share')?.taken).toBeUndefined()
    expect(groups.at(-1)?.types.map(({ type }) => type)).toEqual(['by-hand', 'does-not-apply'])
  })
  it('that name their own subject can be added again', () =>
    expect(
      addableGroups([{ type: 'by-hand' }])
        .at(-1)
        ?.types.every(({ taken }) => taken === undefined),
    ).toBe(true))
  it('know what judges the same', () =>
    expect(alternatives('bias-zero-test')).toEqual(
      expect.arrayContaining(['bias-equivalence', 'bias-zero-test']),
    ))
})

describe('units of a margin', () => {
  it('are those of the characteristics’ quantities', () => {
    const units = marginUnits([{ unit: 'mm' }])
    expect(units).toContain('µm')
    expect(units).not.toContain('kg')
  })
  it('are all where no characteristic is entered', () => expect(marginUnits([])).toContain('kg'))
})

it('a day after another crosses months and years', () => {
  expect(dayAfter('2026-12-15', 30)).toBe('2027-01-14')
})

it('two clauses that judge the same are named before anything is sent', () => {
  const twice = typedClauses([
    equivalence,
    { type: 'does-not-apply', parameters: { key: 'bias/mean', reason: 'Not on this part.' } },
  ])
  expect(readTyped(twice).problems.clauses).toContain('Bias')
  expect(readTyped(twice.slice(0, 1)).problems).toEqual({})
})
