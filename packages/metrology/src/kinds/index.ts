import type { Reader } from '../input/reader'
import type { Kind, OutputByKind } from '../types'
import { bias, readBias } from './bias'
import { clause } from './clause'
import { distribution } from './distribution'
import { readIncentives } from './incentives'
import { judge } from './judge'
import { readOperatingCharacteristic } from './operating-characteristic'
import { readSampleSize } from './sample-size'
import { summary } from './summary'

/** Every kind of evaluation: reads its input and answers. A new one is a file beside this and a line here. */
export const kinds: { [K in Kind]: (reader: Reader) => OutputByKind[K] } = {
  summary,
  bias: (reader) => bias(readBias(reader)),
  operatingCharacteristic: readOperatingCharacteristic,
  sampleSize: readSampleSize,
  incentives: readIncentives,
  judge,
  distribution,
  clause,
}
