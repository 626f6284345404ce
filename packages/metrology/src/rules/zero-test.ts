import { twoSidedCritical } from '../statistics/mean-interval'
import { linearBand } from './band'
import type { RuleDescriptor } from './descriptor'

/**
 * Zero-difference test: accepts when |t| ≤ t(1 − alpha/2, n − 1), that is |bias| ≤ t·s/√n. One-sample t test
 * (Student 1908). It has no margin; its power is the chance to refuse.
 */
export const zeroTest: RuleDescriptor<'zero-test'> = {
  type: 'zero-test',
  read: (reader) => ({ type: 'zero-test', alpha: reader.number('alpha', { above: 0, below: 1 }) }),
  accepts: ({ alpha }, n) => linearBand(0, twoSidedCritical(alpha, n - 1) / Math.sqrt(n)),
  refusesOutside: () => null,
  referenceUncertainty: () => 0,
  margin: () => null,
  largestSpread: () => null,
  stricter: (rule) => ({ ...rule, alpha: rule.alpha / 2 }),
  powerOf: 'fallsShort',
}
