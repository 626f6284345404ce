import exp from '@stdlib/math-base-special-exp'
import gammainc from '@stdlib/math-base-special-gammainc'
import ln from '@stdlib/math-base-special-ln'
import log1pmx from '@stdlib/math-base-special-log1pmx'
import { scaledGamma } from './scaled-gamma'

/** Both tails of a distribution at one point; each keeps its own relative accuracy. */
export interface Tails {
  lower: number
  upper: number
}

/**
 * From here on the own series and fraction are used. @stdlib's incomplete gamma function is good to about 2e-14 up
 * to a = 300 and wrong by up to 2 % from about 1,000.
 */
const ownFrom = 100

/**
 * Regularised incomplete gamma functions P(a, x) and Q(a, x). Domain: a > 0, x ≥ 0. Relative error about 1e-14 for
 * the smaller tail up to a of 10⁶. Series and continued fraction: NIST Digital Library of Mathematical Functions,
 * 8.11.4 and 8.9.2; the prefix x^a·e^(−x)/Γ(a) is formed from ln(1 + μ) − μ, which keeps its digits for large a.
 */
export function gammaTails(a: number, x: number): Tails {
  if (x <= 0) return { lower: 0, upper: 1 }
  if (x === Infinity) return { lower: 1, upper: 0 }
  if (a < ownFrom) return { lower: gammainc(x, a), upper: gammainc(x, a, true, true) }
  const prefix = gammaPrefix(a, x)
  if (x < a + 1) {
    const lower = prefix * lowerSeries(a, x)
    return { lower, upper: 1 - lower }
  }
  const upper = prefix * upperFraction(a, x)
  return { lower: 1 - upper, upper }
}

/** x^a·e^(−x)/Γ(a) */
function gammaPrefix(a: number, x: number): number {
  const ratio = x / a
  // ln(x/a) − (x/a − 1): where x is far below a nothing cancels, and (x − a)/a could be rounded to −1.
  const exponent = ratio < 0.25 ? ln(ratio) - (ratio - 1) : log1pmx((x - a) / a)
  return (Math.sqrt(a / twoPi) * exp(a * exponent)) / scaledGamma(a)
}

/** Σ x^k / (a(a+1)…(a+k)) */
function lowerSeries(a: number, x: number): number {
  let term = 1 / a
  let sum = term
  for (let k = 1; term > sum * 1e-17; k++) {
    term *= x / (a + k)
    sum += term
  }
  return sum
}

/** Lentz's method for the continued fraction 1/(x+1−a− 1(1−a)/(x+3−a− 2(2−a)/(x+5−a− …))). */
function upperFraction(a: number, x: number): number {
  let b = x + 1 - a
  let d = 1 / b
  let c = 1e300
  let result = d
  for (let i = 1; i < 1_000_000; i++) {
    const numerator = -i * (i - a)
    b += 2
    d = 1 / (numerator * d + b)
    c = b + numerator / c
    const change = c * d
    result *= change
    if (Math.abs(change - 1) < 1e-16) break
  }
  return result
}

const twoPi = 6.283185307179586
