import fc from 'fast-check'
import jStat from 'jstat'
import { describe, expect, it } from 'vitest'
import {
  betaDistributionTails,
  betaQuantile,
  chiDensity,
  chiSquareQuantile,
  chiSquareTails,
  fQuantile,
  fTails,
  noncentralTQuantile,
  noncentralTQuantileNear,
  noncentralTTails,
  noncentralityAt,
  normalCdf,
  normalCdfWithin,
  normalQuantile,
  normalUpperTail,
  studentizedRangeQuantile,
  studentizedRangeTails,
  tQuantile,
  tTails,
  tTwoSided,
  type Tails,
} from '.'
import { findRisingRoot, findRoot } from './find-root'
import { integrate, integratePanel } from './gauss-legendre'

interface Case {
  name: string
  tails(x: number): Tails
  quantile(p: number): number
  secondOpinion?: (x: number) => number
  /** Near 1 a number of this distribution cannot tell its distance from 1 to ten digits. */
  endsAtOne?: true
  places: number[]
}

const degrees = [1, 2, 3, 9, 30, 199, 200, 201, 1500, 1e4, 1e6]
const cases: Case[] = [
  {
    name: 'normal',
    tails: (z) => ({ lower: normalCdf(z), upper: normalUpperTail(z) }),
    quantile: normalQuantile,
    secondOpinion: (z) => jStat.normal.cdf(z, 0, 1),
    places: [-3, -1, 0, 0.5, 2, 4],
  },
  ...degrees.map((df) => ({
    name: `t on ${df}`,
    tails: (t: number) => tTails(t, df),
    quantile: (p: number) => tQuantile(p, df),
    // jstat's loses digits from about 10⁴ degrees of freedom.
    ...(df < 1e4 && { secondOpinion: (t: number) => jStat.studentt.cdf(t, df) }),
    places: [-3, -1, 0, 0.5, 2, 4],
  })),
  ...degrees.map((df) => ({
    name: `chi-square on ${df}`,
    tails: (x: number) => chiSquareTails(x, df),
    quantile: (p: number) => chiSquareQuantile(p, df),
    ...(df < 1e4 && { secondOpinion: (x: number) => jStat.chisquare.cdf(x, df) }),
    places: [0.5, 0.9, 1, 1.1, 1.5].map((share) => share * df),
  })),
  ...[
    [1, 1],
    [2, 18],
    [9, 20],
    [20, 2],
    [199, 1000],
  ].map(([a = 1, b = 1]) => ({
    name: `F on ${a} and ${b}`,
    tails: (x: number) => fTails(x, a, b),
    quantile: (p: number) => fQuantile(p, a, b),
    secondOpinion: (x: number) => jStat.centralF.cdf(x, a, b),
    places: [0.2, 0.9, 1, 1.5, 4],
  })),
  ...[
    [0.5, 0.5],
    [2, 3],
    [1, 50],
    [30, 4],
  ].map(([a = 1, b = 1]) => ({
    name: `beta with ${a} and ${b}`,
    tails: (x: number) => betaDistributionTails(x, a, b),
    quantile: (p: number) => betaQuantile(p, a, b),
    secondOpinion: (x: number) => jStat.beta.cdf(x, a, b),
    endsAtOne: true as const,
    places: [0.01, 0.3, 0.5, 0.9],
  })),
  ...[1, 4, 14, 100, 1e4].flatMap((df) =>
    [-5, 1, 20].map((shift) => ({
      name: `noncentral t on ${df}, noncentrality ${shift}`,
      tails: (t: number) => noncentralTTails(t, df, shift),
      quantile: (p: number) => noncentralTQuantile(p, df, shift),
      ...(df < 1e4 && shift === 1 && { secondOpinion: (t: number) => jStat.noncentralt.cdf(t, df, shift) }),
      places: [-2, -0.5, 0, 0.5, 2].map((beside) => shift + beside),
    })),
  ),
]
const chances = [1e-12, 1e-6, 0.001, 0.025, 0.3, 0.5, 0.7, 0.975, 0.999, 1 - 1e-6]

describe.each(cases)('the distribution $name', ({ tails, quantile, places, endsAtOne }) => {
  it('has tails that add to one and never fall', () => {
    let before = 0
    for (const x of places) {
      const { lower, upper } = tails(x)
      expect(lower + upper).toBeCloseTo(1, 13)
      expect(lower).toBeGreaterThanOrEqual(before)
      before = lower
    }
  })

  it('has quantiles at which its chances are the ones asked for, in both tails', () => {
    for (const p of chances) {
      const { lower, upper } = tails(quantile(p))
      // Relative to the smaller tail; 1 − p itself carries an error of about 1e-16.
      if (p <= 0.5) expect(Math.abs(lower / p - 1), `p ${p}`).toBeLessThan(1e-10)
      else if (!endsAtOne) expect(Math.abs(upper / (1 - p) - 1), `p ${p}`).toBeLessThan(1e-10)
    }
  })

  it('has quantiles that rise with the chance', () => {
    const values = chances.map(quantile)
    expect(values).toEqual(values.toSorted((a, b) => a - b))
    expect(new Set(values).size).toBe(values.length)
  })
})

describe('a second opinion', () => {
  it.each(cases.filter(({ secondOpinion }) => secondOpinion))(
    'jstat agrees on the distribution $name',
    ({ tails, places, secondOpinion }) => {
      for (const x of places) expect(tails(x).lower).toBeCloseTo(secondOpinion?.(x) ?? NaN, 7)
    },
  )
})

describe('relations between distributions', () => {
  const runs = { seed: 3, numRuns: 300 }
  const df = fc.integer({ min: 1, max: 2000 })

  it('t is even, and its square is F on one degree of freedom', () => {
    fc.assert(
      fc.property(fc.double({ min: -30, max: 30, noNaN: true }), df, (t, nu) => {
        expect(tTails(t, nu).lower).toBe(tTails(-t, nu).upper)
        expect(tTwoSided(t, nu)).toBeCloseTo(fTails(t * t, 1, nu).upper, 12)
        expect(tQuantile(0.25, nu)).toBe(-tQuantile(0.75, nu))
      }),
      runs,
    )
  })

  it('chi-square on two degrees of freedom is exponential', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 100, noNaN: true }), (x) => {
        expect(Math.abs(chiSquareTails(x, 2).upper / Math.exp(-x / 2) - 1)).toBeLessThan(1e-12)
      }),
      runs,
    )
  })

  it('noncentral t without noncentrality is t, and mirrored it is itself', () => {
    fc.assert(
      fc.property(fc.double({ min: -9, max: 9, noNaN: true }), df, (t, nu) => {
        expect(noncentralTTails(t, nu, 0)).toEqual(tTails(t, nu))
        expect(noncentralTTails(t, nu, 1e-12).lower).toBeCloseTo(tTails(t, nu).lower, 10)
        expect(noncentralTTails(t, nu, 1.5).lower).toBeCloseTo(noncentralTTails(-t, nu, -1.5).upper, 12)
      }),
      runs,
    )
  })

  it('the noncentrality at which t is a quantile is the one it was a quantile of', () => {
    for (const nu of [1, 4, 49]) {
      for (const shift of [-3, 0.5, 12]) {
        const t = noncentralTQuantile(0.95, nu, shift)
        expect(Math.abs(noncentralityAt(t, nu, 0.95) - shift)).toBeLessThan(1e-8 * (1 + Math.abs(shift)))
      }
    }
  })

  it('the own incomplete gamma function meets that of @stdlib at the seam of 200 degrees of freedom', () => {
    for (const share of [0.5, 0.8, 1, 1.2, 1.6]) {
      const [below, at, above] = [199.999999, 200, 200.000001].map((nu) => chiSquareTails(share * 200, nu))
      const middle = ((below?.lower ?? 0) + (above?.lower ?? 0)) / 2
      expect(Math.abs((at?.lower ?? 0) / middle - 1)).toBeLessThan(1e-11)
    }
  })

  it('the density of s/σ integrates to one', () => {
    for (const nu of [1, 2, 9, 300]) {
      const points = Array.from({ length: 401 }, (_, i) => 1e-9 + i / 60)
      expect(integrate((v) => chiDensity(v, nu), points)).toBeCloseTo(1, 8)
    }
  })

  it('quantiles of the normal distribution are those of every table', () => {
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 14)
    expect(normalQuantile(1e-12)).toBeCloseTo(-7.034483825301131, 12)
  })

  it('far tails keep their own digits and never leave [0, 1]', () => {
    // φ(z)/z·(1 − 1/z² + 3/z⁴ − …) at z = 30: 4.906713927148187e-198.
    expect(Math.abs(normalUpperTail(30) / 4.906713927148187e-198 - 1)).toBeLessThan(1e-12)
    for (const [t, nu, shift] of [
      [1e200, 7e5, 0.1],
      [1e30, 1e6, -50],
      [-1e5, 3, 60],
      [1e-300, 5, 3],
    ] as const) {
      const { lower, upper } = noncentralTTails(t, nu, shift)
      expect(lower).toBeGreaterThanOrEqual(0)
      expect(upper).toBeGreaterThanOrEqual(0)
      expect(lower + upper).toBe(1)
    }
    expect(chiSquareTails(1e-300, 1e6)).toEqual({ lower: 0, upper: 1 })
    expect(chiSquareTails(1e9, 300)).toEqual({ lower: 1, upper: 0 })
  })
})

describe('the studentised range', () => {
  it('of two groups is |t|·√2, in both tails', () => {
    for (const df of [1, 2, 5, 30, 1e6]) {
      for (const q of [1e-4, 0.1, 1, 5, 15, 100]) {
        const { lower, upper } = studentizedRangeTails(q, 2, df)
        const beyond = tTwoSided(q / Math.SQRT2, df)
        if (beyond > 0) expect(Math.abs(upper / beyond - 1), `${q} on ${df}`).toBeLessThan(1e-10)
        expect(lower).toBeCloseTo(1 - beyond, 12)
      }
    }
  })

  it.each([
    [3.5, 3, 20],
    [4, 10, 60],
    [1, 5, 5],
    [0.5, 4, 10],
  ])('at %d with %d groups on %d degrees of freedom agrees with jstat', (q, groups, df) => {
    expect(studentizedRangeTails(q, groups, df).lower).toBeCloseTo(jStat.tukey.cdf(q, groups, df), 8)
  })

  it('has quantiles at which its chances are the ones asked for', () => {
    for (const [groups, df] of [
      [3, 1],
      [5, 60],
    ] as const) {
      for (const p of [1e-9, 1 - 1e-6]) {
        const { lower, upper } = studentizedRangeTails(studentizedRangeQuantile(p, groups, df), groups, df)
        expect(Math.abs(p <= 0.5 ? lower / p - 1 : upper / (1 - p) - 1), `p ${p}`).toBeLessThan(1e-9)
      }
    }
    // Every table of the studentised range: 3.58 for three groups on 20 degrees of freedom at 5 %.
    expect(studentizedRangeQuantile(0.95, 3, 20)).toBeCloseTo(3.578, 3)
  })

  it('is nothing at zero and everything far away', () => {
    expect(studentizedRangeTails(0, 3, 10)).toEqual({ lower: 0, upper: 1 })
    expect(studentizedRangeTails(1e300, 3, 1000)).toEqual({ lower: 1, upper: 0 })
  })
})

describe('integration and roots', () => {
  it('sixteen nodes integrate polynomials up to degree 31 exactly', () => {
    for (let degree = 0; degree <= 31; degree++) {
      const exact = degree % 2 === 1 ? 0 : 2 / (degree + 1)
      expect(integratePanel((x) => x ** degree, -1, 1)).toBeCloseTo(exact, 14)
    }
    expect(Math.abs(integratePanel((x) => x ** 32, -1, 1) - 2 / 33)).toBeGreaterThan(1e-12)
  })

  it('a root is found wherever it lies', () => {
    const runs = { seed: 4, numRuns: 300 }
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), (root) => {
        expect(findRisingRoot((x) => (x - root) ** 3, 0, 1)).toBeCloseTo(root, 3)
        expect(findRisingRoot((x) => Math.atan(x - root), 3, 0.1)).toBeCloseTo(root, 8)
      }),
      runs,
    )
    expect(findRoot((x) => x * x - 2, 0, 2)).toBe(Math.SQRT2)
  })
})

describe('what is formed at once', () => {
  it('the normal distribution from a table is that of the function to 1e-14, at every seam', () => {
    for (let i = -1000; i <= 1000; i++) {
      const z = i / 100 + (i % 3) * 1e-9
      expect(Math.abs(normalCdfWithin(z) - normalCdf(z)), `z ${z}`).toBeLessThan(1e-14)
    }
    expect([normalCdfWithin(-1e300), normalCdfWithin(1e300)]).toEqual([0, 1])
  })

  it('the quantile of noncentral t is near, and above it once a fifth of 1/df is added, for chances from a half', () => {
    for (const p of [0.5, 0.6, 0.75, 0.9, 0.99, 0.9999])
      for (const df of [4, 9, 30, 99, 999, 99_999])
        for (const half of [0.01, 0.5, 2, 4, 12, 600]) {
          const shift = half * Math.sqrt(df + 1)
          const near = noncentralTQuantileNear(p, df, shift)
          if (near === null) continue
          const exact = noncentralTQuantile(p, df, shift)
          expect(near * (1 + 0.2 / df), `p ${p}, df ${df}, half ${half}`).toBeGreaterThan(exact)
          if (p <= 0.9) expect(Math.abs(near / exact - 1)).toBeLessThan(0.2 / df)
        }
  })
})
