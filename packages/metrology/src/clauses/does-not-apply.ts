import type { ClauseDescriptor, Subject } from '../types'
import { biasEquivalence } from './bias-intervals'
import { biasIndex } from './bias-index'
import { biasWithUncertainty } from './bias-with-uncertainty'
import { calibrationInDate } from './calibration-in-date'
import { designMinimum } from './design-minimum'
import { resolutionShare } from './resolution-share'

/** Keys of all clauses that name their own subject and measure; those judged by hand have a key each. */
export const computedKeys: readonly string[] = [
  designMinimum,
  resolutionShare,
  calibrationInDate,
  biasEquivalence,
  biasIndex,
  biasWithUncertainty,
].map(({ subject, measure }) => `${subject}/${measure}`)

/**
 * Takes the wider scope's clause of a key away. It judges nothing and is never among the clauses of a submission; its
 * own key is the one it takes away.
 */
export const doesNotApply: ClauseDescriptor<'does-not-apply'> = {
  type: 'does-not-apply',
  subject: null,
  measure: null,
  // A key begins with its subject; reading the clause has seen to that.
  subjectOf: ({ parameters }) => parameters.key.split('/', 1)[0] as Subject,
  keyOf: ({ parameters }) => parameters.key,
  basis: 'document',
  studyKind: null,
  fields: [
    { name: 'key', kind: 'clause-key', required: true, choices: computedKeys },
    { name: 'reason', kind: 'text', required: true, longest: 1000, lines: true },
  ],
  check: () => [],
  judge: () => ({
    verdict: 'not-shown',
    figure: null,
    interval: null,
    limits: null,
    quantity: 'value',
    reason: { code: 'does-not-apply' },
  }),
}
