import { normalCdfWithin, normalReach } from '../distributions'
import type { Chances, Rule, Truth } from '../types'
import { acceptedHalfWidth, rootSumOfSquares, type Band } from './band'
import { ruleDescriptor } from './index'
import { spreadNodes, spreadSupport, type SpreadNodes, type SpreadSupport } from './spread-nodes'

/**
 * The exact chances of the three verdicts of a rule with n ≥ 2 normal readings, as a function of the truth: the
 * estimated bias is normal about the true one and independent of V = s/σ, so the chance that |bias| lies inside a
 * band is ∫ g(v)·[Φ((h(σv) − δ)/σ_b) − Φ((−h(σv) − δ)/σ_b)] dv with g the density of V. Absolute error below 1e-10.
 * Truths need a standard deviation above 0.
 */
export function chancesOf(rule: Rule, n: number): (truth: Truth) => Chances {
  const descriptor = ruleDescriptor(rule)
  const accepted = chanceInside(descriptor.accepts(rule, n), n)
  const refused = descriptor.refusesOutside(rule, n)
  const notRefused = refused ? chanceInside(refused, n) : null
  const reference = descriptor.referenceUncertainty(rule)
  return (truth) => {
    const at = located(truth, n, reference)
    const meets = accepted(at)
    const fallsShort = notRefused ? Math.max(0, 1 - notRefused(at)) : 1 - meets
    return { meets, fallsShort, notShown: notRefused ? Math.max(0, 1 - meets - fallsShort) : 0 }
  }
}

/** The chance to meet alone, as `chancesOf` gives it: half the work where nothing else is asked. */
export const chanceToMeet = (rule: Rule, n: number): ((truth: Truth) => number) =>
  chanceWithin(rule, n, ruleDescriptor(rule).accepts(rule, n))

/** A chance that the chance to meet is at least, near to it and formed faster; null where there is none. */
export function leastChanceToMeet(rule: Rule, n: number): ((truth: Truth) => number) | null {
  const band = ruleDescriptor(rule).acceptsAtLeast?.(rule, n)
  return band ? chanceWithin(rule, n, band) : null
}

function chanceWithin(rule: Rule, n: number, band: Band): (truth: Truth) => number {
  const inside = chanceInside(band, n)
  const reference = ruleDescriptor(rule).referenceUncertainty(rule)
  return (truth) => inside(located(truth, n, reference))
}

const located = ({ bias, standardDeviation }: Truth, n: number, reference: number): At => ({
  bias: Math.abs(bias),
  standardDeviation,
  spreadOfMean: rootSumOfSquares(standardDeviation / Math.sqrt(n), reference),
})

interface At {
  bias: number
  standardDeviation: number
  spreadOfMean: number
}

/** A band at the points of integration over the spread, where it accepts anything: half widths and weights. */
interface PlacedBand {
  count: number
  halfWidth: Float64Array
  weight: Float64Array
}

const noPlace = (): PlacedBand => ({ count: 0, halfWidth: new Float64Array(0), weight: new Float64Array(0) })

/** Writes a band at a spread over what `of` held before. */
function place(of: PlacedBand, band: Band, standardDeviation: number, { v, weight }: SpreadNodes): void {
  if (of.halfWidth.length < v.length) {
    of.halfWidth = new Float64Array(2 * v.length)
    of.weight = new Float64Array(2 * v.length)
  }
  of.count = 0
  for (let at = 0; at < v.length; at++) {
    const h = acceptedHalfWidth(band, standardDeviation * (v[at] as number))
    if (h < 0) continue
    of.halfWidth[of.count] = h
    of.weight[of.count] = weight[at] as number
    of.count++
  }
}

function chanceInside(band: Band, n: number): (at: At) => number {
  const whole = spreadSupport(n - 1, 1)
  const here = noPlace()
  let placedAt: number | null = null
  return (at) => {
    const { standardDeviation } = at
    const parts = partsOfPanels(band, at, whole)
    if (parts > mostParts) {
      const points = [...edges(band, standardDeviation), ...sharpPoints(band, at, whole)]
      place(here, band, standardDeviation, spreadNodes(whole, points))
      placedAt = null
    } else if (placedAt !== standardDeviation) {
      // Curves over the bias share their spread, and so their nodes.
      const support = spreadSupport(n - 1, parts)
      place(here, band, standardDeviation, spreadNodes(support, edges(band, standardDeviation)))
      placedAt = standardDeviation
    }
    return sumOver(here, at)
  }
}

function sumOver({ count, halfWidth, weight }: PlacedBand, { bias, spreadOfMean }: At): number {
  const inSpreads = 1 / spreadOfMean
  let sum = 0
  for (let at = 0; at < count; at++) {
    const h = halfWidth[at] as number
    const above = (h - bias) * inSpreads
    if (above < -normalReach) continue
    sum += (weight[at] as number) * (normalCdfWithin(above) - normalCdfWithin((-h - bias) * inSpreads))
  }
  return Math.min(1, Math.max(0, sum))
}

/** The v at which the band closes, a corner of the integrand, or ends, a step, and where it bends. */
function edges(band: Band, standardDeviation: number): number[] {
  const closed = [band.spreadAt(0), band.largestSpread].filter((s) => s !== null && s !== undefined)
  return [...closed, ...band.bends].map((s) => s / standardDeviation)
}

/** A panel holds at most six standard deviations of the steps of the two normal functions. */
const mostInPanel = 6
/** From here on it takes fewer points to split at the steps themselves, wherever the bias puts them. */
const mostParts = 6

/** Into how many parts each panel is split, so that none holds too much of a step. */
function partsOfPanels(band: Band, { standardDeviation, spreadOfMean }: At, support: SpreadSupport): number {
  const { lower, upper, panels } = support
  const rise = Math.abs(band.halfWidth(standardDeviation * upper) - band.halfWidth(standardDeviation * lower))
  return Math.max(1, Math.ceil(rise / (panels * spreadOfMean * mostInPanel)))
}

/** Break points within the steps of the two normal functions. */
function sharpPoints(band: Band, at: At, support: SpreadSupport): number[] {
  const { bias, standardDeviation, spreadOfMean } = at
  const points: number[] = []
  for (const side of [bias, -bias]) {
    for (let z = -normalReach; z <= normalReach; z += 4.5) {
      const s = band.spreadAt(side + z * spreadOfMean)
      if (s !== null) points.push(s / standardDeviation)
    }
  }
  return points.filter((v) => v > support.lower && v < support.upper)
}
