import exp from '@stdlib/math-base-special-exp'
import ln from '@stdlib/math-base-special-ln'
import { chiConstant, logChiShape } from './chi-density'
import { findRisingRoot } from './find-root'
import { integrate } from './gauss-legendre'
import type { Tails } from './incomplete-gamma'
import { normalCdf } from './normal'

/**
 * Both tails of the studentised range: the range of `groups` ≥ 2 standard normal variables over an independent s/σ on
 * `df` degrees of freedom, at q ≥ 0. Relative error about 1e-8 of the smaller tail for df ≥ 1 and up to some hundred
 * groups. Integral over s/σ of the distribution of the range: Tukey 1953; Lund and Lund, Applied Statistics 32 (1983),
 * algorithm AS 190.
 */
export function studentizedRangeTails(q: number, groups: number, df: number): Tails {
  if (!(q > 0)) return { lower: 0, upper: 1 }
  const upper = overSpread((w) => rangeUpperTail(w, groups), q, df)
  if (upper <= 0.5) return { lower: 1 - upper, upper }
  const lower = overSpread((w) => rangeCdf(w, groups), q, df)
  return { lower, upper: 1 - lower }
}

/** Quantile of the studentised range for a chance strictly between 0 and 1. */
export function studentizedRangeQuantile(p: number, groups: number, df: number): number {
  const useLower = p <= 0.5
  const target = ln(useLower ? p : 1 - p)
  const gap = (logQ: number): number => {
    const tails = studentizedRangeTails(exp(logQ), groups, df)
    return useLower ? ln(tails.lower) - target : target - ln(tails.upper)
  }
  return exp(findRisingRoot(gap, 1, 0.5, 1e-11))
}

/** ∫ g(v)·tail(q·v) dv over u = ln v around the one peak of the integrand, so that far tails keep their digits. */
function overSpread(tail: (w: number) => number, q: number, df: number): number {
  const height = (u: number): number => {
    const v = exp(u)
    const chance = tail(q * v)
    return chance > 0 ? logChiShape(v, df) + u + ln(chance) : -Infinity
  }
  const step = 1 / Math.sqrt(df)
  // Where the range is far beyond anything likely, a small v brings it back to where its tail is a number.
  const { peak, top } = climb(height, Math.min(0, ln(10 / q)), step)
  if (!(top > -700)) return 0
  const left = fall(height, peak, top, -step)
  const right = fall(height, peak, top, step)
  // Panels grow with the distance from the peak.
  const towards = (end: number, count: number) =>
    Array.from({ length: count }, (_, i) => peak + (end - peak) * squared((i + 1) / count))
  const points = [...towards(left, 8).reverse(), peak, ...towards(right, 6)]
  return chiConstant(df) * exp(top) * integrate((u) => exp(height(u) - top), points)
}

/** Roughly the highest point: steps uphill, doubled while they lead up, halved at the top. */
function climb(height: (u: number) => number, from: number, width: number): { peak: number; top: number } {
  let peak = from
  let top = height(from)
  for (let step = width; step > 0.05 * width;) {
    const next = [peak - step, peak + step].map((u) => ({ u, height: height(u) }))
    const best = next.reduce((a, b) => (b.height > a.height ? b : a))
    if (best.height > top) {
      peak = best.u
      top = best.height
      step *= 2
    } else {
      step /= 2
    }
    if (Math.abs(peak) > 700) break
  }
  return { peak, top }
}

/** Where the integrand has fallen to 10⁻¹³ of its peak, going out from it in the direction of `step`. */
function fall(height: (u: number) => number, peak: number, top: number, step: number): number {
  let inner = 0
  let outer = step
  for (let i = 0; i < 60 && height(peak + outer) > top - 30; i++) {
    inner = outer
    outer *= 2
  }
  for (let i = 0; i < 6; i++) {
    const middle = 0.5 * (inner + outer)
    if (height(peak + middle) > top - 30) inner = middle
    else outer = middle
  }
  return peak + outer
}

/** Chance that the range of `groups` standard normal variables is at most w: k∫φ(z)·[Φ(z) − Φ(z − w)]^(k−1) dz. */
function rangeCdf(w: number, groups: number): number {
  const inner = (z: number): number => density(z) * wholePower(between(z, w), groups - 1)
  return Math.min(1, groups * integrate(inner, largestValue(w)))
}

/**
 * Chance that it is above w: k∫φ(z)·{Φ(z)^(k−1) − [Φ(z) − Φ(z − w)]^(k−1)} dz, the difference of powers written as
 * Φ(z − w) times a sum of positive terms, so that nothing cancels.
 */
function rangeUpperTail(w: number, groups: number): number {
  const inner = (z: number): number => {
    const all = normalCdf(z)
    const below = normalCdf(z - w)
    const near = between(z, w)
    let sum = 0
    for (let i = 0, power = 1; i < groups - 1; i++) {
      sum = sum * near + power
      power *= all
    }
    return density(z) * below * sum
  }
  return Math.min(1, groups * integrate(inner, largestValue(w)))
}

/** Φ(z) − Φ(z − w) for w > 0, from the tail in which it does not cancel, and by its density where w is small. */
function between(z: number, w: number): number {
  if (w < 1e-3) {
    const middle = z - 0.5 * w
    return w * density(middle) * (1 + (w * w * (middle * middle - 1)) / 24)
  }
  return z - w > 0 ? normalCdf(w - z) - normalCdf(-z) : normalCdf(z) - normalCdf(z - w)
}

/** Panels over the largest of the variables: nine standard deviations about where it can be for a range of w. */
function largestValue(w: number): number[] {
  const from = Math.min(-9, 0.5 * w - 9)
  const to = Math.max(9, 0.5 * w + 9)
  const count = Math.ceil((to - from) / 1.5)
  return Array.from({ length: count + 1 }, (_, i) => from + ((to - from) * i) / count)
}

/** base^power by repeated squaring, for a whole power of zero or above. */
function wholePower(base: number, power: number): number {
  let result = 1
  for (let square = base, left = power; left > 0; left = Math.floor(left / 2)) {
    if (left % 2 === 1) result *= square
    square *= square
  }
  return result
}

const density = (z: number): number => 0.3989422804014327 * exp(-0.5 * z * z)

const squared = (value: number): number => value * value
