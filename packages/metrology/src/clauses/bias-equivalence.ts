import { sampleSize } from '../kinds/sample-size'
import {
  complement,
  eatsMargin,
  intervalAround,
  oneSidedCritical,
  positionAgainstMargin,
} from '../statistics/mean-interval'
import type { ClauseDescriptor, ReasonCode, Verdict } from '../types'
import { marginInUnit, marginProblems } from './baselines'
import { biasFacts, isReason, notShown } from './bias-facts'

const decided: Record<ReturnType<typeof positionAgainstMargin>, { verdict: Verdict; code: ReasonCode }> = {
  inside: { verdict: 'meets', code: 'interval-inside-margin' },
  outside: { verdict: 'falls-short', code: 'interval-outside-margin' },
  crosses: { verdict: 'not-shown', code: 'interval-crosses-margin' },
}

/**
 * Bias equivalent to zero within a margin, by two one-sided tests at alpha = 1 − confidence: meets when the
 * 1 − 2·alpha interval lies inside ± margin, falls short when it lies wholly outside (Schuirmann 1987).
 */
export const biasEquivalence: ClauseDescriptor<'bias-equivalence'> = {
  type: 'bias-equivalence',
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
  rule: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return margin === null ? null : { type: 'equivalence', alpha: complement(parameters.confidence), margin }
  },
  options: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return { confidence: parameters.confidence, ...(margin === null ? {} : { margin }) }
  },
  judge: ({ parameters }, facts) => {
    const margin = marginInUnit(parameters.margin, facts.characteristic)
    if (margin === null) return notShown(facts, null, { code: 'margin-undefined' })
    const limits = { lower: -margin, upper: margin }
    const of = biasFacts(facts.study)
    if (isReason(of)) return notShown(facts, limits, of)
    const { referenceStandardUncertainty: u } = of
    if (u !== null && eatsMargin(u, facts.coverageFactor, margin)) {
      return notShown(facts, limits, {
        code: 'reference-uncertainty-too-large',
        expandedUncertainty: facts.coverageFactor * u,
        margin,
      })
    }
    const halfWidth = oneSidedCritical(complement(parameters.confidence), of.n - 1) * of.standardError
    const { verdict, code } = decided[positionAgainstMargin(of.bias, halfWidth, margin)]
    return {
      verdict,
      figure: of.bias,
      interval: intervalAround(of.bias, halfWidth),
      limits,
      quantity: 'value',
      reason: { code, margin, halfWidth },
    }
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    const found =
      margin === null
        ? null
        : sampleSize({ type: 'equivalence', alpha: complement(parameters.confidence), margin }, truth, power)
    return found
      ? { readings: found.n, chance: found.power, reason: 'size-found' }
      : { readings: null, chance: null, reason: 'no-size-suffices' }
  },
}
