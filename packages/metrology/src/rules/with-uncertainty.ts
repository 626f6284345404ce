import { notNegativeSize, positiveSize } from '../input/bounds'
import { uncertaintyBand } from './band'
import type { RuleDescriptor } from './descriptor'

/**
 * Bias plus its expanded uncertainty within a margin: |bias| + k·√(s²/n + u²) ≤ margin meets, |bias| less the
 * expanded uncertainty above the margin falls short. The error of the reference value is random over certificates.
 */
export const withUncertainty: RuleDescriptor<'with-uncertainty'> = {
  type: 'with-uncertainty',
  read: (reader) => ({
    type: 'with-uncertainty',
    margin: reader.number('margin', positiveSize),
    referenceStandardUncertainty: reader.number('referenceStandardUncertainty', notNegativeSize),
    coverageFactor: reader.optionalNumber('coverageFactor', positiveSize) ?? 2,
  }),
  accepts: (rule, n) =>
    uncertaintyBand(rule.margin, -rule.coverageFactor, n, rule.referenceStandardUncertainty),
  refusesOutside: (rule, n) =>
    uncertaintyBand(rule.margin, rule.coverageFactor, n, rule.referenceStandardUncertainty),
  referenceUncertainty: (rule) => rule.referenceStandardUncertainty,
  margin: ({ margin }) => margin,
  largestSpread: ({ margin }) => margin,
  stricter: () => null,
  powerOf: 'meets',
}
