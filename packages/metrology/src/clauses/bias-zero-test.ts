import { complement, intervalAround, twoSidedCritical } from '../statistics/mean-interval'
import type { ClauseDescriptor } from '../types'
import { biasFacts, isReason, notShown } from './bias-facts'

/**
 * Zero-difference test: meets when |bias| ≤ t(1 − alpha/2, n − 1)·s/√n (one-sample t test, Student 1908), falls short
 * otherwise. The bias it allows grows with the spread and shrinks with the readings; see `incentives`.
 */
export const biasZeroTest: ClauseDescriptor<'bias-zero-test'> = {
  type: 'bias-zero-test',
  subject: 'bias',
  measure: 'mean',
  basis: 'estimate',
  studyKind: 'bias',
  fields: [{ name: 'alpha', kind: 'alpha', required: true, default: 0.05 }],
  check: () => [],
  rule: ({ parameters }) => ({ type: 'zero-test', alpha: parameters.alpha }),
  options: ({ parameters }) => ({ confidence: complement(parameters.alpha) }),
  judge: ({ parameters }, facts) => {
    const of = biasFacts(facts.study)
    if (isReason(of)) return notShown(facts, null, of)
    const allowed = twoSidedCritical(parameters.alpha, of.n - 1) * of.standardError
    const within = Math.abs(of.bias) <= allowed
    return {
      verdict: within ? 'meets' : 'falls-short',
      figure: of.bias,
      interval: intervalAround(of.bias, allowed),
      limits: { lower: -allowed, upper: allowed },
      quantity: 'value',
      reason: { code: within ? 'bias-within-allowed' : 'bias-beyond-allowed', allowed },
    }
  },
  // More readings only lower the chance to meet it; at no bias it is 1 − alpha at any number.
  readingsNeeded: () => ({ readings: null, chance: null, reason: 'size-does-not-help' }),
}
