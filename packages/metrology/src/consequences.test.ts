import { describe, expect, it } from 'vitest'
import { allowedBias, consequences } from './consequences'
import { evaluate, isError } from './evaluate'
import { studyKinds } from './studies'
import type { Characteristic, Clause, ClauseInput, ClauseOutput } from './types'
import { areCompatible, convert, findUnit, units } from './units'
import { whatWouldSettle } from './what-would-settle'

const characteristic: Characteristic = {
  unit: 'mm',
  tolerance: { lower: 9.9, upper: 10.1 },
  resolution: 0.001,
}
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const uncertain: Clause = {
  type: 'bias-with-uncertainty',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, coverageFactor: 2 },
}
const index = (leastCgk: number): Clause => ({
  type: 'bias-index',
  parameters: {
    ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: null, leastCgk },
    ...{ basis: 'bound', confidence: 0.95 },
  },
})
const readingsAgreed: Clause = {
  type: 'design-minimum',
  parameters: { readings: 15, registeredBeforehand: true },
}

describe('what a clause does, before it is signed', () => {
  const plan = { characteristic, readings: 15, standardDeviation: 0.006 }

  it('shows a zero test that forgives a worse gauge and punishes more readings', () => {
    const shown = consequences({ ...plan, clause: zeroTest })
    expect(shown?.curve[0]?.meets).toBeCloseTo(0.95, 9)
    shown?.curve.slice(1).forEach((point, index) => {
      expect(shown.curveAtTwiceTheSpread[index + 1]?.meets).toBeGreaterThan(point.meets)
    })
    const allowed = shown?.allowedBias.map((each) => each.allowed) ?? []
    expect(allowed).toEqual(allowed.toSorted((a, b) => b - a))
    expect(shown?.incentives.worseRepeatabilityHelps).toBe(true)
  })

  it('shows equivalence that rewards the better gauge and more readings', () => {
    const shown = consequences({ ...plan, clause: equivalence })
    expect(shown?.rule).toEqual({ type: 'equivalence', alpha: 0.05, margin: 0.01 })
    const inside = shown?.curve.filter(({ bias }) => bias < 0.01) ?? []
    inside.forEach((point, index) => {
      expect(shown?.curveAtTwiceTheSpread[index]?.meets).toBeLessThanOrEqual(point.meets)
    })
    const allowed = shown?.allowedBias ?? []
    expect(allowed.map((each) => each.allowed)).toEqual(
      allowed.map((each) => each.allowed).toSorted((a, b) => a - b),
    )
    expect(allowed.find(({ readings }) => readings === 15)?.allowed).toBeCloseTo(
      0.01 - (1.7613101 * 0.006) / Math.sqrt(15),
      8,
    )
    expect(shown?.incentives).toMatchObject({ worseRepeatabilityHelps: false, moreReadingsHurt: false })
  })

  it('allows the bias at which a study of that size and spread just meets the clause', () => {
    const rule = { type: 'equivalence', alpha: 0.05, margin: 0.01 } as const
    const s = 0.004
    const allowed = allowedBias(rule, 4, s)
    // Readings with a mean of the bias and a standard deviation of exactly s.
    const judged = (bias: number) => {
      const d = (s * Math.sqrt(3)) / 2
      const readings = [10 + bias - d, 10 + bias + d, 10 + bias - d, 10 + bias + d]
      const output = evaluate({
        kind: 'clause',
        ...characteristic,
        clause: equivalence,
        data: { kind: 'bias', readings, reference: { value: 10 } },
      })
      return !isError(output) && (output as ClauseOutput).verdict
    }
    expect(judged(allowed - 1e-9)).toBe('meets')
    expect(judged(allowed + 1e-9)).toBe('not-shown')
    expect(allowedBias(rule, 4, 1)).toBe(0)
  })

  it('has nothing to show for documents, or for a margin that the characteristic does not define', () => {
    expect(consequences({ ...plan, clause: readingsAgreed })).toBeNull()
    expect(consequences({ ...plan, clause: equivalence, characteristic: { unit: 'mm' } })).toBeNull()
  })

  it('has the planned size among the sizes, and curves at the biases asked for', () => {
    const shown = consequences({ ...plan, clause: zeroTest, readings: 37, biases: [0, 0.001] })
    expect(shown?.allowedBias.map(({ readings }) => readings)).toContain(37)
    expect(shown?.curve.map(({ bias }) => bias)).toEqual([0, 0.001])
  })
})

describe('what would settle a clause that is not shown', () => {
  const submitted = (readings: number[], more: object = {}): ClauseInput => ({
    kind: 'clause',
    ...characteristic,
    clause: equivalence,
    data: { kind: 'bias', readings, reference: { value: 10, ...more } },
  })
  const settled = (input: ClauseInput) => {
    const output = evaluate(input)
    if (isError(output)) throw new Error(output.error.message)
    return whatWouldSettle(input, output)
  }
  const wide = [10.001, 9.985, 10.012, 9.991, 10.019]

  it('is a number of readings that would likely do, and with fewer it would not', () => {
    const { reason, readings, chance } = settled(submitted(wide))
    expect(reason).toBe('more-readings')
    expect(chance).toBeGreaterThanOrEqual(0.9)
    const study = evaluate({ kind: 'bias', ...submitted(wide).data })
    if (isError(study) || study.kind !== 'bias') throw new Error('no study')
    const at = (n: number) =>
      evaluate({
        kind: 'operatingCharacteristic',
        rule: { type: 'equivalence', alpha: 0.05, margin: 0.01 },
        design: { n },
        truth: [{ bias: study.bias ?? NaN, standardDeviation: study.standardDeviation ?? NaN }],
      })
    expect(at(readings ?? 0)).toMatchObject({ meets: [chance] })
    const fewer = at((readings ?? 0) - 1)
    expect(!isError(fewer) && fewer.kind === 'operatingCharacteristic' && (fewer.meets[0] ?? 1) < 0.9).toBe(
      true,
    )
  })

  it.each([
    ['settled', submitted([10.001, 10.0005, 9.9995, 10, 10.0002, 9.9998])],
    ['finer-resolution', submitted([10, 10, 10])],
    ['one-reading', submitted([10.001])],
    ['no-study', { ...submitted([10]), data: null }],
    ['better-standard', submitted(wide, { standardUncertainty: 0.005 })],
    ['estimate-beyond-margin', submitted(wide.map((reading) => reading + 0.012))],
    ['estimate-too-near-margin', submitted(wide.map((reading) => Number((reading + 0.00839999).toFixed(8))))],
    ['margin-undefined', { ...submitted(wide), tolerance: { upper: 10.1 } }],
    ['standard-uncertainty', { ...submitted(wide), clause: uncertain }],
    ['more-readings', { ...submitted(wide, { standardUncertainty: 0.0002 }), clause: uncertain }],
    ['better-standard', { ...submitted(wide, { standardUncertainty: 0.005 }), clause: uncertain }],
    ['more-readings', { ...submitted(wide), clause: index(0.3) }],
    ['index-below-least', { ...submitted(wide), clause: index(0.6) }],
    [
      'document',
      {
        ...submitted(wide),
        clause: { type: 'by-hand', parameters: { subject: 'linearity', measure: 'slope', asks: 'a slope' } },
      },
    ],
    [
      'not-an-equivalence',
      {
        ...submitted(wide),
        clause: { type: 'calibration-in-date', parameters: { gauge: true, standard: true } },
      },
    ],
  ] satisfies [string, ClauseInput][])('%s', (reason, input) => {
    expect(settled(input).reason).toBe(reason)
  })
})

describe('the plan of a bias study', () => {
  const truth = { bias: 0.002, standardDeviation: 0.005 }
  const plan = (...clauses: Clause[]) => studyKinds.bias.plan(clauses, characteristic, truth, 0.9)

  it('takes the largest number that any clause needs', () => {
    const alone = plan(equivalence)
    expect(alone.byClause).toEqual([
      expect.objectContaining({ clauseKey: 'bias/mean', reason: 'size-found' }),
    ])
    expect(plan(equivalence, readingsAgreed).readings).toBe(Math.max(15, alone.readings ?? 0))
    expect(plan(readingsAgreed, zeroTest).readings).toBe(15)
  })

  it('has no number where no size suffices, or where no clause names one', () => {
    const hopeless = studyKinds.bias.plan(
      [equivalence, readingsAgreed],
      characteristic,
      { ...truth, bias: 0.01 },
      0.9,
    )
    expect(hopeless.readings).toBeNull()
    expect(hopeless.byClause.map(({ reason }) => reason)).toEqual(['no-size-suffices', 'minimum'])
    expect(plan(zeroTest).readings).toBeNull()
  })
})

describe('units', () => {
  it('are converted exactly in decimal, there and back', () => {
    expect(convert(0.1, 'in', 'mm')).toBe(2.54)
    expect(convert(25.4, 'mm', 'in')).toBe(1)
    expect(convert(0.3, 'µm', 'mm')).toBe(0.0003)
    for (const { symbol, quantity } of units) {
      const first = units.find((each) => each.quantity === quantity)?.symbol ?? ''
      expect(convert(convert(1.23, symbol, first) ?? NaN, first, symbol)).toBe(1.23)
    }
  })

  it('of different quantities are never compared, and an unknown one only with itself', () => {
    expect(convert(1, 'mm', 'g')).toBeNull()
    expect(convert(1, 'ell', 'ell')).toBe(1)
    expect(convert(1, 'ell', 'mm')).toBeNull()
    expect(areCompatible('mm', 'in')).toBe(true)
    expect(areCompatible('HRC', 'HV')).toBe(false)
    expect(areCompatible('ell', 'yard')).toBe(false)
    expect(findUnit('mm')?.quantity).toBe('length')
    expect(new Set(units.map(({ symbol }) => symbol)).size).toBe(units.length)
  })
})
