import { compare, rational } from '../decimal'
import type { Characteristic, Tolerance } from '../types'
import { InvalidInput } from './invalid-input'
import type { Reader } from './reader'

/** Fields every kind understands, with the defaults of the contract. */
export interface CommonFields {
  unit?: string
  confidence: number
  tolerance?: Tolerance
  processStandardDeviation?: number
  resolution?: number
  margin?: number
  coverageFactor: number
  sigmas: number
}

/** Reads the fields every kind understands. Throws `InvalidInput` where one is out of bounds or limits are inverted. */
export function readCommon(reader: Reader): CommonFields {
  return {
    ...given('unit', reader.optionalText('unit')),
    ...given('tolerance', readTolerance(reader)),
    ...given('processStandardDeviation', reader.optionalNumber('processStandardDeviation', { above: 0 })),
    ...given('resolution', reader.optionalNumber('resolution', { above: 0 })),
    ...given('margin', reader.optionalNumber('margin', { above: 0 })),
    confidence: reader.optionalNumber('confidence', { above: 0, below: 1 }) ?? 0.95,
    coverageFactor: reader.optionalNumber('coverageFactor', { above: 0 }) ?? 2,
    sigmas: reader.optionalNumber('sigmas', { above: 0 }) ?? 6,
  }
}

/** The characteristic of a clause. Without a unit no margin in a unit can be formed. */
export function characteristicOf(common: CommonFields): Characteristic {
  return {
    unit: common.unit ?? '',
    ...given('tolerance', common.tolerance),
    ...given('processStandardDeviation', common.processStandardDeviation),
    ...given('resolution', common.resolution),
  }
}

function readTolerance(reader: Reader): Tolerance | undefined {
  const source = reader.optionalObject('tolerance')
  if (!source) return undefined
  const lower = source.optionalNumber('lower')
  const upper = source.optionalNumber('upper')
  if (lower === undefined && upper === undefined) {
    throw new InvalidInput('missing', 'Give a lower limit, an upper limit or both.', reader.at('tolerance'))
  }
  if (lower !== undefined && upper !== undefined && compare(rational(lower), rational(upper)) >= 0) {
    throw new InvalidInput(
      'limits-inverted',
      `The lower limit (${lower}) must be below the upper limit (${upper}).`,
      reader.at('tolerance'),
    )
  }
  return { ...given('lower', lower), ...given('upper', upper) }
}

/** The property, or nothing where there is no value: optional fields are absent, never undefined. */
export function given<K extends string, V>(name: K, value: V | undefined): { [Key in K]?: V } {
  return value === undefined ? {} : ({ [name]: value } as { [Key in K]: V })
}
