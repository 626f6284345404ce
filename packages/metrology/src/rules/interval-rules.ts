import { positiveSize } from '../input/bounds'
import type { Bounds, Reader } from '../input/reader'
import { oneSidedCritical, twoSidedCritical } from '../statistics/mean-interval'
import { linearBand, type Band } from './band'
import type { RuleDescriptor } from './descriptor'

interface Interval {
  alpha: number
  margin: number
}

/** |bias| + κ·s ≤ margin meets; the interval wholly outside on one side, |bias| − κ·s > margin, falls short. */
const inside = (margin: number, factor: number): Band => linearBand(margin, -factor)
const outside = (margin: number, factor: number): Band => linearBand(margin, factor)

const readInterval = (reader: Reader, bounds: Bounds): Interval => ({
  alpha: reader.number('alpha', { above: 0, ...bounds }),
  margin: reader.number('margin', positiveSize),
})

const equivalenceFactor = (alpha: number, n: number) => oneSidedCritical(alpha, n - 1) / Math.sqrt(n)
const intervalFactor = (alpha: number, n: number) => twoSidedCritical(alpha, n - 1) / Math.sqrt(n)

/** What both rules share: a margin, and the chance to meet as their power. */
const common = {
  referenceUncertainty: () => 0,
  margin: ({ margin }: Interval) => margin,
  // A gauge whose spread exceeds the margin itself is none these rules are meant to accept.
  largestSpread: ({ margin }: Interval) => margin,
  powerOf: 'meets' as const,
}

/**
 * Equivalence: two one-sided tests at alpha, the same as the 1 − 2·alpha interval inside ± margin (Schuirmann,
 * Journal of Pharmacokinetics and Biopharmaceutics 15, 1987). alpha at most ½, where the interval is a point.
 */
export const equivalence: RuleDescriptor<'equivalence'> = {
  ...common,
  type: 'equivalence',
  read: (reader) => ({ type: 'equivalence', ...readInterval(reader, { most: 0.5 }) }),
  accepts: ({ alpha, margin }, n) => inside(margin, equivalenceFactor(alpha, n)),
  refusesOutside: ({ alpha, margin }, n) => outside(margin, equivalenceFactor(alpha, n)),
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 }),
}

/** The two-sided 1 − alpha interval inside ± margin: equivalence at half the level. */
export const intervalInside: RuleDescriptor<'interval-inside'> = {
  ...common,
  type: 'interval-inside',
  read: (reader) => ({ type: 'interval-inside', ...readInterval(reader, { below: 1 }) }),
  accepts: ({ alpha, margin }, n) => inside(margin, intervalFactor(alpha, n)),
  refusesOutside: ({ alpha, margin }, n) => outside(margin, intervalFactor(alpha, n)),
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 }),
}
