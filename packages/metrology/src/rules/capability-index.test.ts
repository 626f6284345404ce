import { describe, expect, it } from 'vitest'
import { judgeClause } from '../clauses'
import { chiSquareTails, normalCdf } from '../distributions'
import { incentives } from '../kinds/incentives'
import type { BiasIndexParameters, ClauseOf, JudgementFacts, RuleOf } from '../types'
import { acceptedHalfWidth } from './band'
import { index } from './capability-index'
import { chancesOf } from './chances'

const parameters: BiasIndexParameters = {
  ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: null, leastCgk: 1.33 },
  ...{ basis: 'bound', confidence: 0.95 },
}
const rule: RuleOf<'index'> = {
  ...{ type: 'index', share: 0.2, sigmas: 6, least: 1.33, toleranceWidth: 1, alpha: 0.05 },
}
const { alpha: _alpha, ...onEstimate } = rule

function verdict(of: Partial<BiasIndexParameters>, n: number, bias: number, standardDeviation: number) {
  const clause: ClauseOf<'bias-index'> = { type: 'bias-index', parameters: { ...parameters, ...of } }
  const facts: JudgementFacts = {
    characteristic: { unit: 'mm', tolerance: { lower: 0, upper: 1 } },
    ...{ design: null, calibration: null, coverageFactor: 2, byHand: null },
    study: { n, bias, standardDeviation, reference: { value: 0, standardUncertainty: null } },
  }
  return judgeClause(clause, facts).verdict
}

describe('the rule of the capability indices', () => {
  it.each([2, 3, 10, 50, 1000])('with %d readings accepts and refuses what the clause does', (n) => {
    for (const [of, clause] of [
      [rule, {}],
      [{ ...rule, leastCg: 2 }, { leastCg: 2 }],
      [onEstimate, { basis: 'estimate' }],
      [
        { ...onEstimate, leastCg: 2 },
        { basis: 'estimate', leastCg: 2 },
      ],
    ] as const) {
      const accepts = index.accepts(of, n)
      const refuses = index.refusesOutside(of, n)
      for (const s of [0.0005, 0.004, 0.01, 0.0166, 0.02, 0.026]) {
        const edge = acceptedHalfWidth(accepts, s)
        if (edge > 0) {
          expect(verdict(clause, n, edge * (1 - 1e-9), s)).toBe('meets')
          expect(verdict(clause, n, edge * (1 + 1e-9), s)).not.toBe('meets')
        } else expect(verdict(clause, n, 0, s)).not.toBe('meets')
        const outer = refuses && acceptedHalfWidth(refuses, s)
        if (outer === null) continue
        if (outer > 0) expect(verdict(clause, n, outer * (1 - 1e-9), s)).not.toBe('falls-short')
        expect(verdict(clause, n, Math.max(0, outer) * (1 + 1e-9) + 1e-12, s)).toBe('falls-short')
      }
    }
  })

  it('has the chance of chi-square where Cg alone decides', () => {
    // A Cgk that leaves the bias all of the allowance: what is left is s against the spread that Cg allows.
    const cgAlone = { ...onEstimate, least: 1e-12, leastCg: 1.33 }
    const largest = 0.2 / (1.33 * 6)
    for (const n of [2, 5, 30]) {
      for (const standardDeviation of [0.015, 0.025, 0.04]) {
        const chi = (n - 1) * (largest / standardDeviation) * (largest / standardDeviation)
        const { meets } = chancesOf(cgAlone, n)({ bias: 0, standardDeviation })
        const biasWithin = 1 - 2 * normalCdf((-0.1 * Math.sqrt(n)) / standardDeviation)
        expect(meets).toBeCloseTo(chiSquareTails(chi, n - 1).lower * biasWithin, 10)
      }
    }
  })

  it('on a bound is met by a gauge just at the least with at most the risk', () => {
    for (const n of [2, 5, 25, 100]) {
      for (const bias of [0, 0.03, 0.08]) {
        const standardDeviation = (0.1 - bias) / (1.33 * 3)
        expect(chancesOf(rule, n)({ bias, standardDeviation }).meets).toBeLessThanOrEqual(0.05 + 1e-9)
      }
    }
  })

  it('on a bound never rewards a worse gauge, a stricter risk, or fewer readings in studies of some size', () => {
    for (const n of [15, 50]) {
      expect(incentives({ ...rule, leastCg: 1.33 }, n)).toMatchObject({
        worseRepeatabilityHelps: false,
        moreReadingsHurt: false,
        stricterRiskHelps: false,
      })
    }
    // On the estimate a small study passes by luck.
    expect(incentives(onEstimate, 5)).toMatchObject({ moreReadingsHurt: true, stricterRiskHelps: null })
  })
})
