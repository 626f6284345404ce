import type { standards } from '@evenrule/api/contract'
import { standardWords as words } from '../../strings/gauges'
import { decimalForReading, withUnit } from '../parts/tolerance'

type Stated = Pick<
  standards.ReferenceStandard,
  'certifiedValue' | 'unit' | 'expandedUncertainty' | 'coverageFactor'
>

/** "23.9990 mm, U 0.0006 mm (k = 2)", or what is not stated. */
export const standardText = ({ certifiedValue, unit, expandedUncertainty, coverageFactor }: Stated): string =>
  words.value(
    withUnit(certifiedValue, unit),
    expandedUncertainty === null ? null : withUnit(expandedUncertainty, unit),
    coverageFactor === null ? null : decimalForReading(coverageFactor),
  )
