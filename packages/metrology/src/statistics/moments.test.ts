import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { toNumber } from '../decimal'
import { dataChecks } from './data-checks'
import { moments } from './moments'

const thousandths = (integers: readonly number[]) => integers.map((value) => value / 1000)
const integers = fc.array(fc.integer({ min: -50, max: 50 }), { minLength: 2, maxLength: 40 })
const runs = { seed: 2, numRuns: 500 }

describe('mean and spread of readings', () => {
  it('are exact where the arithmetic of doubles loses everything', () => {
    const { mean, standardDeviation, lag1Autocorrelation } = moments([1e14 + 0.25, 1e14 + 0.75])
    expect(toNumber(mean)).toBe(1e14 + 0.5)
    expect(standardDeviation).toBe(Math.sqrt(0.125))
    expect(lag1Autocorrelation).toBe(-0.5)
  })

  it('do not depend on where zero lies', () => {
    fc.assert(
      fc.property(integers, fc.integer({ min: -1e9, max: 1e9 }), (values, shift) => {
        const here = moments(thousandths(values))
        const there = moments(thousandths(values.map((value) => value + shift)))
        expect(there.standardDeviation).toBe(here.standardDeviation)
        expect(there.lag1Autocorrelation).toBe(here.lag1Autocorrelation)
      }),
      runs,
    )
  })

  it('agree with two passes in plain arithmetic on harmless readings', () => {
    fc.assert(
      fc.property(integers, (values) => {
        const mean = values.reduce((a, b) => a + b) / values.length
        const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0)
        const of = moments(values)
        expect(toNumber(of.mean)).toBeCloseTo(mean, 12)
        expect(of.standardDeviation).toBeCloseTo(Math.sqrt(squares / (values.length - 1)), 12)
      }),
      runs,
    )
  })

  it('have no spread for one reading, and no autocorrelation where nothing varies', () => {
    expect(moments([5])).toMatchObject({ n: 1, standardDeviation: null, lag1Autocorrelation: null })
    expect(moments([5, 5])).toMatchObject({ n: 2, standardDeviation: 0, lag1Autocorrelation: null })
  })

  it('stay within numbers at both ends of their range', () => {
    expect(moments([1e308, -1e308]).standardDeviation).toBe(Math.SQRT2 * 1e308)
    expect(moments([5e-324, 1e-323, 5e-324]).standardDeviation).toBe(5e-324)
    expect(moments([1e308, 5e-324]).minimum).toBe(5e-324)
  })
})

describe('what a reader should know of the readings', () => {
  const codes = (readings: readonly number[], resolution?: number) =>
    dataChecks(readings, moments(readings), resolution).map(({ code }) => code)
  const calm = [20.003, 20.001, 19.998, 19.997, 20.004, 20, 19.999, 20.002, 19.996, 19.9985, 20.0015, 20.0005]

  it('is nothing where nothing is wrong', () => {
    expect(codes(calm, 0.0005)).toEqual([])
  })

  it('names fewer than ten readings', () => {
    expect(codes(calm.slice(0, 9))).toContain('few-readings')
    expect(codes(calm.slice(0, 10))).not.toContain('few-readings')
  })

  it('names readings that take three values or fewer', () => {
    expect(codes(calm.map((value) => Math.round(value * 200) / 200))).toContain('few-distinct-values')
  })

  it('names a resolution above the spread, and one equal to it not', () => {
    const { standardDeviation } = moments(calm)
    expect(codes(calm, (standardDeviation ?? 0) * 1.01)).toContain('resolution-above-spread')
    expect(codes(calm, standardDeviation ?? 0)).not.toContain('resolution-above-spread')
  })

  it('names the reading that lies far from the others, by its place', () => {
    const found = dataChecks([...calm, 20.03], moments([...calm, 20.03]), undefined)
    expect(found.find(({ code }) => code === 'outlying-reading')).toMatchObject({ readings: [calm.length] })
  })

  it('names a drift with its direction, and the likeness of neighbours', () => {
    const rising = calm.map((value, index) => value + index / 100)
    const found = dataChecks(rising, moments(rising), undefined)
    expect(found.find(({ code }) => code === 'drift')).toMatchObject({ figures: { direction: 1 } })
    expect(found.map(({ code }) => code)).toContain('autocorrelation')
    const falling = dataChecks(rising.toReversed(), moments(rising.toReversed()), undefined)
    expect(falling.find(({ code }) => code === 'drift')).toMatchObject({ figures: { direction: -1 } })
  })

  it('raises a false alarm of an outlier in about one of a hundred calm studies', async () => {
    const { Random } = await import('../../../../tests/random')
    const random = new Random(5)
    let alarms = 0
    for (let i = 0; i < 3000; i++) {
      const readings = Array.from({ length: 12 }, () => random.normal())
      if (codes(readings).includes('outlying-reading')) alarms++
    }
    // Grubbs' test at 1 %, two-sided: 30 expected, standard deviation 5.4.
    expect(alarms).toBeGreaterThan(8)
    expect(alarms).toBeLessThan(52)
  })
})
