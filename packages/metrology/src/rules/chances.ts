import { normalCdf } from '../distributions'
import type { Chances, Rule, Truth } from '../types'
import { acceptedHalfWidth, rootSumOfSquares, type Band } from './band'
import { ruleDescriptor } from './index'
import { spreadNodes, type SpreadNode, type SpreadSupport, spreadSupport } from './spread-nodes'

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
export function chanceToMeet(rule: Rule, n: number): (truth: Truth) => number {
  const descriptor = ruleDescriptor(rule)
  const accepted = chanceInside(descriptor.accepts(rule, n), n)
  const reference = descriptor.referenceUncertainty(rule)
  return (truth) => accepted(located(truth, n, reference))
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

/** Beyond nine standard deviations Φ is 0 or 1 to 1e-19. */
const reach = 9

function chanceInside(band: Band, n: number): (at: At) => number {
  const df = n - 1
  const support = spreadSupport(df)
  let plain: { standardDeviation: number; nodes: readonly SpreadNode[] } | null = null
  return (at) => {
    const { bias, standardDeviation, spreadOfMean } = at
    const sharp = sharpPoints(band, at, support)
    let nodes: readonly SpreadNode[]
    if (sharp.length > 0) {
      nodes = spreadNodes(df, support, [...edges(band, standardDeviation), ...sharp])
    } else {
      // Curves over the bias share their spread, and so their nodes.
      if (plain?.standardDeviation !== standardDeviation) {
        plain = { standardDeviation, nodes: spreadNodes(df, support, edges(band, standardDeviation)) }
      }
      nodes = plain.nodes
    }
    let sum = 0
    for (const { v, weight } of nodes) {
      const h = acceptedHalfWidth(band, standardDeviation * v)
      if (h < 0) continue
      const above = (h - bias) / spreadOfMean
      const below = (h + bias) / spreadOfMean
      if (above < -reach) continue
      sum += weight * ((above > reach ? 1 : normalCdf(above)) - (below > reach ? 0 : normalCdf(-below)))
    }
    return Math.min(1, Math.max(0, sum))
  }
}

/** The v at which the band closes, a corner of the integrand, or ends, a step, and where it bends. */
function edges(band: Band, standardDeviation: number): number[] {
  const closed = [band.spreadAt(0), band.largestSpread].filter((s) => s !== null && s !== undefined)
  return [...closed, ...band.bends].map((s) => s / standardDeviation)
}

/** Break points within the steps of the two normal functions where these are sharper than the panels resolve. */
function sharpPoints(band: Band, at: At, support: SpreadSupport): number[] {
  const { bias, standardDeviation, spreadOfMean } = at
  const slope =
    Math.abs(
      band.halfWidth(standardDeviation * support.upper) - band.halfWidth(standardDeviation * support.lower),
    ) /
    ((support.upper - support.lower) * spreadOfMean)
  if (!(slope * support.panel > 6)) return []
  const points: number[] = []
  for (const side of [bias, -bias]) {
    for (let z = -reach; z <= reach; z += 4.5) {
      const s = band.spreadAt(side + z * spreadOfMean)
      if (s !== null) points.push(s / standardDeviation)
    }
  }
  return points.filter((v) => v > support.lower && v < support.upper)
}
