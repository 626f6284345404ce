import { positiveSize } from '../input/bounds'
import { linearBand } from './band'
import type { RuleDescriptor } from './descriptor'

/** Point limit: |bias| ≤ margin on the estimate alone. */
export const point: RuleDescriptor<'point'> = {
  type: 'point',
  read: (reader) => ({ type: 'point', margin: reader.number('margin', positiveSize) }),
  accepts: ({ margin }) => linearBand(margin, 0),
  refusesOutside: () => null,
  referenceUncertainty: () => 0,
  margin: ({ margin }) => margin,
  largestSpread: ({ margin }) => margin,
  stricter: () => null,
  powerOf: 'meets',
}

/**
 * Capability index with bias: Cgk = (share·T/2 − |bias|)/(sigmas·s/2) at least `least`, on the estimate; the same as
 * |bias| + least·sigmas/2·s ≤ share·T/2.
 */
export const index: RuleDescriptor<'index'> = {
  type: 'index',
  read: (reader) => ({
    type: 'index',
    share: reader.number('share', positiveSize),
    sigmas: reader.number('sigmas', positiveSize),
    least: reader.number('least', positiveSize),
    toleranceWidth: reader.number('toleranceWidth', positiveSize),
  }),
  accepts: (rule) => linearBand((rule.share * rule.toleranceWidth) / 2, -(rule.least * rule.sigmas) / 2),
  refusesOutside: () => null,
  referenceUncertainty: () => 0,
  margin: (rule) => (rule.share * rule.toleranceWidth) / 2,
  // A gauge whose true index is at least the one asked for.
  largestSpread: (rule, bias) =>
    ((rule.share * rule.toleranceWidth) / 2 - Math.abs(bias)) / ((rule.least * rule.sigmas) / 2),
  stricter: () => null,
  powerOf: 'meets',
}
