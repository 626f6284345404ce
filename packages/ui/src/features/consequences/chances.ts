import {
  allowedBias,
  chancesOf,
  clauseDescriptor,
  type Chances,
  type Characteristic,
  type Clause,
  type CurvePoint,
  type Rule,
} from '@evenrule/metrology'
import type { Assumptions } from './assumptions'

/** The rule of chance a clause stands for; null where it has none, or the characteristic does not define its margin. */
export const ruleOf = (
  clause: Clause,
  characteristic: Characteristic,
  { referenceStandardUncertainty }: Pick<Assumptions, 'referenceStandardUncertainty'>,
): Rule | null =>
  clauseDescriptor(clause).rule?.(clause, characteristic, {
    ...(referenceStandardUncertainty === undefined ? {} : { referenceStandardUncertainty }),
  }) ?? null

/** The largest true bias that a rule is meant to accept; null where it names none. */
export function meantMargin(rule: Rule): number | null {
  if ('margin' in rule) return rule.margin
  return rule.type === 'index' ? (rule.share * rule.toleranceWidth) / 2 : null
}

/** `count` points from zero to `most`, both included. */
export const steps = (most: number, count: number): number[] =>
  Array.from({ length: count }, (_, at) => (most * at) / (count - 1))

/** The margin a rule was agreed with, to be marked on a plot; null where it has none of its own. */
export const markedMargin = (rule: Rule): number | null => ('margin' in rule ? rule.margin : null)

/** The bias that matters to a rule at a spread: its margin, or where an index reaches its least value. */
function tellingBias(rule: Rule, standardDeviation: number): number {
  if (rule.type !== 'index') return markedMargin(rule) ?? 0
  return (rule.share * rule.toleranceWidth - rule.least * rule.sigmas * standardDeviation) / 2
}

/** How far the curves over the bias reach: beyond what matters to any of the rules. */
export const biasReach = (rules: readonly Rule[], standardDeviation: number): number =>
  Math.max(2.4 * standardDeviation, ...rules.map((rule) => 1.6 * tellingBias(rule, standardDeviation)))

/** The chances of the three verdicts against the true bias. */
export function biasCurve(
  rule: Rule,
  { readings, standardDeviation }: Assumptions,
  biases: readonly number[],
): CurvePoint[] {
  const chances = chancesOf(rule, readings)
  return biases.map((bias) => ({ bias, ...chances({ bias, standardDeviation }) }))
}

/** The chances of the three verdicts against the true spread, at one true bias. */
export function spreadCurve(
  rule: Rule,
  { readings }: Pick<Assumptions, 'readings'>,
  bias: number,
  spreads: readonly number[],
): (Chances & { spread: number })[] {
  const chances = chancesOf(rule, readings)
  return spreads.map((standardDeviation) => ({
    spread: standardDeviation,
    ...chances({ bias, standardDeviation }),
  }))
}

/** The largest estimated bias that meets the rule, for each number of readings. */
export const allowedCurve = (rule: Rule, sizes: readonly number[], standardDeviation: number): number[] =>
  sizes.map((size) => allowedBias(rule, size, standardDeviation))

/** Numbers of readings from a few to `most`, closer together where they are few. */
export function sizesUpTo(most: number, planned: number): number[] {
  const sizes = new Set([planned])
  for (let size = 5; size <= most; size = Math.max(size + 1, Math.round(size * 1.1))) sizes.add(size)
  return [...sizes].sort((a, b) => a - b)
}
