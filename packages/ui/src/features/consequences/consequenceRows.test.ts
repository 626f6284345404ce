import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { clauseEffects, hasConsequences, shownMargin } from './consequenceRows'

const characteristic = { unit: 'mm', tolerance: { lower: 23.975, upper: 24.025 } }
const assumptions = { readings: 15, standardDeviation: 0.0008 }
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}

describe('the consequences of two rules', () => {
  const effects = clauseEffects({ before: zeroTest, after: equivalence }, characteristic, assumptions)

  it('stand on the same true biases', () => {
    const [before, after] = [effects.before, effects.after].map((effect) =>
      effect?.curve.map(({ bias }) => bias),
    )
    expect(before).toEqual(after)
    expect(before?.at(-1)).toBeCloseTo(1.6 * 0.0025)
    expect(shownMargin(effects)).toBeCloseTo(0.0025)
  })

  it('find that the zero test rewards a worse gauge, fewer readings and a stricter level', () => {
    expect(effects.before?.perverse).toBe(true)
    expect(effects.before?.incentives.map(({ kind, wrong }) => [kind, wrong])).toEqual([
      ['worse-repeatability', true],
      ['more-readings', true],
      ['stricter-risk', true],
    ])
    // Known in spreads only, the worst bias is told for the assumed spread.
    for (const { bias } of effects.before?.incentives ?? []) expect(bias).toBeLessThan(0.0024)
  })

  it('find nothing wrong with equivalence, and show it where the chance is open', () => {
    expect(effects.after?.perverse).toBe(false)
    expect(effects.after?.incentives.map(({ effect }) => effect.split(':')[0])).toEqual([
      'passes less often',
      'passes more often',
      'passes less often',
    ])
  })

  it('are none where the characteristic does not define the margin', () => {
    const oneSided = { unit: 'mm', tolerance: { upper: 2 } }
    expect(clauseEffects({ before: null, after: equivalence }, oneSided, assumptions)).toEqual({
      before: null,
      after: null,
    })
  })

  it('belong to bias clauses alone', () => {
    expect([zeroTest, equivalence].every(hasConsequences)).toBe(true)
    expect(hasConsequences({ type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } })).toBe(
      false,
    )
  })
})
