import { absolute, compare, multiply, rational, subtract, toNumber } from '../decimal'
import { tQuantile } from '../distributions'
import type { Interval } from '../types'

/** 1 − value in decimal, so that 1 − 0.95 is 0.05. */
export const complement = (value: number): number => toNumber(subtract(rational(1), rational(value)))

/** t(1 − alpha/2, df): the two-sided interval at confidence 1 − alpha. Domain: 0 < alpha < 1, df > 0. */
export const twoSidedCritical = (alpha: number, df: number): number => oneSidedCritical(alpha / 2, df)

/**
 * t(1 − alpha, df): each of two one-sided tests at alpha, and the two-sided interval at 1 − 2·alpha. Taken from the
 * lower tail, because 1 − alpha would lose the digits of a small alpha. Domain: 0 < alpha < 1, df > 0.
 */
export const oneSidedCritical = (alpha: number, df: number): number =>
  -tQuantile(Math.max(alpha, Number.MIN_VALUE), df)

/** The interval center ± halfWidth. */
export const intervalAround = (center: number, halfWidth: number): Interval => ({
  lower: center - halfWidth,
  upper: center + halfWidth,
})

/**
 * Where the interval center ± halfWidth lies against ± margin. An end equal to the margin is inside it; outside means
 * wholly, on one side. The distance to the margin is formed in decimal.
 */
export function positionAgainstMargin(
  center: number,
  halfWidth: number,
  margin: number,
): 'inside' | 'outside' | 'crosses' {
  const room = toNumber(subtract(rational(margin), absolute(rational(center))))
  if (halfWidth <= room) return 'inside'
  // Room below −halfWidth: even the near end is beyond the margin.
  return room < -halfWidth ? 'outside' : 'crosses'
}

/** Whether `factor` times a standard uncertainty uses up a margin alone, compared in decimal. */
export function eatsMargin(standardUncertainty: number, factor: number, margin: number): boolean {
  return compare(multiply(rational(factor), rational(standardUncertainty)), rational(margin)) >= 0
}
