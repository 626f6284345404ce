import type { Reader } from '../input/reader'
import type { RuleOf, RuleType } from '../types'
import type { Band } from './band'

/** Everything the chances, sample sizes and incentives need to know of one decision rule. */
export interface RuleDescriptor<T extends RuleType> {
  type: T
  read(reader: Reader): RuleOf<T>
  /** What the rule accepts with n readings: meets. */
  accepts(rule: RuleOf<T>, n: number): Band
  /** A part of that band which is formed much faster; null, or left out, where there is none. */
  acceptsAtLeast?(rule: RuleOf<T>, n: number): Band | null
  /** Outside this band it falls short; null where whatever does not meet falls short. */
  refusesOutside(rule: RuleOf<T>, n: number): Band | null
  /** Standard uncertainty of the reference value, random over certificates, that adds to that of the mean. */
  referenceUncertainty(rule: RuleOf<T>): number
  /** The half width of the true biases the rule is meant to accept; null where it names none. */
  margin(rule: RuleOf<T>): number | null
  /** The largest true standard deviation it is meant to accept at a true bias; null where any is. */
  largestSpread(rule: RuleOf<T>, bias: number): number | null
  /** The same rule at half the risk level; null where it has none. */
  stricter(rule: RuleOf<T>): RuleOf<T> | null
  /** The wish a sample size serves: a large chance to meet, or a large chance to refuse (zero test). */
  powerOf: 'meets' | 'fallsShort'
}
