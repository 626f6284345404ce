import fc from 'fast-check'
import jStat from 'jstat'
import { describe, expect, it } from 'vitest'
import { Random } from '../../../../tests/random'
import { noncentralTTails, normalCdf } from '../distributions'
import { oneSidedCritical, twoSidedCritical } from '../statistics/mean-interval'
import type { Rule, RuleType, Truth } from '../types'
import { chancesOf, chanceToMeet } from './chances'

const rules: { [T in RuleType]: Rule } = {
  'zero-test': { type: 'zero-test', alpha: 0.05 },
  equivalence: { type: 'equivalence', alpha: 0.05, margin: 0.02 },
  'interval-inside': { type: 'interval-inside', alpha: 0.1, margin: 0.02 },
  point: { type: 'point', margin: 0.02 },
  index: { type: 'index', share: 0.2, sigmas: 6, least: 1.33, toleranceWidth: 0.5 },
  'with-uncertainty': {
    type: 'with-uncertainty',
    margin: 0.02,
    referenceStandardUncertainty: 0.003,
    coverageFactor: 2,
  },
}
const all = Object.values(rules)
const runs = (seed: number) => ({ seed, numRuns: 150 })

type Verdict = 'meets' | 'fallsShort' | 'notShown'

/** One study decided as the contract words it, with critical values of jstat; none of the code under test. */
function decide(rule: Rule, mean: number, s: number, n: number): Verdict {
  const size = Math.abs(mean)
  const within = (half: number, margin: number): Verdict =>
    size + half <= margin ? 'meets' : size - half > margin ? 'fallsShort' : 'notShown'
  const t = (chance: number) => jStat.studentt.inv(chance, n - 1)
  switch (rule.type) {
    case 'zero-test':
      return size <= (t(1 - rule.alpha / 2) * s) / Math.sqrt(n) ? 'meets' : 'fallsShort'
    case 'equivalence':
      return within((t(1 - rule.alpha) * s) / Math.sqrt(n), rule.margin)
    case 'interval-inside':
      return within((t(1 - rule.alpha / 2) * s) / Math.sqrt(n), rule.margin)
    case 'point':
      return size <= rule.margin ? 'meets' : 'fallsShort'
    case 'index':
      return ((rule.share * rule.toleranceWidth) / 2 - size) / ((rule.sigmas * s) / 2) >= rule.least
        ? 'meets'
        : 'fallsShort'
    case 'with-uncertainty':
      return within(
        rule.coverageFactor * Math.hypot(s / Math.sqrt(n), rule.referenceStandardUncertainty),
        rule.margin,
      )
  }
}

function simulate(
  rule: Rule,
  truth: Truth,
  n: number,
  studies: number,
  random: Random,
): Record<Verdict, number> {
  const counts = { meets: 0, fallsShort: 0, notShown: 0 }
  const u = rule.type === 'with-uncertainty' ? rule.referenceStandardUncertainty : 0
  for (let i = 0; i < studies; i++) {
    let [sum, squares] = [0, 0]
    for (let k = 0; k < n; k++) {
      const reading = random.normal()
      sum += reading
      squares += reading * reading
    }
    const mean = truth.bias + (truth.standardDeviation * sum) / n + u * random.normal()
    const s = truth.standardDeviation * Math.sqrt(Math.max(0, (squares - (sum * sum) / n) / (n - 1)))
    counts[decide(rule, mean, s, n)]++
  }
  return counts
}

describe('the exact chances of a rule', () => {
  it.each(all)('$type: are those of 20,000 simulated studies', (rule) => {
    const random = new Random(31)
    const studies = 20_000
    for (const [truth, n] of [
      [{ bias: 0.012, standardDeviation: 0.015 }, 6],
      [{ bias: -0.024, standardDeviation: 0.008 }, 10],
    ] as const) {
      const exact = chancesOf(rule, n)(truth)
      const counted = simulate(rule, truth, n, studies, random)
      for (const verdict of ['meets', 'fallsShort', 'notShown'] as const) {
        const expected = exact[verdict] * studies
        const spread = Math.sqrt(studies * exact[verdict] * (1 - exact[verdict]))
        expect(Math.abs(counted[verdict] - expected), `${verdict} ${expected}`).toBeLessThan(4.5 * spread + 1)
      }
    }
  })

  it.each(all)('$type: agree with a plain sum over 200,000 spreads to 1e-9', (rule) => {
    for (const [truth, n] of [
      [{ bias: 0.009, standardDeviation: 0.012 }, 15],
      [{ bias: 0.0195, standardDeviation: 0.004 }, 4],
      [{ bias: 0.001, standardDeviation: 0.03 }, 3],
    ] as const) {
      expect(Math.abs(chancesOf(rule, n)(truth).meets - plainSum(rule, truth, n))).toBeLessThan(1e-9)
    }
  })

  it('of the zero test are a difference of noncentral t chances', () => {
    for (const n of [2, 5, 15, 60]) {
      for (const bias of [0, 0.3, 1, 2.5]) {
        const t = jStat.studentt.inv(0.975, n - 1)
        const shift = bias * Math.sqrt(n)
        const closed = noncentralTTails(t, n - 1, shift).lower - noncentralTTails(-t, n - 1, shift).lower
        expect(chancesOf(rules['zero-test'], n)({ bias, standardDeviation: 1 }).meets).toBeCloseTo(closed, 7)
      }
    }
  })

  it('of the point rule are normal chances, one half with the true bias at the margin', () => {
    const { meets } = chancesOf(rules.point, 9)({ bias: 0.015, standardDeviation: 0.03 })
    expect(meets).toBeCloseTo(normalCdf(0.5) - normalCdf(-3.5), 12)
    expect(chancesOf(rules.point, 25)({ bias: 0.02, standardDeviation: 0.01 }).meets).toBeCloseTo(0.5, 12)
  })

  it('of the zero test at no bias are one less the risk, whatever gauge and study', () => {
    for (const n of [2, 3, 15, 1000, 100_000]) {
      for (const standardDeviation of [1e-9, 0.01, 1e6]) {
        const { meets, fallsShort } = chancesOf(rules['zero-test'], n)({ bias: 0, standardDeviation })
        expect(meets).toBeCloseTo(0.95, 10)
        expect(fallsShort).toBeCloseTo(0.05, 10)
      }
    }
  })

  it('of equivalence with the true bias at the margin are at most the risk, and reach it with many readings', () => {
    for (const n of [3, 10, 50]) {
      for (const standardDeviation of [1e-4, 0.01, 0.1]) {
        const { meets, fallsShort } = chancesOf(rules.equivalence, n)({ bias: 0.02, standardDeviation })
        expect(meets).toBeLessThanOrEqual(0.05 + 1e-10)
        // A wide spread can throw the interval beyond either end.
        expect(fallsShort).toBeLessThanOrEqual(0.1 + 1e-10)
      }
    }
    expect(chancesOf(rules.equivalence, 100)({ bias: 0.02, standardDeviation: 1e-4 }).meets).toBeCloseTo(
      0.05,
      9,
    )
  })
})

describe('how chances change', () => {
  const anyRule = fc.constantFrom(...all)
  const size = fc.integer({ min: 2, max: 60 })
  const bias = fc.double({ min: -0.05, max: 0.05, noNaN: true })
  const spread = fc.double({ min: 1e-4, max: 0.1, noNaN: true })
  /** Sums of many terms carry a rounding of their own. */
  const tiny = 1e-10

  it('they lie between 0 and 1, add to one, and know no side', () => {
    fc.assert(
      fc.property(anyRule, size, bias, spread, (rule, n, at, standardDeviation) => {
        const chances = chancesOf(rule, n)({ bias: at, standardDeviation })
        const sum = chances.meets + chances.fallsShort + chances.notShown
        expect(Math.abs(sum - 1)).toBeLessThan(tiny)
        for (const chance of Object.values(chances)) expect(chance >= 0 && chance <= 1).toBe(true)
        expect(chancesOf(rule, n)({ bias: -at, standardDeviation })).toEqual(chances)
        expect(chanceToMeet(rule, n)({ bias: at, standardDeviation })).toBe(chances.meets)
      }),
      runs(32),
    )
  })

  it('a larger true bias never raises the chance to meet any rule', () => {
    fc.assert(
      fc.property(anyRule, size, bias, bias, spread, (rule, n, a, b, standardDeviation) => {
        const [near, far] = [a, b].toSorted((x, y) => Math.abs(x) - Math.abs(y)) as [number, number]
        const meets = chanceToMeet(rule, n)
        expect(meets({ bias: far, standardDeviation })).toBeLessThanOrEqual(
          meets({ bias: near, standardDeviation }) + tiny,
        )
      }),
      runs(33),
    )
  })

  it('equivalence inside the margin: more readings help, a worse gauge does not, as long as its spread is within the margin', () => {
    const fair = fc.double({ min: 1e-4, max: 0.02, noNaN: true })
    const inside = fc.double({ min: 0, max: 0.95, noNaN: true }).map((share) => share * 0.02)
    fc.assert(
      fc.property(
        fc.constantFrom(rules.equivalence, rules['interval-inside']),
        size,
        inside,
        fair,
        (rule, n, at, s) => {
          const before = chanceToMeet(rule, n)({ bias: at, standardDeviation: s })
          expect(chanceToMeet(rule, 2 * n)({ bias: at, standardDeviation: s })).toBeGreaterThanOrEqual(
            before - tiny,
          )
          expect(chanceToMeet(rule, n)({ bias: at, standardDeviation: 2 * s })).toBeLessThanOrEqual(
            before + tiny,
          )
        },
      ),
      runs(34),
    )
  })

  it('the zero test at any bias: a worse gauge helps, more readings hurt, a stricter risk helps', () => {
    const away = fc.double({ min: 1e-3, max: 3, noNaN: true })
    fc.assert(
      fc.property(size, away, fc.constantFrom(0.01, 0.05, 0.1), (n, at, alpha) => {
        const of = (rule: Rule, readings: number, standardDeviation: number) =>
          chanceToMeet(rule, readings)({ bias: at, standardDeviation })
        const rule: Rule = { type: 'zero-test', alpha }
        const before = of(rule, n, 1)
        expect(of(rule, n, 2)).toBeGreaterThanOrEqual(before - tiny)
        expect(of(rule, 2 * n, 1)).toBeLessThanOrEqual(before + tiny)
        expect(of({ ...rule, alpha: alpha / 2 }, n, 1)).toBeGreaterThan(before - tiny)
      }),
      runs(35),
    )
  })

  it('a stricter risk never helps equivalence or the interval, at any truth', () => {
    const graded = fc.constantFrom<'equivalence' | 'interval-inside'>('equivalence', 'interval-inside')
    fc.assert(
      fc.property(
        graded,
        size,
        bias,
        spread,
        fc.double({ min: 1e-12, max: 0.5, noNaN: true }),
        (type, n, at, s, alpha) => {
          const of = (risk: number) =>
            chanceToMeet({ type, alpha: risk, margin: 0.02 }, n)({ bias: at, standardDeviation: s })
          expect(of(alpha / 2)).toBeLessThanOrEqual(of(alpha) + tiny)
        },
      ),
      runs(36),
    )
  })

  it('a wider margin never lowers the chance to meet a rule that has one', () => {
    const withMargin = fc.constantFrom(
      rules.equivalence,
      rules['interval-inside'],
      rules.point,
      rules['with-uncertainty'],
    )
    fc.assert(
      fc.property(
        withMargin,
        size,
        bias,
        spread,
        fc.double({ min: 1, max: 3, noNaN: true }),
        (rule, n, at, s, times) => {
          const wider = { ...rule, margin: 0.02 * times } as Rule
          const truth = { bias: at, standardDeviation: s }
          expect(chanceToMeet(wider, n)(truth)).toBeGreaterThanOrEqual(chanceToMeet(rule, n)(truth) - tiny)
        },
      ),
      runs(37),
    )
  })

  it('scale with the unit', () => {
    fc.assert(
      fc.property(size, bias, spread, fc.constantFrom(1e-9, 1e-3, 1000, 1e12), (n, at, s, times) => {
        const one = chanceToMeet(rules.equivalence, n)({ bias: at, standardDeviation: s })
        const other = chanceToMeet({ type: 'equivalence', alpha: 0.05, margin: 0.02 * times }, n)
        expect(Math.abs(other({ bias: at * times, standardDeviation: s * times }) - one)).toBeLessThan(tiny)
      }),
      runs(38),
    )
  })
})

/** The chance to meet as a plain midpoint sum over V = s/σ, with the functions of JavaScript; critical values have their own tests. */
function plainSum(rule: Rule, { bias, standardDeviation }: Truth, n: number): number {
  const df = n - 1
  const u = rule.type === 'with-uncertainty' ? rule.referenceStandardUncertainty : 0
  const ofMean = Math.hypot(standardDeviation / Math.sqrt(n), u)
  const constant = Math.log(2) + (df / 2) * Math.log(df / 2) - jStat.gammaln(df / 2)
  const most = 1 + 12 / Math.sqrt(df)
  const steps = 200_000
  const halfWidth = halfWidthOf(rule, n)
  let sum = 0
  for (let i = 0; i < steps; i++) {
    const v = ((i + 0.5) * most) / steps
    const half = halfWidth(v * standardDeviation)
    if (half < 0) continue
    const density = Math.exp(constant + (df - 1) * Math.log(v) - (df * v * v) / 2)
    sum += density * (normalCdf((half - bias) / ofMean) - normalCdf((-half - bias) / ofMean))
  }
  return (sum * most) / steps
}

/** The largest |bias| each rule accepts at a sample spread, as the contract words it. */
function halfWidthOf(rule: Rule, n: number): (s: number) => number {
  const rootN = Math.sqrt(n)
  switch (rule.type) {
    case 'zero-test': {
      const t = twoSidedCritical(rule.alpha, n - 1)
      return (s) => (t * s) / rootN
    }
    case 'equivalence': {
      const t = oneSidedCritical(rule.alpha, n - 1)
      return (s) => rule.margin - (t * s) / rootN
    }
    case 'interval-inside': {
      const t = twoSidedCritical(rule.alpha, n - 1)
      return (s) => rule.margin - (t * s) / rootN
    }
    case 'point':
      return () => rule.margin
    case 'index':
      return (s) => (rule.share * rule.toleranceWidth) / 2 - ((rule.least * rule.sigmas) / 2) * s
    case 'with-uncertainty':
      return (s) =>
        rule.margin - rule.coverageFactor * Math.hypot(s / rootN, rule.referenceStandardUncertainty)
  }
}
