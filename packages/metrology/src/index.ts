/** All computation of Evenrule: pure functions with no I/O, no clock and no randomness. */
export * from './types'
export { canonicalText } from './canonical'
export { baselineWidth, marginInUnit } from './clauses/baselines'
export { baselineKinds, fieldBounds } from './clauses/fields'
export {
  clauseBasis,
  clauseDescriptor,
  clauseDescriptors,
  clauseKey,
  clauseProblems,
  clauseSubject,
  clauseTypes,
  judgeClause,
  parseClause,
  typeKey,
} from './clauses'
export {
  allowedBias,
  consequences,
  type Consequences,
  type ConsequencesInput,
  type CurvePoint,
} from './consequences'
export { evaluate, isError } from './evaluate'
export {
  gaugeAskedFor,
  gaugeReasons,
  type GaugeAskedFor,
  type GaugeLimit,
  type GaugeReason,
} from './gauge-asked-for'
export { InvalidInput } from './input/invalid-input'
export { incentives } from './kinds/incentives'
export { operatingCharacteristic } from './kinds/operating-characteristic'
export { sampleSize } from './kinds/sample-size'
export { chancesOf } from './rules/chances'
export { studyKinds } from './studies'
export { areCompatible, convert, findUnit, units, type Unit, type UnitQuantity } from './units'
export { ENGINE_VERSION } from './version'
export { whatWouldSettle, type Settling } from './what-would-settle'
export { whatIf, whatIfInput, type WhatIf, type WhatIfChange } from './what-if'
