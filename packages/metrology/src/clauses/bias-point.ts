import { absolute, compare, rational } from '../decimal'
import type { ClauseDescriptor } from '../types'
import { marginInUnit, marginProblems } from './baselines'
import { factsWithin, isReason, notShown, readingsFor } from './bias-facts'

/**
 * Point limit: meets when |bias| ≤ margin on the estimate alone, falls short otherwise. With the true bias at the margin
 * half of all studies meet it, however many readings they have.
 */
export const biasPoint: ClauseDescriptor<'bias-point'> = {
  type: 'bias-point',
  subject: 'bias',
  measure: 'mean',
  basis: 'estimate',
  studyKind: 'bias',
  fields: [{ name: 'margin', kind: 'margin', required: true, default: { base: 'tolerance', share: 0.05 } }],
  check: ({ parameters }, characteristic) =>
    marginProblems(parameters.margin, characteristic, 'parameters.margin'),
  rule: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return margin === null ? null : { type: 'point', margin }
  },
  options: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return margin === null ? {} : { margin }
  },
  judge: ({ parameters }, facts) => {
    const margin = marginInUnit(parameters.margin, facts.characteristic)
    if (margin === null) return notShown(facts, null, { code: 'margin-undefined' })
    const limits = { lower: -margin, upper: margin }
    const of = factsWithin(margin, facts)
    if (isReason(of)) return notShown(facts, limits, of)
    const within = compare(absolute(rational(of.bias)), rational(margin)) <= 0
    return {
      verdict: within ? 'meets' : 'falls-short',
      figure: of.bias,
      interval: null,
      limits,
      quantity: 'value',
      reason: { code: within ? 'bias-within-margin' : 'bias-beyond-margin', margin },
    }
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return readingsFor(margin === null ? null : { type: 'point', margin }, truth, power)
  },
}
