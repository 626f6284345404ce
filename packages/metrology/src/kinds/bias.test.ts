import fc from 'fast-check'
import jStat from 'jstat'
import { describe, expect, it } from 'vitest'
import { Random } from '../../../../tests/random'
import { evaluate, isError } from '../evaluate'
import type { BiasOutput } from '../types'

interface Study {
  readings: number[]
  reference: { value: number; standardUncertainty?: number }
  confidence?: number
  margin?: number
  resolution?: number
  coverageFactor?: number
  tolerance?: { lower?: number; upper?: number }
  processStandardDeviation?: number
  index?: { share: number; sigmas: number }
}

function biasOf(study: Study): BiasOutput {
  const output = evaluate({ kind: 'bias', ...study })
  if (isError(output)) throw new Error(output.error.message)
  return output
}

/** Whole thousandths, so that every number is the decimal it was written as. */
const thousandths = (whole: number) => whole / 1000
const readings = fc.array(fc.integer({ min: -60, max: 60 }), { minLength: 2, maxLength: 30 })
const varying = readings.filter((values) => new Set(values).size > 1)
const reference = fc.integer({ min: -40, max: 40 })
const confidence = fc.constantFrom(0.5, 0.8, 0.9, 0.95, 0.99, 0.999)
const runs = (seed: number) => ({ seed, numRuns: 400 })
const near = (got: number | null, want: number | null, relative = 1e-12) =>
  got !== null &&
  want !== null &&
  Math.abs(got - want) <= relative * Math.max(Math.abs(got), Math.abs(want), 1e-300)

describe('bias from repeated readings', () => {
  it('is what it was when readings and reference are shifted together', () => {
    fc.assert(
      fc.property(varying, reference, fc.integer({ min: -1e12, max: 1e12 }), (values, at, shift) => {
        const here = biasOf({
          readings: values.map(thousandths),
          reference: { value: thousandths(at) },
          margin: 0.02,
        })
        const there = biasOf({
          readings: values.map((value) => thousandths(value + shift)),
          reference: { value: thousandths(at + shift) },
          margin: 0.02,
        })
        const { mean: _m, reference: _r, minimum: _l, maximum: _h, ...rest } = here
        expect(there).toMatchObject(rest)
      }),
      runs(11),
    )
  })

  it('scales with the unit, and every decision and pure number stays', () => {
    const tolerance = { lower: -0.3, upper: 0.2 }
    fc.assert(
      fc.property(varying, reference, fc.integer({ min: -40, max: 40 }), (values, at, power) => {
        const times = (value: number) => Number(`${value}e${power}`)
        const study = (scaled: (value: number) => number): Study => ({
          readings: values.map((value) => scaled(thousandths(value))),
          reference: { value: scaled(thousandths(at)), standardUncertainty: scaled(0.001) },
          margin: scaled(0.02),
          resolution: scaled(0.001),
          tolerance: { lower: scaled(tolerance.lower), upper: scaled(tolerance.upper) },
        })
        const one = biasOf(study((value) => value))
        const other = biasOf(study(times))
        expect(near(other.standardDeviation, times(one.standardDeviation ?? NaN))).toBe(true)
        expect(near(other.bias, times(one.bias ?? NaN))).toBe(true)
        for (const name of ['pValue', 'cg', 'cgLowerBound', 'shareOfTolerance'] as const)
          expect(near(other[name], one[name], 1e-9)).toBe(true)
        expect(other.zeroTest.accepts).toBe(one.zeroTest.accepts)
        expect(other.equivalence.accepts).toBe(one.equivalence.accepts)
        expect(other.intervalInside).toEqual(one.intervalInside)
        expect(other.withUncertainty.insideMargin).toBe(one.withUncertainty.insideMargin)
        expect(other.warnings.map(({ code }) => code)).toEqual(one.warnings.map(({ code }) => code))
      }),
      // Its indices make it the slowest of the properties.
      { seed: 12, numRuns: 150 },
    )
  })

  it('does not depend on the order of readings, but for what is about the order', () => {
    fc.assert(
      fc.property(varying, fc.infiniteStream(fc.double({ min: 0, max: 1, noNaN: true })), (values, keys) => {
        const shuffled = values
          .map((value) => ({ value, key: keys.next().value as number }))
          .toSorted((a, b) => a.key - b.key)
          .map(({ value }) => value)
        const of = (list: number[]) =>
          biasOf({ readings: list.map(thousandths), reference: { value: 0 }, margin: 0.02 })
        const { lag1Autocorrelation: _lag, warnings: _w, ...rest } = of(values)
        expect(of(shuffled)).toMatchObject(rest)
      }),
      runs(13),
    )
  })

  it('mirrors when everything changes its sign', () => {
    fc.assert(
      fc.property(varying, (values) => {
        const of = (sign: 1 | -1) =>
          biasOf({
            readings: values.map((value) => sign * thousandths(value)),
            reference: { value: 0 },
            margin: 0.02,
          })
        const [here, there] = [of(1), of(-1)]
        expect((there.bias ?? NaN) + (here.bias ?? NaN)).toBe(0)
        expect(there.equivalence.pLower).toBe(here.equivalence.pUpper)
        expect(there.pValue).toBe(here.pValue)
        expect(there.zeroTest).toEqual(here.zeroTest)
      }),
      runs(14),
    )
  })
})

describe('the rules on a bias', () => {
  const studies = fc.record({
    values: varying,
    at: reference,
    level: confidence,
    width: fc.integer({ min: 1, max: 90 }),
  })
  const outcome = ({
    values,
    at,
    level,
    width,
  }: {
    values: number[]
    at: number
    level: number
    width: number
  }) =>
    biasOf({
      readings: values.map(thousandths),
      reference: { value: thousandths(at) },
      confidence: level,
      margin: thousandths(width),
    })

  it('p value, allowed bias and interval of the zero test always decide alike', () => {
    fc.assert(
      fc.property(studies, (study) => {
        const { pValue, zeroTest, interval } = outcome(study)
        const zeroInside = (interval?.lower ?? NaN) <= 0 && (interval?.upper ?? NaN) >= 0
        expect(zeroTest.accepts).toBe(zeroInside)
        expect(zeroTest.accepts).toBe((pValue ?? NaN) >= zeroTest.alpha)
      }),
      runs(15),
    )
  })

  it('the two one-sided tests decide as their p value and as their interval', () => {
    fc.assert(
      fc.property(studies, (study) => {
        const { equivalence, confidence: level } = outcome(study)
        const { interval, margin, pValue, pLower, pUpper, accepts } = equivalence
        const limit = margin ?? NaN
        expect(accepts).toBe((interval?.lower ?? NaN) >= -limit && (interval?.upper ?? NaN) <= limit)
        expect(pValue).toBe(Math.max(pLower ?? NaN, pUpper ?? NaN))
        // At 50 % the interval is a point and p equals alpha exactly where the bias is the margin.
        if (level > 0.5) expect(accepts).toBe((pValue ?? NaN) <= equivalence.alpha)
      }),
      runs(16),
    )
  })

  it('the two-sided interval inside the margin is equivalence at half the risk', () => {
    fc.assert(
      fc.property(
        varying,
        fc.constantFrom(0.9, 0.95, 0.99),
        fc.integer({ min: 1, max: 90 }),
        (values, level, width) => {
          const common = {
            readings: values.map(thousandths),
            reference: { value: 0 },
            margin: thousandths(width),
          }
          const inside = biasOf({ ...common, confidence: level })
          const half = biasOf({ ...common, confidence: Number(((1 + level) / 2).toFixed(4)) })
          expect(inside.intervalInside.accepts).toBe(half.equivalence.accepts)
        },
      ),
      runs(17),
    )
  })

  it('allow a bias of t(1 − α/2, n − 1)·s/√n in the zero test: more for a worse gauge, less for more readings', () => {
    fc.assert(
      fc.property(varying, confidence, (values, level) => {
        const { zeroTest, standardDeviation, n } = biasOf({
          readings: values.map(thousandths),
          reference: { value: 0 },
          confidence: level,
        })
        const t = jStat.studentt.inv(1 - (1 - level) / 2, n - 1)
        expect(near(zeroTest.allowedBias, (t * (standardDeviation ?? NaN)) / Math.sqrt(n), 1e-6)).toBe(true)
      }),
      runs(18),
    )
    const wide = biasOf({ readings: [0.98, 1.02, 0.97, 1.05], reference: { value: 1 } })
    const narrow = biasOf({ readings: [0.998, 1.002, 0.997, 1.005], reference: { value: 1 } })
    expect(wide.zeroTest.allowedBias).toBeGreaterThan(9 * (narrow.zeroTest.allowedBias ?? Infinity))
  })

  it('a worse reference never helps in the rule with uncertainty', () => {
    fc.assert(
      fc.property(
        varying,
        fc.integer({ min: 0, max: 40 }),
        fc.integer({ min: 0, max: 40 }),
        (values, u, more) => {
          const of = (uncertainty: number) =>
            biasOf({
              readings: values.map(thousandths),
              reference: { value: 0, standardUncertainty: thousandths(uncertainty) },
              margin: 0.05,
            }).withUncertainty
          const [better, worse] = [of(u), of(u + more)]
          expect(Number(worse.insideMargin)).toBeLessThanOrEqual(Number(better.insideMargin))
          expect(worse.standardUncertainty).toBeGreaterThanOrEqual(better.standardUncertainty ?? Infinity)
        },
      ),
      runs(19),
    )
  })

  it('a figure equal to its limit meets it, in decimal', () => {
    // s²/n = 0.0003², u = 0.0004: the uncertainty is 0.0005, and 0.0007 + 2·0.0005 is 0.0017.
    const at = (margin: number) =>
      biasOf({
        readings: [10.0004, 10.001],
        reference: { value: 10, standardUncertainty: 0.0004 },
        margin,
      }).withUncertainty.insideMargin
    expect(at(0.0017)).toBe(true)
    expect(at(0.0016999999)).toBe(false)
  })

  it('covers the true bias with the confidence asked for, and refuses a true zero at the risk asked for', () => {
    const random = new Random(20)
    let [covered, refused, shown] = [0, 0, 0]
    const studiesRun = 4000
    for (let i = 0; i < studiesRun; i++) {
      const output = biasOf({
        readings: Array.from({ length: 8 }, () => Number((5 + 0.02 * random.normal()).toFixed(6))),
        reference: { value: 5 },
        confidence: 0.9,
        margin: 0.01,
      })
      if (output.interval && output.interval.lower <= 0 && output.interval.upper >= 0) covered++
      if (output.zeroTest.accepts === false) refused++
      // The same readings against a reference one margin away: wrongly shown equivalent in at most one of ten.
      const beside = biasOf({
        readings: Array.from({ length: 8 }, () => Number((5.01 + 0.004 * random.normal()).toFixed(6))),
        reference: { value: 5 },
        confidence: 0.9,
        margin: 0.01,
      })
      if (beside.equivalence.accepts) shown++
    }
    const within = 4.5 * Math.sqrt(studiesRun * 0.9 * 0.1)
    expect(Math.abs(covered - 0.9 * studiesRun)).toBeLessThan(within)
    expect(refused).toBe(studiesRun - covered)
    expect(Math.abs(shown - 0.1 * studiesRun)).toBeLessThan(within)
  })

  it('give lower bounds of Cg and Cgk that hold with the confidence asked for', () => {
    const random = new Random(21)
    const [trueCg, trueCgk] = [(0.2 * 1) / (6 * 0.02), (0.1 - 0.03) / (3 * 0.02)]
    let [cg, cgk] = [0, 0]
    const studiesRun = 300
    for (let i = 0; i < studiesRun; i++) {
      const output = biasOf({
        readings: Array.from({ length: 10 }, () => Number((5.03 + 0.02 * random.normal()).toFixed(6))),
        reference: { value: 5 },
        confidence: 0.9,
        tolerance: { lower: 4.5, upper: 5.5 },
      })
      if ((output.cgLowerBound ?? NaN) <= trueCg) cg++
      if ((output.cgkLowerBound ?? NaN) <= trueCgk) cgk++
    }
    const within = 4.5 * Math.sqrt(studiesRun * 0.9 * 0.1)
    expect(Math.abs(cg - 0.9 * studiesRun)).toBeLessThan(within)
    // The smaller of two exact bounds: at least the confidence.
    expect(cgk).toBeGreaterThan(0.9 * studiesRun - within)
  })
})

describe('what cannot be decided is not decided', () => {
  const decisions = ({ zeroTest, equivalence, intervalInside, withUncertainty }: BiasOutput) => [
    zeroTest.accepts,
    equivalence.accepts,
    intervalInside.accepts,
    withUncertainty.insideMargin,
  ]
  const codes = (output: BiasOutput) => output.warnings.map(({ code }) => code)

  it('with readings that do not vary', () => {
    const output = biasOf({
      readings: [5, 5, 5],
      reference: { value: 5 },
      margin: 1,
      tolerance: { lower: 4, upper: 6 },
    })
    expect(decisions(output)).toEqual([null, null, null, null])
    expect(output).toMatchObject({ standardDeviation: 0, t: null, pValue: null, cg: null, cgk: null })
    expect(codes(output)).toEqual(['below-resolution'])
  })

  it('with readings that do not vary, except by what the resolution hides', () => {
    const output = biasOf({ readings: [5, 5, 5], reference: { value: 5 }, margin: 1, resolution: 0.1 })
    expect(output.resolutionUsed).toBe(true)
    expect(output.withUncertainty.repeatability).toBeCloseTo(0.1 / Math.sqrt(12), 15)
    expect(output.withUncertainty.insideMargin).toBe(true)
    expect(decisions(output).slice(0, 3)).toEqual([null, null, null])
  })

  it('with one reading', () => {
    const output = biasOf({ readings: [5.1], reference: { value: 5 }, margin: 1 })
    expect(decisions(output)).toEqual([null, null, null, null])
    expect(codes(output)).toContain('one-reading')
  })

  it('with no margin, a tolerance of one limit, or none', () => {
    expect(codes(biasOf({ readings: [1, 2], reference: { value: 1 } }))).toEqual(
      expect.arrayContaining(['no-margin', 'no-tolerance']),
    )
    const oneSided = biasOf({ readings: [1, 2], reference: { value: 1 }, tolerance: { upper: 3 } })
    expect(codes(oneSided)).toContain('one-sided-tolerance')
    expect(oneSided.shareOfTolerance).toBeNull()
    expect(oneSided.equivalence).toMatchObject({ margin: null, accepts: null, pValue: null })
  })

  it('with a bias beyond what a number can hold', () => {
    const output = biasOf({
      readings: [-1e308, -1.1e308],
      reference: { value: 1.7e308 },
      margin: 1,
      processStandardDeviation: 1,
      tolerance: { lower: 0, upper: 1 },
    })
    expect(output.bias).toBeNull()
    expect(decisions(output)).toEqual([null, null, null, null])
    expect(output.warnings).toContainEqual(
      expect.objectContaining({ code: 'not-representable', path: 'bias' }),
    )
  })

  it('at a confidence below one half, where the interval of equivalence does not exist', () => {
    const output = biasOf({ readings: [1, 2, 3], reference: { value: 1 }, margin: 5, confidence: 0.3 })
    expect(output.equivalence).toMatchObject({ interval: null, accepts: null })
    expect(codes(output)).toContain('confidence-too-low')
  })

  it('and a reference whose uncertainty uses up the margin is named', () => {
    const of = (standardUncertainty: number) =>
      codes(biasOf({ readings: [1, 1.1], reference: { value: 1, standardUncertainty }, margin: 0.3 }))
    expect(of(0.15)).toContain('reference-uncertainty-too-large')
    expect(of(0.149)).not.toContain('reference-uncertainty-too-large')
  })
})
