import { betaQuantileOdds, betaTails } from './incomplete-beta'
import type { Tails } from './incomplete-gamma'

/** Both tails of Student's t distribution at t with df > 0 degrees of freedom; each to about 1e-13 of itself. */
export function tTails(t: number, df: number): Tails {
  // t² / df is the odds of a beta variable with ½ and df/2.
  const scaled = t / Math.sqrt(df)
  const beyond = 0.5 * betaTails(scaled * scaled, 0.5, df / 2).upper
  return t < 0 ? { lower: beyond, upper: 1 - beyond } : { lower: 1 - beyond, upper: beyond }
}

/** Chance beyond ±|t|: the p value of a two-sided t test. */
export function tTwoSided(t: number, df: number): number {
  const scaled = t / Math.sqrt(df)
  return betaTails(scaled * scaled, 0.5, df / 2).upper
}

/**
 * Quantile of Student's t distribution for a chance strictly between 0 and 1; df > 0. Near the middle the central
 * chance is inverted instead of the tail, which would lose the digits of a small t.
 */
export function tQuantile(p: number, df: number): number {
  if (p === 0.5) return 0
  // 0.5 − p and 1 − p are exact where they are used.
  const tail = p < 0.5 ? p : 1 - p
  const odds = betaQuantileOdds(2 * Math.abs(0.5 - p), 2 * tail, 0.5, df / 2)
  const size = Math.sqrt(df) * Math.sqrt(odds)
  return p < 0.5 ? -size : size
}
