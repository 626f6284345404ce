import { anySize, positiveSize } from '../input/bounds'
import type { Reader } from '../input/reader'
import { readRule } from '../rules'
import { chancesOf } from '../rules/chances'
import type { OperatingCharacteristicOutput, Rule, Truth } from '../types'

/** The exact chances of the three verdicts of a rule with n readings at each assumed truth; see `chancesOf`. */
export function operatingCharacteristic(
  rule: Rule,
  n: number,
  truth: readonly Truth[],
): OperatingCharacteristicOutput {
  const chances = truth.map(chancesOf(rule, n))
  return {
    kind: 'operatingCharacteristic',
    meets: chances.map(({ meets }) => meets),
    fallsShort: chances.map(({ fallsShort }) => fallsShort),
    notShown: chances.map(({ notShown }) => notShown),
    warnings: [],
  }
}

/** Reads the input of `operatingCharacteristic` and answers it; at least one truth. */
export function readOperatingCharacteristic(reader: Reader): OperatingCharacteristicOutput {
  const rule = readRule(reader)
  const n = readDesign(reader)
  return operatingCharacteristic(rule, n, reader.objects('truth', 1).map(readTruth))
}

/** Reads `design.n`, a whole number of readings from 2 to a million. */
export function readDesign(reader: Reader): number {
  return reader.object('design').integer('n', { least: 2, most: 1_000_000 })
}

/** Reads an assumed truth: bias and standard deviation (above 0) in the unit of the rule. */
export function readTruth(reader: Reader): Truth {
  return {
    bias: reader.number('bias', anySize),
    standardDeviation: reader.number('standardDeviation', positiveSize),
  }
}
