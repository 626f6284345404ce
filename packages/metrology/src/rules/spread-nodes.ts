import exp from '@stdlib/math-base-special-exp'
import { chiConstant, logChiShape } from '../distributions'
import { nodes as legendre } from '../distributions/gauss-legendre'

/** Where V = s/σ has all but 1e-13 of its chance, and the width of a panel there. */
export interface SpreadSupport {
  lower: number
  upper: number
  panel: number
}

/** A point of integration over V, its weight times the density of V. */
export interface SpreadNode {
  v: number
  weight: number
}

const panelCount = 8

/** The support of V = s/σ on df ≥ 1 degrees of freedom: its density has one peak and falls off on both sides. */
export function spreadSupport(df: number): SpreadSupport {
  const peak = Math.sqrt((df - 1) / df)
  const floor = (peak > 0 ? logChiShape(peak, df) : 0) - 34
  const outside = (v: number) => v <= 0 || logChiShape(v, df) < floor
  const lower = bisect(peak, 0, outside)
  const upper = bisect(peak, peak + 12 / Math.sqrt(df), outside)
  return { lower, upper, panel: (upper - lower) / panelCount }
}

/** The point nearest to `inner` found outside, to a thousandth of the distance; `outer` where none is. */
function bisect(inner: number, outer: number, outside: (v: number) => boolean): number {
  let [near, far] = [inner, outer]
  for (let i = 0; i < 10; i++) {
    const middle = 0.5 * (near + far)
    if (outside(middle)) far = middle
    else near = middle
  }
  return far
}

/** Gauss–Legendre nodes over the support, split at the break points inside it. */
export function spreadNodes(
  df: number,
  support: SpreadSupport,
  breakPoints: readonly number[],
): SpreadNode[] {
  const { lower, upper, panel } = support
  const points = [lower, upper]
  for (let i = 1; i < panelCount; i++) points.push(lower + i * panel)
  for (const point of breakPoints) if (point > lower && point < upper) points.push(point)
  points.sort((a, b) => a - b)
  const constant = chiConstant(df)
  const result: SpreadNode[] = []
  for (let i = 1; i < points.length; i++) {
    const from = points[i - 1] as number
    const to = points[i] as number
    const center = 0.5 * (from + to)
    const half = 0.5 * (to - from)
    if (half <= 0) continue
    for (const [node, weight] of legendre) {
      for (const v of [center - half * node, center + half * node]) {
        result.push({ v, weight: half * weight * constant * exp(logChiShape(v, df)) })
      }
    }
  }
  return result
}
