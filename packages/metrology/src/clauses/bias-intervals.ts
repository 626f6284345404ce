import {
  complement,
  intervalAround,
  oneSidedCritical,
  positionAgainstMargin,
  twoSidedCritical,
} from '../statistics/mean-interval'
import type { ClauseDescriptor, Judgement, JudgementFacts, Margin, ReasonCode, Rule, Verdict } from '../types'
import { marginInUnit, marginProblems } from './baselines'
import { factsWithin, isReason, notShown, readingsFor } from './bias-facts'

type IntervalType = 'bias-equivalence' | 'bias-interval-inside'

const decided: Record<ReturnType<typeof positionAgainstMargin>, { verdict: Verdict; code: ReasonCode }> = {
  inside: { verdict: 'meets', code: 'interval-inside-margin' },
  outside: { verdict: 'falls-short', code: 'interval-outside-margin' },
  crosses: { verdict: 'not-shown', code: 'interval-crosses-margin' },
}

/** What the two clauses on an interval of the bias share; they differ in the t quantile that makes the interval. */
function intervalClause<T extends IntervalType>(
  type: T,
  rule: 'equivalence' | 'interval-inside',
  critical: (alpha: number, df: number) => number,
): ClauseDescriptor<T> {
  const ruleOf = (confidence: number, inUnit: number | null): Rule | null =>
    inUnit === null ? null : { type: rule, alpha: complement(confidence), margin: inUnit }
  const judge = (
    { margin: agreed, confidence }: { margin: Margin; confidence: number },
    facts: JudgementFacts,
  ): Judgement => {
    const margin = marginInUnit(agreed, facts.characteristic)
    if (margin === null) return notShown(facts, null, { code: 'margin-undefined' })
    const limits = { lower: -margin, upper: margin }
    const of = factsWithin(margin, facts)
    if (isReason(of)) return notShown(facts, limits, of)
    const halfWidth = critical(complement(confidence), of.n - 1) * of.standardError
    const { verdict, code } = decided[positionAgainstMargin(of.bias, halfWidth, margin)]
    return {
      verdict,
      figure: of.bias,
      interval: intervalAround(of.bias, halfWidth),
      limits,
      quantity: 'value',
      reason: { code, margin, halfWidth },
    }
  }
  return {
    type,
    subject: 'bias',
    measure: 'mean',
    basis: 'bound',
    studyKind: 'bias',
    fields: [
      { name: 'margin', kind: 'margin', required: true, default: { base: 'tolerance', share: 0.05 } },
      { name: 'confidence', kind: 'confidence', required: true, default: 0.95 },
    ],
    check: ({ parameters }, characteristic) =>
      marginProblems(parameters.margin, characteristic, 'parameters.margin'),
    rule: ({ parameters }, characteristic) =>
      ruleOf(parameters.confidence, marginInUnit(parameters.margin, characteristic)),
    options: ({ parameters }, characteristic) => {
      const margin = marginInUnit(parameters.margin, characteristic)
      return { confidence: parameters.confidence, ...(margin === null ? {} : { margin }) }
    },
    judge: ({ parameters }, facts) => judge(parameters, facts),
    readingsNeeded: ({ parameters }, characteristic, truth, power) =>
      readingsFor(
        ruleOf(parameters.confidence, marginInUnit(parameters.margin, characteristic)),
        truth,
        power,
      ),
  }
}

/**
 * Bias equivalent to zero within a margin, by two one-sided tests at alpha = 1 − confidence: meets when the
 * 1 − 2·alpha interval lies inside ± margin, falls short when it lies wholly outside (Schuirmann 1987).
 */
export const biasEquivalence = intervalClause('bias-equivalence', 'equivalence', oneSidedCritical)

/**
 * The two-sided interval of the bias at `confidence` inside ± margin: equivalence at half its alpha, and so stricter
 * than equivalence at the same confidence.
 */
export const biasIntervalInside = intervalClause('bias-interval-inside', 'interval-inside', twoSidedCritical)
