import exp from '@stdlib/math-base-special-exp'
import ln from '@stdlib/math-base-special-ln'
import { chiConstant, chiMean, logChiShape } from './chi-density'
import { chiSquareQuantile } from './chi-square'
import { findRisingRoot } from './find-root'
import { integrate } from './gauss-legendre'
import type { Tails } from './incomplete-gamma'
import { logNormalCdf, normalHazard, normalQuantile } from './normal'
import { tQuantile, tTails } from './student-t'

/**
 * Both tails of the noncentral t distribution: T = (Z + noncentrality)/V with Z standard normal and V = s/σ on df > 0
 * degrees of freedom, any real t. P(T ≤ t) = ∫ g(v)·Φ(t·v − noncentrality) dv is integrated over ln v around its one
 * peak, so that far tails keep their relative accuracy (about 1e-12). The definition is that of Johnson, Kotz and
 * Balakrishnan, Continuous Univariate Distributions 2 (1995), chapter 31.
 */
export function noncentralTTails(t: number, df: number, noncentrality: number): Tails {
  if (noncentrality === 0) return tTails(t, df)
  const lower = below(t, df, noncentrality)
  if (lower <= 0.5) return { lower, upper: 1 - lower }
  const upper = below(-t, df, -noncentrality)
  return { lower: 1 - upper, upper }
}

/** P(T ≤ t), accurate relatively where it is small. */
function below(t: number, df: number, shift: number): number {
  // ln of the integrand over u = ln v, but for the constant of the density: one peak for every t and shift.
  const height = (u: number): number => {
    const v = exp(u)
    return logChiShape(v, df) + u + logNormalCdf(t * v - shift)
  }
  const slope = (u: number): number => {
    const v = exp(u)
    return df * (1 - v) * (1 + v) + t * v * normalHazard(t * v - shift)
  }
  const peak = findRisingRoot((u) => -slope(u), 0, 0.5, 1e-3)
  const top = height(peak)
  // Far below the smallest number, also where the peak itself is found only roughly.
  if (top < -2000) return 0
  const left = fallPoint(height, peak, -1 / Math.sqrt(df))
  const right = fallPoint(height, peak, 1 / Math.sqrt(df))
  const points = [...panels(left, peak, 7), ...panels(peak, right, 5), right]
  const width = Math.min(peak - left, right - peak) / 5
  const sharp = transitionPoints(t, shift, left, right, width)
  const ascending = [...points, ...sharp].sort((a, b) => a - b)
  const area = integrate((u) => exp(height(u) - top), ascending)
  return exp(top + ln(area * chiConstant(df)))
}

/** Where the integrand has fallen to about 10⁻¹⁸ of its peak, going out from it in the direction of `step`. */
function fallPoint(height: (u: number) => number, peak: number, step: number): number {
  const floor = height(peak) - 42
  let inner = 0
  let outer = step
  while (height(peak + outer) > floor) {
    inner = outer
    outer *= 2
  }
  for (let i = 0; i < 12; i++) {
    const middle = 0.5 * (inner + outer)
    if (height(peak + middle) > floor) inner = middle
    else outer = middle
  }
  return peak + outer
}

function panels(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, i) => from + ((to - from) * i) / count)
}

/** Break points inside the step of Φ(t·v − shift), where it is sharper than the panels are wide. */
function transitionPoints(t: number, shift: number, left: number, right: number, width: number): number[] {
  const points: number[] = []
  for (let x = -9; x <= 9; x += 1.5) {
    const v = (x + shift) / t
    if (!(v > 0)) continue
    const u = ln(v)
    if (u > left && u < right && 1.5 / Math.abs(t * v) < width) points.push(u)
  }
  return points
}

/**
 * The tail on the side of a chance that is sought: the lower one up to one half, the upper one above. A clearly smaller
 * tail is integrated alone, which is half the work; near one half it is the complement of the smaller one.
 */
function smallTail(p: number): (t: number, df: number, noncentrality: number) => number {
  const useLower = p <= 0.5
  if (Math.min(p, 1 - p) > 0.4) {
    return (t, df, noncentrality) => {
      const { lower, upper } = noncentralTTails(t, df, noncentrality)
      return useLower ? lower : upper
    }
  }
  return useLower ? below : (t, df, noncentrality) => below(-t, df, -noncentrality)
}

/** Roots of tails that are themselves good to about 1e-12. */
const rootTolerance = 1e-14

/**
 * Quantile of the noncentral t distribution for a chance strictly between 0 and 1. Starts from the approximation of
 * Jennett and Welch.
 */
export function noncentralTQuantile(p: number, df: number, noncentrality: number): number {
  if (noncentrality === 0) return tQuantile(p, df)
  const useLower = p <= 0.5
  const target = ln(useLower ? p : 1 - p)
  const tail = smallTail(p)
  const gap = (t: number): number =>
    useLower ? ln(tail(t, df, noncentrality)) - target : target - ln(tail(t, df, noncentrality))
  const width = Math.sqrt(1 + (0.5 * noncentrality * noncentrality) / df)
  const near = noncentralTQuantileNear(p, df, noncentrality)
  return near === null
    ? findRisingRoot(gap, noncentrality + normalQuantile(p) * width, 0.2 * width, rootTolerance)
    : findRisingRoot(gap, near, nearness(df) * width, rootTolerance)
}

/** How far an approximation that takes V for normal may be off, in standard deviations of what is sought. */
const nearness = (df: number): number => Math.min(0.2, 0.5 / Math.sqrt(df))

/**
 * The quantile to 1/(5·df) of itself for chances from a half to 0.9, never too small by more, from taking Z − t·V for normal (Jennett and Welch, Supplement to the Journal
 * of the Royal Statistical Society 6, 1939); null where the approximation has none.
 */
export function noncentralTQuantileNear(p: number, df: number, noncentrality: number): number | null {
  const z = normalQuantile(p)
  const mean = chiMean(df)
  const variance = (1 - mean) * (1 + mean)
  const divisor = mean * mean - z * z * variance
  const inRoot = mean * mean + variance * (noncentrality * noncentrality - z * z)
  return divisor > 0 && inRoot >= 0 ? (noncentrality * mean + z * Math.sqrt(inRoot)) / divisor : null
}

/**
 * The noncentrality at which `t` is the quantile of the chance `p`: P(T ≤ t) falls from 1 to 0 as the noncentrality
 * grows, so there is one. For p = confidence it is the one-sided lower confidence bound of the noncentrality.
 */
export function noncentralityAt(t: number, df: number, p: number): number {
  // The normal part no longer counts: T is noncentrality / V, and V² · df is chi-square.
  if (Math.abs(t) > 1e7) return t * Math.sqrt(chiSquareQuantile(t > 0 ? 1 - p : p, df) / df)
  const useLower = p <= 0.5
  const target = ln(useLower ? p : 1 - p)
  const tail = smallTail(p)
  const gap = (noncentrality: number): number =>
    useLower ? target - ln(tail(t, df, noncentrality)) : ln(tail(t, df, noncentrality)) - target
  const width = Math.sqrt(1 + (0.5 * t * t) / df)
  const mean = chiMean(df)
  const near = t * mean - normalQuantile(p) * Math.sqrt(1 + t * t * (1 - mean) * (1 + mean))
  return findRisingRoot(gap, near, nearness(df) * width, 1e-13)
}
