import { absolute, divide, multiply, rational, subtract, toNumber, type Rational } from '../decimal'
import { chiSquareQuantile, noncentralityAt } from '../distributions'
import { complement } from '../statistics/mean-interval'

/** Estimates of both indices, and one-sided bounds of each at one confidence. */
export interface Indices {
  cg: number | null
  cgk: number | null
  cgLowerBound: number | null
  cgkLowerBound: number | null
  cgUpperBound: number | null
  cgkUpperBound: number | null
}

/** The share of which width, spread over how many standard deviations. */
export interface IndexConvention {
  share: number
  sigmas: number
  width: Rational | null
}

const none: Indices = {
  cg: null,
  cgk: null,
  cgLowerBound: null,
  cgkLowerBound: null,
  cgUpperBound: null,
  cgkUpperBound: null,
}

/**
 * Cg = share·T/(sigmas·s) and Cgk = (share·T/2 − |bias|)/(sigmas·s/2) of a width T, each rounded once, with one-sided
 * bounds at `confidence`. Those of Cg are exact, Cg·√(χ²(p, n−1)/(n−1)) with p = alpha and 1 − alpha. Those of Cgk
 * invert the noncentral t distribution of √n·(share·T/2 − |bias|)/s for the nearer side: the lower bound, as the smaller
 * of two exact ones, holds with at least `confidence`; the upper one with at least 1 − 2·alpha where the true bias is
 * near zero, as both ends of an equivalence interval do. Null where there is no width or no spread.
 */
export function capabilityIndices(
  { share, sigmas, width }: IndexConvention,
  confidence: number,
  bias: number,
  standardDeviation: number | null,
  n: number,
): Indices {
  if (!width || standardDeviation === null) return none
  const allowance = multiply(rational(share), width)
  const room = subtract(divide(allowance, rational(2)), absolute(rational(bias)))
  const spread = multiply(rational(sigmas), rational(standardDeviation))
  const df = n - 1
  const alpha = complement(confidence)
  const cg = toNumber(divide(allowance, spread))
  const boundOfCg = (p: number) => cg * Math.sqrt(chiSquareQuantile(p, df) / df)
  const observed = Math.sqrt(n) * (toNumber(room) / standardDeviation)
  const boundOfCgk = (p: number) =>
    Number.isFinite(observed) ? noncentralityAt(observed, df, p) / Math.sqrt(n) / (sigmas / 2) : null
  return {
    cg,
    cgk: toNumber(divide(multiply(rational(2), room), spread)),
    cgLowerBound: boundOfCg(alpha),
    cgkLowerBound: boundOfCgk(confidence),
    cgUpperBound: boundOfCg(confidence),
    cgkUpperBound: boundOfCgk(alpha),
  }
}
