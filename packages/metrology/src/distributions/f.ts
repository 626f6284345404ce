import { betaQuantileOdds, betaTails } from './incomplete-beta'
import type { Tails } from './incomplete-gamma'

/** Both tails of the F distribution at x ≥ 0 with df1 and df2 degrees of freedom, both above 0. */
export function fTails(x: number, df1: number, df2: number): Tails {
  return betaTails((df1 / df2) * x, df1 / 2, df2 / 2)
}

/** Quantile of the F distribution for a chance strictly between 0 and 1. */
export function fQuantile(p: number, df1: number, df2: number): number {
  return (df2 / df1) * betaQuantileOdds(p, 1 - p, df1 / 2, df2 / 2)
}
