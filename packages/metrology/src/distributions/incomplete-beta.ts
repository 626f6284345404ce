import betainc from '@stdlib/math-base-special-betainc'
import exp from '@stdlib/math-base-special-exp'
import ln from '@stdlib/math-base-special-ln'
import { findRisingRoot } from './find-root'
import type { Tails } from './incomplete-gamma'
import { normalQuantile } from './normal'

/**
 * Regularised incomplete beta functions I_x(a, b) and 1 − I_x(a, b) at odds x/(1−x), given as odds because x or 1 − x
 * alone loses digits near an end. Domain: a, b > 0, odds ≥ 0. Relative error about 3e-14 up to a, b of 5·10⁵.
 */
export function betaTails(odds: number, a: number, b: number): Tails {
  if (odds <= 0) return { lower: 0, upper: 1 }
  if (odds === Infinity) return { lower: 1, upper: 0 }
  if (odds <= 1) {
    const x = odds / (1 + odds)
    return { lower: betainc(x, a, b), upper: betainc(x, a, b, true, true) }
  }
  const y = 1 / (1 + odds)
  return { lower: betainc(y, b, a, true, true), upper: betainc(y, b, a) }
}

/**
 * The odds x/(1−x) at which the chance below x of the beta distribution is `lower` and the chance above is `upper`
 * (they add to one; the smaller one decides, so that neither end loses digits). Solved for the logarithm of the odds.
 */
export function betaQuantileOdds(lower: number, upper: number, a: number, b: number): number {
  const useLower = lower <= upper
  const target = ln(useLower ? lower : upper)
  const gap = (logOdds: number): number => {
    const tails = betaTails(exp(logOdds), a, b)
    const value = useLower ? ln(tails.lower) - target : target - ln(tails.upper)
    return value
  }
  const width = Math.sqrt(1 / a + 1 / b)
  const z = useLower ? normalQuantile(lower) : -normalQuantile(upper)
  return exp(findRisingRoot(gap, ln(a / b) + z * width, 0.1 * width))
}
