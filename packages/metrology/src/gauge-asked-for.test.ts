import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { gaugeAskedFor, type GaugeAskedFor } from './gauge-asked-for'
import { chancesOf } from './rules/chances'
import type { Characteristic, Clause, ClauseOf, Margin } from './types'

const characteristic: Characteristic = {
  unit: 'mm',
  tolerance: { lower: 9.9, upper: 10.1 },
  processStandardDeviation: 0.02,
}
const margin: Margin = { base: 'tolerance', share: 0.1 }
const index: ClauseOf<'bias-index'> = {
  type: 'bias-index',
  parameters: {
    ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: 1.33, leastCgk: 1 },
    ...{ basis: 'bound', confidence: 0.95 },
  },
}
const clauses: Clause[] = [
  { type: 'bias-equivalence', parameters: { margin, confidence: 0.95 } },
  { type: 'bias-interval-inside', parameters: { margin, confidence: 0.95 } },
  { type: 'bias-point', parameters: { margin } },
  index,
  { ...index, parameters: { ...index.parameters, leastCg: null, basis: 'estimate' } },
  { type: 'bias-with-uncertainty', parameters: { margin, coverageFactor: 2 } },
]
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const asked = (clause: Clause, readings: number, chance: number, own?: number, u?: number): GaugeAskedFor => {
  const assumed = u === undefined ? {} : { referenceStandardUncertainty: u }
  const found = gaugeAskedFor(clause, characteristic, readings, chance, own, assumed)
  if (!found) throw new Error('no rule')
  return found
}

describe('the gauge a clause asks for', () => {
  it('meets it with the chance wanted at its limits, and with less just beyond', () => {
    const any = fc.record({
      clause: fc.constantFrom(...clauses, zeroTest),
      readings: fc.constantFrom(2, 3, 5, 10, 25, 60),
      chance: fc.constantFrom(0.5, 0.8, 0.9, 0.95, 0.99),
      own: fc.constantFrom(0.0005, 0.002, 0.01),
      u: fc.constantFrom(0, 0.002),
    })
    let [spreads, biases] = [0, 0]
    fc.assert(
      fc.property(any, ({ clause, readings, chance, own, u }) => {
        const { rule, spread, bias } = asked(clause, readings, chance, own, u)
        const meets = (at: number, standardDeviation: number) =>
          chancesOf(rule, readings)({ bias: at, standardDeviation }).meets
        if (spread.value !== null) {
          spreads++
          expect(meets(0, spread.value)).toBeCloseTo(chance, 9)
          expect(meets(0, spread.value * 1.001)).toBeLessThan(chance)
          expect(meets(0, spread.value * 0.5)).toBeGreaterThan(chance)
        }
        if (bias.value !== null && bias.value > 0) {
          biases++
          expect(meets(bias.value, own)).toBeCloseTo(chance, 9)
          expect(meets(bias.value * 1.001, own)).toBeLessThan(chance)
          expect(meets(bias.value * 0.999, own)).toBeGreaterThan(chance)
        }
        if (bias.reason === 'not-without-bias') expect(meets(0, own)).toBeLessThan(chance)
        if (spread.reason === 'no-spread') expect(meets(0, 1e-7)).toBeLessThan(chance)
      }),
      { seed: 71, numRuns: 150 },
    )
    expect(spreads).toBeGreaterThan(80)
    expect(biases).toBeGreaterThan(50)
  })

  it('of a point limit is the normal one: margin·√n over the normal quantile', () => {
    const point = clauses[2] as Clause
    const { spread, bias } = asked(point, 16, 0.9, 0.004)
    // Both sides at no bias: Φ⁻¹(0.95) = 1.6448536269514722; one side counts beside the margin: Φ⁻¹(0.9) = 1.2815515655446004.
    expect(spread.value).toBeCloseTo((0.02 * 4) / 1.6448536269514722, 9)
    expect(bias.value).toBeCloseTo(0.02 - (1.2815515655446004 * 0.004) / 4, 9)
  })

  it('a zero test limits no spread, allows a worse gauge more bias, and promises no chance beyond one less its risk', () => {
    const found = asked(zeroTest, 15, 0.9, 0.002)
    expect(found.spread).toEqual({ value: null, reason: 'any-spread' })
    expect(found.biasGrowsWithSpread).toBe(true)
    expect(asked(zeroTest, 15, 0.9, 0.004).bias.value).toBeCloseTo(2 * (found.bias.value ?? NaN), 9)
    const sure = asked(zeroTest, 15, 0.96, 0.002)
    expect(sure.spread).toEqual({ value: null, reason: 'no-spread' })
    expect(sure.bias).toEqual({ value: null, reason: 'not-without-bias' })
    // Exactly at one less the risk only a gauge without bias is left.
    expect(asked(zeroTest, 15, 0.95, 0.002)).toMatchObject({
      spread: { reason: 'any-spread' },
      bias: { value: 0, reason: 'found' },
    })
  })

  it('of every other clause is the finer one', () => {
    for (const clause of clauses) {
      const found = asked(clause, 15, 0.9, 0.0005)
      expect(found.biasGrowsWithSpread, clause.type).toBe(false)
      expect(asked(clause, 15, 0.99, 0.0005).spread.value).toBeLessThan(found.spread.value ?? 0)
    }
  })

  it('has no spread where the reference alone is too uncertain, and no bias at a spread too wide or unknown', () => {
    const [equivalence] = clauses as [Clause]
    const uncertain = clauses[5] as Clause
    expect(asked(uncertain, 15, 0.9, 0.001, 0.009).spread).toEqual({ value: null, reason: 'no-spread' })
    expect(asked(equivalence, 15, 0.9, 0.1).bias).toEqual({ value: null, reason: 'not-without-bias' })
    expect(asked(equivalence, 15, 0.9).bias).toEqual({ value: null, reason: 'own-spread-unknown' })
  })

  it('is not asked for by documents, or where the margin is not defined', () => {
    const date: Clause = { type: 'calibration-in-date', parameters: { gauge: true, standard: true } }
    expect(gaugeAskedFor(date, characteristic, 15, 0.9, 0.01)).toBeNull()
    expect(gaugeAskedFor(clauses[0] as Clause, { unit: 'mm' }, 15, 0.9, 0.01)).toBeNull()
  })
})
