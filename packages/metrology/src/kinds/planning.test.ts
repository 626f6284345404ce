import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../evaluate'
import { chancesOf } from '../rules/chances'
import type { Rule } from '../types'
import { incentives } from './incentives'
import { operatingCharacteristic } from './operating-characteristic'
import { sampleSize } from './sample-size'

const equivalence: Rule = { type: 'equivalence', alpha: 0.05, margin: 1 }
const zeroTest: Rule = { type: 'zero-test', alpha: 0.05 }

describe('the least number of readings', () => {
  const rules = fc.constantFrom<Rule>(
    equivalence,
    { type: 'interval-inside', alpha: 0.05, margin: 1 },
    { type: 'with-uncertainty', margin: 1, referenceStandardUncertainty: 0.05, coverageFactor: 2 },
    zeroTest,
  )
  const truth = fc.record({
    bias: fc.double({ min: 0.1, max: 0.7, noNaN: true }),
    standardDeviation: fc.double({ min: 0.1, max: 1.5, noNaN: true }),
  })

  it('reaches the chance wanted, one less does not, and more keep it', () => {
    fc.assert(
      fc.property(rules, truth, fc.constantFrom(0.5, 0.8, 0.9, 0.95), (rule, at, power) => {
        const found = sampleSize(rule, at, power)
        if (!found) return
        const chance = (n: number) => {
          const { meets, fallsShort } = chancesOf(rule, n)(at)
          return rule.type === 'zero-test' ? fallsShort : meets
        }
        expect(found.power).toBeGreaterThanOrEqual(power)
        expect(found.power).toBe(chance(found.n))
        if (found.n > 2) expect(chance(found.n - 1)).toBeLessThan(power)
        for (const more of [1, 2, 5, 17, 400, 5000])
          expect(chance(found.n + more)).toBeGreaterThanOrEqual(power)
      }),
      { seed: 61, numRuns: 60 },
    )
  })

  it('does not exist where the bias is at the margin, and is told as an error', () => {
    expect(sampleSize(equivalence, { bias: 1, standardDeviation: 1 }, 0.9)).toBeNull()
    const input = {
      kind: 'sampleSize',
      rule: equivalence,
      truth: { bias: 1, standardDeviation: 1 },
      power: 0.9,
    }
    expect(evaluate(input)).toMatchObject({ error: { code: 'no-sample-size', path: 'power' } })
  })

  it('of the zero test serves the chance to refuse: methods.md, 34 readings for half a standard deviation at 80 %', () => {
    expect(sampleSize(zeroTest, { bias: 0.5, standardDeviation: 1 }, 0.8)?.n).toBe(34)
    expect(sampleSize(equivalence, { bias: 0, standardDeviation: 1 }, 0.9)?.n).toBe(13)
  })
})

describe('what a rule rewards', () => {
  it('zero test: a worse gauge, fewer readings and a stricter risk, at every size of study', () => {
    for (const n of [2, 5, 15, 50, 1000]) {
      const found = incentives(zeroTest, n)
      expect(found).toMatchObject({
        worseRepeatabilityHelps: true,
        moreReadingsHurt: true,
        stricterRiskHelps: true,
      })
      for (const { change, before, after } of found.shown) {
        const wrong = change === 'more-readings' ? before - after : after - before
        expect(wrong, `${change} at ${n}`).toBeGreaterThan(0.05)
      }
    }
  })

  it('equivalence: none of the three', () => {
    for (const n of [3, 5, 15, 50, 1000]) {
      expect(incentives(equivalence, n), `n ${n}`).toMatchObject({
        worseRepeatabilityHelps: false,
        moreReadingsHurt: false,
        stricterRiskHelps: false,
      })
    }
  })

  it('a rule without a risk level has nothing to make stricter', () => {
    expect(incentives({ type: 'point', margin: 1 }, 15)).toMatchObject({ stricterRiskHelps: null })
    expect(incentives({ type: 'point', margin: 1 }, 15).shown.map(({ change }) => change)).toEqual([
      'worse-repeatability',
      'more-readings',
    ])
  })

  it('is shown by chances that the operating characteristic gives too', () => {
    const { shown } = incentives(zeroTest, 15)
    for (const { change, truth, before, after } of shown) {
      const of = (rule: Rule, n: number, standardDeviation: number) =>
        operatingCharacteristic(rule, n, [{ ...truth, standardDeviation }]).meets[0]
      expect(before).toBe(of(zeroTest, 15, truth.standardDeviation))
      const changed = {
        'worse-repeatability': () => of(zeroTest, 15, 2 * truth.standardDeviation),
        'more-readings': () => of(zeroTest, 30, truth.standardDeviation),
        'stricter-risk': () => of({ type: 'zero-test', alpha: 0.025 }, 15, truth.standardDeviation),
      }[change]
      expect(after).toBe(changed())
    }
  })

  it('does not depend on the unit', () => {
    const scaled = (times: number) =>
      incentives({ ...equivalence, margin: times }, 3).shown.map(({ before }) => before)
    const [one, other] = [scaled(1), scaled(1e-9)]
    one.forEach((chance, index) => expect(other[index]).toBeCloseTo(chance, 10))
  })
})

describe('inputs of the planning kinds', () => {
  it.each([
    [
      { kind: 'operatingCharacteristic', rule: equivalence, design: { n: 1 }, truth: [] },
      'too-small',
      'design.n',
    ],
    [{ kind: 'operatingCharacteristic', rule: equivalence, design: { n: 5 }, truth: [] }, 'too-few', 'truth'],
    [
      { kind: 'operatingCharacteristic', rule: { type: 'coin' }, design: { n: 5 }, truth: [] },
      'not-a-choice',
      'rule.type',
    ],
    [
      {
        kind: 'operatingCharacteristic',
        rule: equivalence,
        design: { n: 5 },
        truth: [{ bias: 0, standardDeviation: 0 }],
      },
      'too-small',
      'truth[0].standardDeviation',
    ],
    [{ kind: 'sampleSize', rule: { type: 'equivalence', alpha: 0.6, margin: 1 } }, 'too-large', 'rule.alpha'],
    [
      { kind: 'sampleSize', rule: zeroTest, truth: { bias: 1, standardDeviation: 1 }, power: 1 },
      'too-large',
      'power',
    ],
    [
      { kind: 'incentives', rule: { type: 'point', margin: -1 }, design: { n: 5 } },
      'too-small',
      'rule.margin',
    ],
    [
      { kind: 'incentives', rule: { type: 'point', margin: 1e200 }, design: { n: 5 } },
      'too-large',
      'rule.margin',
    ],
  ])('%j is refused: %s at %s', (input, code, path) => {
    expect(evaluate(input)).toMatchObject({ error: { code, path } })
  })
})
