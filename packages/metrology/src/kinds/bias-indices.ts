import { absolute, divide, multiply, rational, subtract, toNumber } from '../decimal'
import { chiSquareQuantile, noncentralityAt } from '../distributions'
import { complement } from '../statistics/mean-interval'
import type { Tolerance } from '../types'

interface Indices {
  cg: number | null
  cgk: number | null
  cgLowerBound: number | null
  cgkLowerBound: number | null
}

/**
 * Cg = share·T/(sigmas·s) and Cgk = (share·T/2 − |bias|)/(sigmas·s/2) of a two-sided tolerance of width T, with
 * one-sided lower bounds at `confidence`. The bound of Cg is exact, Cg·√(χ²(alpha, n−1)/(n−1)). That of Cgk inverts
 * the noncentral t distribution of √n·(share·T/2 − |bias|)/s for the nearer side; as the smaller of two exact bounds
 * it holds with at least `confidence`. Null where there is no width or no spread.
 */
export function capabilityIndices(
  input: { tolerance?: Tolerance; index: { share: number; sigmas: number }; confidence: number },
  bias: number,
  standardDeviation: number | null,
  n: number,
): Indices {
  const { tolerance, index, confidence } = input
  if (tolerance?.lower === undefined || tolerance.upper === undefined || standardDeviation === null) {
    return { cg: null, cgk: null, cgLowerBound: null, cgkLowerBound: null }
  }
  const width = subtract(rational(tolerance.upper), rational(tolerance.lower))
  const allowance = multiply(rational(index.share), width)
  const room = toNumber(subtract(divide(allowance, rational(2)), absolute(rational(bias))))
  const df = n - 1
  const halfSpread = (index.sigmas / 2) * standardDeviation
  const cg = toNumber(allowance) / (2 * halfSpread)
  const bound = chiSquareQuantile(complement(confidence), df) / df
  const observed = Math.sqrt(n) * (room / standardDeviation)
  return {
    cg,
    cgk: room / halfSpread,
    cgLowerBound: cg * Math.sqrt(bound),
    cgkLowerBound: Number.isFinite(observed)
      ? noncentralityAt(observed, df, confidence) / Math.sqrt(n) / (index.sigmas / 2)
      : null,
  }
}
