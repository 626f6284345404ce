import { clauseDescriptor } from './clauses'
import { incentives } from './kinds/incentives'
import { acceptedHalfWidth, ruleDescriptor } from './rules'
import { chancesOf } from './rules/chances'
import type { Chances, Characteristic, Clause, IncentivesOutput, Rule, RuleAssumptions } from './types'

/** The chances of the three verdicts at one true bias. */
export interface CurvePoint extends Chances {
  bias: number
}

/** What a clause encourages and discourages; biases and spreads in the characteristic’s unit, chances from 0 to 1. */
export interface Consequences {
  rule: Rule
  /** Chances against the true bias, at the planned number of readings and the assumed spread. */
  curve: CurvePoint[]
  /** The same for a gauge of twice the spread. */
  curveAtTwiceTheSpread: CurvePoint[]
  /** The largest estimated bias that meets the clause against the number of readings, at the assumed spread. */
  allowedBias: { readings: number; allowed: number }[]
  incentives: IncentivesOutput
}

export interface ConsequencesInput {
  clause: Clause
  characteristic: Characteristic
  /** Planned number of readings, at least 2. */
  readings: number
  /** Assumed repeatability standard deviation, above 0, in the characteristic's unit. */
  standardDeviation: number
  /** What else the rule rests on, such as the uncertainty of the reference value; none where not given. */
  assumed?: RuleAssumptions
  /** True biases of the curves; by default 101 from zero to a little beyond what matters. */
  biases?: readonly number[]
  /** Numbers of readings for the allowed bias; by default from 2 to four times the planned one. */
  sizes?: readonly number[]
}

/**
 * What a clause encourages and discourages, all computed from its rule. Null for a clause that has no rule of chance
 * (documents) or whose margin the characteristic does not define.
 */
export function consequences(input: ConsequencesInput): Consequences | null {
  const { clause, characteristic, readings, standardDeviation } = input
  const rule = clauseDescriptor(clause).rule?.(clause, characteristic, input.assumed) ?? null
  if (!rule) return null
  const chances = chancesOf(rule, readings)
  const biases = input.biases ?? defaultBiases(rule, standardDeviation)
  const curve = (spread: number): CurvePoint[] =>
    biases.map((bias) => ({ bias, ...chances({ bias, standardDeviation: spread }) }))
  return {
    rule,
    curve: curve(standardDeviation),
    curveAtTwiceTheSpread: curve(2 * standardDeviation),
    allowedBias: (input.sizes ?? defaultSizes(readings)).map((size) => ({
      readings: size,
      allowed: allowedBias(rule, size, standardDeviation),
    })),
    incentives: incentives(rule, readings),
  }
}

/** The largest |bias| that a rule accepts with n readings and a sample standard deviation s; 0 where it is none. */
export function allowedBias(rule: Rule, n: number, s: number): number {
  return Math.max(0, acceptedHalfWidth(ruleDescriptor(rule).accepts(rule, n), s))
}

function defaultBiases(rule: Rule, standardDeviation: number): number[] {
  const margin = ruleDescriptor(rule).margin(rule)
  const most = margin === null ? 3 * standardDeviation : 1.6 * margin
  return Array.from({ length: 101 }, (_, i) => (most * i) / 100)
}

function defaultSizes(readings: number): number[] {
  const most = Math.max(50, 4 * readings)
  const sizes = new Set([readings])
  for (let size = 2; size <= most; size = Math.max(size + 1, Math.round(size * 1.1))) sizes.add(size)
  return [...sizes].sort((a, b) => a - b)
}
