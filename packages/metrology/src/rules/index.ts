import type { Reader } from '../input/reader'
import type { Rule, RuleOf, RuleType } from '../types'
import type { RuleDescriptor } from './descriptor'
import { index } from './capability-index'
import { point } from './point'
import { equivalence, intervalInside } from './interval-rules'
import { withUncertainty } from './with-uncertainty'
import { zeroTest } from './zero-test'

const descriptors: { [T in RuleType]: RuleDescriptor<T> } = {
  'zero-test': zeroTest,
  equivalence,
  'interval-inside': intervalInside,
  point,
  index,
  'with-uncertainty': withUncertainty,
}

/** Every type of rule there is. */
export const ruleTypes = Object.keys(descriptors) as RuleType[]

/** The descriptor of a rule's own type. */
export function ruleDescriptor<T extends RuleType>(rule: RuleOf<T>): RuleDescriptor<T> {
  return descriptors[rule.type as T]
}

/** Reads the field `rule` of an input. */
export function readRule(reader: Reader): Rule {
  const source = reader.object('rule')
  const read: (reader: Reader) => Rule = descriptors[source.choice('type', ruleTypes)].read
  return read(source)
}

export type { Band } from './band'
export { acceptedHalfWidth, rootSumOfSquares } from './band'
export type { RuleDescriptor } from './descriptor'
