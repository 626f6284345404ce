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
