import { describe, expect, it } from 'vitest'
import type { AgreedBaseline, Characteristic, Clause, Margin } from '../types'
import { clauseProblems, judgeClause, parseClause } from '.'
import { marginInUnit } from './baselines'

const most: Characteristic = { unit: 'mm', tolerance: { upper: 0.05 }, processStandardDeviation: 0.002 }
const least: Characteristic = { unit: 'N', tolerance: { lower: 40 } }
const tenth = (baseline?: AgreedBaseline): Margin => ({
  ...{ base: 'tolerance', share: 0.1 },
  ...(baseline && { baseline }),
})
const equivalence = (margin: Margin): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin, confidence: 0.95 },
})
const problems = (clause: Clause, of: Characteristic) =>
  clauseProblems(clause, of).map(({ code, path }) => `${path} ${code}`)

describe('a one-sided tolerance', () => {
  it('has the width that was agreed in its stead: to a natural bound, of the process, or a value', () => {
    expect(marginInUnit(tenth({ kind: 'natural-bound', value: 0 }), most)).toBe(0.005)
    expect(marginInUnit(tenth({ kind: 'natural-bound', value: -0.01 }), most)).toBe(0.006)
    expect(marginInUnit(tenth({ kind: 'natural-bound', value: 100 }), least)).toBe(6)
    // Six standard deviations of 0.002.
    expect(marginInUnit(tenth({ kind: 'process' }), most)).toBe(0.0012)
    expect(marginInUnit(tenth({ kind: 'absolute', value: 0.001, unit: 'in' }), most)).toBe(0.00254)
  })

  it('has none without a baseline, and the clause is refused with the reason', () => {
    expect(marginInUnit(tenth(), most)).toBeNull()
    expect(problems(equivalence(tenth()), most)).toEqual(['parameters.margin.base no-tolerance-width'])
  })

  it.each([
    [{ kind: 'natural-bound', value: 0.05 }, most, 'value bound-beyond-limit'],
    [{ kind: 'natural-bound', value: 40 }, least, 'value bound-beyond-limit'],
    [{ kind: 'natural-bound', value: 0 }, least, 'value bound-beyond-limit'],
    [{ kind: 'process' }, least, 'kind no-process-spread'],
    [{ kind: 'absolute', value: 1, unit: 'mm' }, least, 'unit unit-of-another-quantity'],
    [{ kind: 'absolute', value: 1, unit: 'ell' }, least, 'unit unit-unknown'],
  ] satisfies [AgreedBaseline, Characteristic, string][])(
    'cannot have %j stand in: %s',
    (baseline, of, problem) => {
      expect(problems(equivalence(tenth(baseline)), of)).toEqual([`parameters.margin.baseline.${problem}`])
      expect(marginInUnit(tenth(baseline), of)).toBeNull()
    },
  )

  it('an unknown unit is told even where the tolerance has two limits', () => {
    const both: Characteristic = { unit: 'mm', tolerance: { lower: 0, upper: 1 } }
    const strange = tenth({ kind: 'absolute', value: 1, unit: 'ell' })
    expect(problems(equivalence(strange), both)).toEqual(['parameters.margin.baseline.unit unit-unknown'])
  })
})

describe('a two-sided tolerance', () => {
  it('counts with its own width, whatever baseline was agreed for others', () => {
    const both: Characteristic = { unit: 'mm', tolerance: { lower: 0, upper: 1 } }
    expect(marginInUnit(tenth({ kind: 'absolute', value: 5, unit: 'mm' }), both)).toBe(0.1)
    expect(problems(equivalence(tenth({ kind: 'natural-bound', value: 9 })), both)).toEqual([])
  })

  it('a characteristic without any limit has no width to stand in for', () => {
    expect(marginInUnit(tenth({ kind: 'natural-bound', value: 0 }), { unit: 'mm' })).toBeNull()
  })
})

describe('clauses that take a share', () => {
  const baseline: AgreedBaseline = { kind: 'natural-bound', value: 0 }
  const facts = { design: null, calibration: null, coverageFactor: 2, byHand: null }
  const study = {
    n: 50,
    bias: 0,
    standardDeviation: 0.001,
    reference: { value: 0.03, standardUncertainty: null },
  }

  it('resolution: a tenth of the distance to zero', () => {
    const of = (more: object): Clause => ({
      type: 'resolution-share',
      parameters: { share: 0.1, base: 'tolerance', ...more },
    })
    const characteristic = { ...most, resolution: 0.005 }
    expect(judgeClause(of({ baseline }), { ...facts, characteristic, study: null })).toMatchObject({
      verdict: 'meets',
      figure: 0.1,
    })
    expect(judgeClause(of({}), { ...facts, characteristic, study: null }).reason.code).toBe(
      'no-tolerance-width',
    )
    expect(problems(of({}), most)).toEqual(['parameters.base no-tolerance-width'])
    expect(problems(of({ baseline: { kind: 'natural-bound', value: 1 } }), most)).toEqual([
      'parameters.baseline.value bound-beyond-limit',
    ])
  })

  it('index: a fifth of the distance to zero over six standard deviations', () => {
    const clause: Clause = {
      type: 'bias-index',
      parameters: {
        ...{ share: 0.2, base: 'tolerance', baseline, sigmas: 6, leastCg: null, leastCgk: 1 },
        ...{ basis: 'estimate', confidence: 0.95 },
      },
    }
    // 0.2 · 0.05 / (6 · 0.001)
    expect(judgeClause(clause, { ...facts, characteristic: most, study }).figure).toBe(0.01 / 0.006)
  })
})

describe('reading a baseline', () => {
  const read = (baseline: unknown) =>
    parseClause({
      type: 'bias-point',
      parameters: { margin: { base: 'tolerance', share: 0.1, baseline } },
    }).parameters

  it('keeps it as agreed, and leaves it out where none is given', () => {
    expect(read({ kind: 'process' })).toEqual({ margin: tenth({ kind: 'process' }) })
    expect(read(null)).toEqual({ margin: tenth() })
  })

  it.each([
    [{ kind: 'nature' }, 'parameters.margin.baseline.kind not-a-choice'],
    [{ kind: 'natural-bound' }, 'parameters.margin.baseline.value missing'],
    [{ kind: 'absolute', value: 0, unit: 'mm' }, 'parameters.margin.baseline.value too-small'],
    [{ kind: 'absolute', value: 1, unit: '' }, 'parameters.margin.baseline.unit missing'],
    [5, 'parameters.margin.baseline not-an-object'],
  ])('%j is refused: %s', (baseline, problem) => {
    const clause = { type: 'bias-point', parameters: { margin: { base: 'tolerance', share: 0.1, baseline } } }
    expect(problems(clause as unknown as Clause, most)).toEqual([problem])
  })

  it('belongs to a share of tolerance only', () => {
    const margin = { base: 'process', share: 0.1, baseline: { kind: 'process' } }
    expect(problems({ type: 'bias-point', parameters: { margin } } as unknown as Clause, most)).toEqual([
      'parameters.margin.baseline unknown-field',
    ])
  })
})
