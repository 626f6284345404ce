import { divide, rational, squareRoot, multiply, add } from '../decimal'
import { sampleSize } from '../kinds/sample-size'
import { eatsMargin } from '../statistics/mean-interval'
import type { BiasFigures, Judgement, JudgementFacts, ReadingsNeeded, Reason, Rule, Truth } from '../types'

/** What a bias clause is judged on: estimate, spread and size of the study. */
export interface BiasFacts {
  n: number
  bias: number
  standardDeviation: number
  standardError: number
  referenceStandardUncertainty: number | null
}

/**
 * The facts of a bias study, or the reason why nothing can be judged on it: no study, one reading, no spread, or a
 * figure beyond what can be computed with.
 */
export function biasFacts(study: BiasFigures | null): BiasFacts | Reason {
  if (!study) return { code: 'no-study' }
  const { n, bias, standardDeviation, reference } = study
  if (n < 2) return { code: 'one-reading' }
  if (standardDeviation === 0) return { code: 'zero-spread' }
  if (standardDeviation === null || bias === null || !Number.isFinite(bias))
    return { code: 'not-representable' }
  return {
    n,
    bias,
    standardDeviation,
    standardError: standardDeviation / Math.sqrt(n),
    referenceStandardUncertainty: reference.standardUncertainty,
  }
}

/**
 * The facts of a bias study for a clause with a margin: not to be judged either where the expanded uncertainty of the
 * reference value alone uses up the margin.
 */
export function factsWithin(margin: number, { study, coverageFactor }: JudgementFacts): BiasFacts | Reason {
  const of = biasFacts(study)
  if (isReason(of)) return of
  const u = of.referenceStandardUncertainty
  return u !== null && eatsMargin(u, coverageFactor, margin)
    ? { code: 'reference-uncertainty-too-large', expandedUncertainty: coverageFactor * u, margin }
    : of
}

/** Whether the facts of a study are a reason why there are none. */
export const isReason = (value: object): value is Reason => 'code' in value

/** A bias clause that cannot be judged: the figure is shown where there is one. */
export function notShown({ study }: JudgementFacts, limits: Judgement['limits'], reason: Reason): Judgement {
  return {
    verdict: 'not-shown',
    figure: study?.bias ?? null,
    interval: null,
    limits,
    quantity: 'value',
    reason,
  }
}

/**
 * Standard uncertainty of the bias, √(s²/n + u²), s the larger of the standard deviation and resolution/√12. Taken from
 * the evaluation of the study where it is at hand, which forms it without rounding in between.
 */
export function standardUncertaintyOf(of: BiasFacts, u: number, facts: JudgementFacts): number {
  const evaluated = facts.study?.withUncertainty?.standardUncertainty
  if (evaluated != null) return evaluated
  const square = (value: number) => multiply(rational(value), rational(value))
  const step = divide(square(facts.characteristic.resolution ?? 0), rational(12))
  const spread = square(of.standardDeviation)
  const larger = step.numerator * spread.denominator > spread.numerator * step.denominator ? step : spread
  return squareRoot(add(divide(larger, rational(of.n)), square(u)))
}

/** The least study for a rule; none where the characteristic does not define it or no number suffices. */
export function readingsFor(rule: Rule | null, truth: Truth, power: number): ReadingsNeeded {
  const found = rule && sampleSize(rule, truth, power)
  return found
    ? { readings: found.n, chance: found.power, reason: 'size-found' }
    : { readings: null, chance: null, reason: 'no-size-suffices' }
}
