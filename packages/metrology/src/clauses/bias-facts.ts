import type { BiasFigures, Judgement, JudgementFacts, Reason } from '../types'

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
