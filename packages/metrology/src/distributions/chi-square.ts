import exp from '@stdlib/math-base-special-exp'
import ln from '@stdlib/math-base-special-ln'
import { findRisingRoot } from './find-root'
import { gammaTails, type Tails } from './incomplete-gamma'
import { normalQuantile } from './normal'

/** Both tails of the chi-square distribution at x ≥ 0 with df > 0 degrees of freedom. */
export function chiSquareTails(x: number, df: number): Tails {
  return gammaTails(df / 2, x / 2)
}

/**
 * Quantile of the chi-square distribution for a chance strictly between 0 and 1; df > 0. Solved for ln x from the
 * approximation of Wilson and Hilferty (1931).
 */
export function chiSquareQuantile(p: number, df: number): number {
  const useLower = p <= 0.5
  const target = ln(useLower ? p : 1 - p)
  const gap = (logX: number): number => {
    const tails = chiSquareTails(exp(logX), df)
    return useLower ? ln(tails.lower) - target : target - ln(tails.upper)
  }
  const spread = 2 / (9 * df)
  const root = 1 - spread + normalQuantile(p) * Math.sqrt(spread)
  const guess = ln(df) + 3 * ln(Math.max(root, 0.05))
  return exp(findRisingRoot(gap, guess, 0.01 * Math.sqrt(2 / df)))
}
