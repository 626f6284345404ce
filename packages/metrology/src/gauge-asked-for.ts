import { clauseDescriptor } from './clauses'
import { findRoot } from './distributions'
import { ruleDescriptor } from './rules'
import { chanceToMeet } from './rules/chances'
import type { Characteristic, Clause, Rule, RuleAssumptions } from './types'

/** Why a limit of the gauge is what it is, or why there is none. */
export const gaugeReasons = [
  'found',
  /** The clause is met with this chance whatever the spread: it does not limit the spread at all. */
  'any-spread',
  /** Not even the finest gauge without bias meets it with this chance. */
  'no-spread',
  /** A gauge of this spread does not meet it with this chance even without bias. */
  'not-without-bias',
  'own-spread-unknown',
] as const
export type GaugeReason = (typeof gaugeReasons)[number]

/** A limit in the characteristic's unit; null where there is none, with the reason. */
export interface GaugeLimit {
  value: number | null
  reason: GaugeReason
}

/** The gauge a clause asks for. Everything is in the characteristic's unit. */
export interface GaugeAskedFor {
  rule: Rule
  readings: number
  chance: number
  /** The largest repeatability standard deviation with which a gauge without bias meets the clause; any smaller does too. */
  spread: GaugeLimit
  /** The largest true bias, either way, at the gauge's own spread; any smaller one meets it too. */
  bias: GaugeLimit
  /** The clause allows a gauge of twice the own spread a larger bias: it asks for a worse gauge. */
  biasGrowsWithSpread: boolean
}

/** Chances closer than this count as equal: the accuracy they are computed with. */
const accuracy = 1e-9

/**
 * The largest repeatability spread at no bias, and the largest bias at the gauge's own spread, that still meet a clause
 * with the wanted chance in a study of so many readings: roots of the operating characteristic. Domain: readings at
 * least 2, chance between 0 and 1, spreads in the characteristic's unit. Null for a clause without a rule of chance, or
 * whose margin the characteristic does not define.
 */
export function gaugeAskedFor(
  clause: Clause,
  characteristic: Characteristic,
  readings: number,
  chance: number,
  ownStandardDeviation?: number,
  assumed?: RuleAssumptions,
): GaugeAskedFor | null {
  const rule = clauseDescriptor(clause).rule?.(clause, characteristic, assumed) ?? null
  if (!rule) return null
  const meets = chanceToMeet(rule, readings)
  const margin = ruleDescriptor(rule).margin(rule)
  const ofBias = (standardDeviation: number): GaugeLimit =>
    largestBias((bias) => meets({ bias, standardDeviation }) - chance, margin ?? standardDeviation)
  const known = ownStandardDeviation !== undefined && ownStandardDeviation > 0
  const bias: GaugeLimit = known
    ? ofBias(ownStandardDeviation)
    : { value: null, reason: 'own-spread-unknown' }
  const atTwice = known ? ofBias(2 * ownStandardDeviation).value : null
  return {
    rule,
    readings,
    chance,
    spread: largestSpread((standardDeviation) => meets({ bias: 0, standardDeviation }) - chance, margin),
    bias,
    biasGrowsWithSpread: atTwice !== null && atTwice > (bias.value ?? 0) * (1 + accuracy),
  }
}

/** `surplus` is the chance at a spread less the wanted one; it falls as the spread grows, or does not depend on it. */
function largestSpread(surplus: (standardDeviation: number) => number, margin: number | null): GaugeLimit {
  // A rule without a margin knows the bias in spreads only: without bias every spread is alike.
  if (margin === null) {
    return { value: null, reason: surplus(1) >= -accuracy ? 'any-spread' : 'no-spread' }
  }
  const smallest = 1e-6 * margin
  if (surplus(smallest) < 0) return { value: null, reason: 'no-spread' }
  return crossing(surplus, smallest)
}

/** `surplus` is the chance at a bias less the wanted one; it falls as the bias grows. */
function largestBias(surplus: (bias: number) => number, scale: number): GaugeLimit {
  const without = surplus(0)
  if (without < -accuracy) return { value: null, reason: 'not-without-bias' }
  if (without <= accuracy) return { value: 0, reason: 'found' }
  const smallest = 1e-6 * scale
  if (surplus(smallest) < 0) return { value: findRoot(surplus, 0, smallest, 1e-13), reason: 'found' }
  return crossing(surplus, smallest)
}

/** The first place above `from`, where the surplus is not negative, at which it crosses zero. */
function crossing(surplus: (value: number) => number, from: number): GaugeLimit {
  let [low, high] = [from, 2 * from]
  // Sixty doublings reach far beyond what any margin allows.
  for (let i = 0; i < 60 && surplus(high) >= 0; i++) [low, high] = [high, 2 * high]
  if (surplus(high) >= 0) return { value: null, reason: 'any-spread' }
  return { value: findRoot(surplus, low, high, 1e-13), reason: 'found' }
}
