import { betaQuantileOdds, betaTails } from './incomplete-beta'
import type { Tails } from './incomplete-gamma'

/** Both tails of the beta distribution at x in [0, 1]; a, b > 0. */
export function betaDistributionTails(x: number, a: number, b: number): Tails {
  if (x <= 0) return { lower: 0, upper: 1 }
  if (x >= 1) return { lower: 1, upper: 0 }
  return betaTails(x / (1 - x), a, b)
}

/** Quantile of the beta distribution for a chance strictly between 0 and 1; a, b > 0. */
export function betaQuantile(p: number, a: number, b: number): number {
  const odds = betaQuantileOdds(p, 1 - p, a, b)
  return odds === Infinity ? 1 : odds / (1 + odds)
}
