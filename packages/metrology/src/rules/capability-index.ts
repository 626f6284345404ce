import { chiSquareQuantile, noncentralTQuantile, noncentralTQuantileNear, remembered } from '../distributions'
import { positiveSize } from '../input/bounds'
import { given } from '../input/common'
import { complement } from '../statistics/mean-interval'
import type { RuleOf } from '../types'
import { linearBand, type Band } from './band'
import type { RuleDescriptor } from './descriptor'

type Index = RuleOf<'index'>

/** What a bias may take up where there is no spread. */
const allowance = ({ share, toleranceWidth }: Index): number => (share * toleranceWidth) / 2

/** How many s beside the bias an index of `least` leaves no room for. */
const halfSpread = ({ least, sigmas }: Index): number => (least * sigmas) / 2

/** The standard deviation at which a true bias leaves the true indices exactly the least asked for. */
export const spreadAtLeast = (rule: Index, bias: number): number =>
  Math.min(
    (allowance(rule) - Math.abs(bias)) / halfSpread(rule),
    rule.leastCg === undefined ? Infinity : (2 * allowance(rule)) / (rule.leastCg * rule.sigmas),
  )

/**
 * A bound is there to keep out a gauge whose true indices are just the least: those it is meant to accept are better by
 * about a tenth.
 */
const marginOfSafety = 0.9

/** The tolerance factor t(p; n − 1, √n·half)/√n of the noncentral t distribution. */
const toleranceFactor = remembered(
  512,
  (p: number, n: number, half: number) => noncentralTQuantile(p, n - 1, Math.sqrt(n) * half) / Math.sqrt(n),
)

/** A factor at least as large that is formed at once, for p from ½; infinite where there is none. */
function largerFactor(p: number, n: number, half: number): number {
  const near = noncentralTQuantileNear(p, n - 1, Math.sqrt(n) * half)
  // The approximation falls short of the quantile by less than a tenth of 1/df there.
  return near === null ? Infinity : (near / Math.sqrt(n)) * (1 + 0.2 / (n - 1))
}

/**
 * |bias| + factor·s ≤ allowance, and s at most what Cg allows. On the estimate the factor is least·sigmas/2; on a bound at
 * `p` it is the tolerance factor, and the spread that Cg allows shrinks or grows by √(χ²(1 − p; n − 1)/(n − 1)), as the
 * bounds of `capabilityIndices` do.
 */
function band(rule: Index, n: number, p: number | null, factorOf = toleranceFactor): Band {
  const half = halfSpread(rule)
  const factor = p === null ? half : factorOf(p, n, half)
  const ofCg = rule.leastCg === undefined ? null : (2 * allowance(rule)) / (rule.leastCg * rule.sigmas)
  const shrunk = p === null ? 1 : Math.sqrt(chiSquareQuantile(complement(p), n - 1) / (n - 1))
  return {
    ...linearBand(allowance(rule), -factor),
    ...(ofCg !== null && { largestSpread: ofCg * shrunk }),
  }
}

/**
 * Capability indices: Cgk = (share·T/2 − |bias|)/(sigmas·s/2) at least `least` and, where asked for, Cg =
 * share·T/(sigmas·s) at least `leastCg`; on the estimate, or with alpha on one-sided bounds at 1 − alpha. On bounds it
 * falls short where an upper bound stays below the least, otherwise wherever it does not meet.
 */
export const index: RuleDescriptor<'index'> = {
  type: 'index',
  read: (reader) => ({
    type: 'index',
    share: reader.number('share', positiveSize),
    sigmas: reader.number('sigmas', positiveSize),
    least: reader.number('least', positiveSize),
    toleranceWidth: reader.number('toleranceWidth', positiveSize),
    ...given('leastCg', reader.optionalNumber('leastCg', positiveSize)),
    ...given('alpha', reader.optionalNumber('alpha', { above: 0, most: 0.5 })),
  }),
  accepts: (rule, n) => band(rule, n, rule.alpha === undefined ? null : complement(rule.alpha)),
  acceptsAtLeast: (rule, n) =>
    rule.alpha === undefined ? null : band(rule, n, complement(rule.alpha), largerFactor),
  refusesOutside: (rule, n) => (rule.alpha === undefined ? null : band(rule, n, rule.alpha)),
  referenceUncertainty: () => 0,
  margin: allowance,
  largestSpread: (rule, bias) =>
    rule.alpha === undefined ? spreadAtLeast(rule, bias) : marginOfSafety * spreadAtLeast(rule, bias),
  stricter: (rule) => (rule.alpha === undefined ? null : { ...rule, alpha: rule.alpha / 2 }),
  powerOf: 'meets',
}
