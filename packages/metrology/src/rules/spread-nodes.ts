import exp from '@stdlib/math-base-special-exp'
import { chiConstant, logChiShape, remembered } from '../distributions'
import { nodes as legendre } from '../distributions/gauss-legendre'

/** Points of integration over V = s/σ, and their weights times the density of V. */
export interface SpreadNodes {
  v: Float64Array
  weight: Float64Array
}

/** Where V = s/σ has all but 1e-13 of its chance, and the nodes of the panels it is divided into. */
export interface SpreadSupport {
  df: number
  lower: number
  upper: number
  panels: number
  nodes: SpreadNodes
}

/** Panels of a support whose panels are whole. */
const panelCount = 8
const perPanel = 2 * legendre.length

/**
 * The support of V = s/σ on df ≥ 1 degrees of freedom, each of its panels in so many parts: its density has one peak
 * and falls off on both sides. Every curve and check at one number of readings shares it.
 */
export const spreadSupport: (df: number, parts: number) => SpreadSupport = remembered(64, (df, parts) => {
  const { lower, upper } = parts === 1 ? endsOf(df) : spreadSupport(df, 1)
  const panels = panelCount * parts
  const nodes = emptyNodes(panels)
  const constant = chiConstant(df)
  const at = (i: number) => edge(lower, upper, panels, i)
  for (let i = 0; i < panels; i++) fillPanel(nodes, i * perPanel, at(i), at(i + 1), df, constant)
  return { df, lower, upper, panels, nodes }
})

function endsOf(df: number): { lower: number; upper: number } {
  const peak = Math.sqrt((df - 1) / df)
  const floor = (peak > 0 ? logChiShape(peak, df) : 0) - 34
  const outside = (v: number) => v <= 0 || logChiShape(v, df) < floor
  return { lower: bisect(peak, 0, outside), upper: bisect(peak, peak + 12 / Math.sqrt(df), outside) }
}

/** Where panel `at` begins. */
const edge = (lower: number, upper: number, panels: number, at: number): number =>
  at === panels ? upper : lower + (at * (upper - lower)) / panels

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

/** Gauss–Legendre nodes over the support; the panels that hold a break point are split there. */
export function spreadNodes(support: SpreadSupport, breakPoints: readonly number[]): SpreadNodes {
  const { df, lower, upper, panels } = support
  const inside = breakPoints.filter((point) => point > lower && point < upper).sort((a, b) => a - b)
  if (inside.length === 0) return support.nodes
  const constant = chiConstant(df)
  const nodes = emptyNodes(panels + inside.length)
  let filled = 0
  let next = 0
  for (let i = 0; i < panels; i++) {
    const end = edge(lower, upper, panels, i + 1)
    let from = edge(lower, upper, panels, i)
    if (!((inside[next] ?? Infinity) < end)) {
      const part = [i * perPanel, (i + 1) * perPanel] as const
      nodes.v.set(support.nodes.v.subarray(...part), filled)
      nodes.weight.set(support.nodes.weight.subarray(...part), filled)
      filled += perPanel
      continue
    }
    for (; (inside[next] ?? Infinity) < end; next++) {
      const point = inside[next] as number
      filled = fillPanel(nodes, filled, from, point, df, constant)
      from = point
    }
    filled = fillPanel(nodes, filled, from, end, df, constant)
  }
  return { v: nodes.v.subarray(0, filled), weight: nodes.weight.subarray(0, filled) }
}

const emptyNodes = (panels: number): SpreadNodes => ({
  v: new Float64Array(panels * perPanel),
  weight: new Float64Array(panels * perPanel),
})

/** Writes the nodes of one panel from `at` on, and answers the place after them. */
function fillPanel(
  { v, weight }: SpreadNodes,
  at: number,
  from: number,
  to: number,
  df: number,
  constant: number,
): number {
  const center = 0.5 * (from + to)
  const half = 0.5 * (to - from)
  if (half <= 0) return at
  let place = at
  for (const [node, share] of legendre) {
    for (const sign of [-1, 1]) {
      const point = center + sign * half * node
      v[place] = point
      weight[place] = half * share * constant * exp(logChiShape(point, df))
      place++
    }
  }
  return place
}
