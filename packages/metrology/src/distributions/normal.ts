import erfc from '@stdlib/math-base-special-erfc'
import erfcinv from '@stdlib/math-base-special-erfcinv'
import erfcx from '@stdlib/math-base-special-erfcx'
import ln from '@stdlib/math-base-special-ln'

const rootHalf = Math.sqrt(0.5)
const rootTwo = Math.SQRT2

/** Standard normal distribution function. Any real z; relative error about 1e-15, also far in the lower tail. */
export function normalCdf(z: number): number {
  return 0.5 * erfc(-z * rootHalf)
}

/** Chance above z of the standard normal distribution, with the relative accuracy of `normalCdf`. */
export function normalUpperTail(z: number): number {
  return normalCdf(-z)
}

/** ln Φ(z), also where Φ(z) itself is below the range of doubles. */
export function logNormalCdf(z: number): number {
  if (z > -5) return ln(normalCdf(z))
  return ln(0.5 * erfcx(-z * rootHalf)) - 0.5 * z * z
}

/** Standard normal density over distribution function, φ(z)/Φ(z) (the inverse Mills ratio of −z). */
export function normalHazard(z: number): number {
  // φ(z)/Φ(z) = √(2/π) / erfcx(−z/√2); erfcx overflows beyond z of about 37, where the ratio is 0.
  const scaled = erfcx(-z * rootHalf)
  return Number.isFinite(scaled) ? rootTwoOverPi / scaled : 0
}

const rootTwoOverPi = 0.7978845608028654

/** Quantile of the standard normal distribution for a chance strictly between 0 and 1. */
export function normalQuantile(p: number): number {
  return p <= 0.5 ? -rootTwo * erfcinv(2 * p) : rootTwo * erfcinv(2 * (1 - p))
}
