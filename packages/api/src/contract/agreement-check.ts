import {
  clauseBasis,
  clauseDescriptor,
  clauseKey,
  clauseProblems,
  type Characteristic,
  type Clause,
  type Problem,
  type ProblemCode,
} from '@evenrule/metrology'
import type { CharacteristicClass } from './characteristics'

/** A characteristic as far as clauses are checked against it; decimal text as entered. */
export interface CheckedCharacteristic {
  characteristicId: string
  lowerLimit: string | null
  upperLimit: string | null
  unit: string
  class: CharacteristicClass
  processStandardDeviation: string | null
}

/** A clause that cannot be computed for some characteristics of its scope. */
export interface ClauseWarning {
  /** Place of the clause among the clauses. */
  clause: number
  code: ProblemCode
  /** Field of the clause: `parameters.margin.base`. */
  path: string
  message: string
  /** How many characteristics it concerns. */
  count: number
  characteristicIds: string[]
}

/** A clause that asks for a second look before it is signed for characteristics of class safety. */
export interface SafetyFlag {
  clause: number
  code: 'zero-difference' | 'point-estimate'
  count: number
  characteristicIds: string[]
}

/** The characteristic as the computation takes it, in its own unit. */
export function computedCharacteristic(of: CheckedCharacteristic): Characteristic {
  const { lowerLimit, upperLimit, processStandardDeviation: spread } = of
  return {
    unit: of.unit,
    tolerance: {
      ...(lowerLimit === null ? {} : { lower: Number(lowerLimit) }),
      ...(upperLimit === null ? {} : { upper: Number(upperLimit) }),
    },
    ...(spread === null ? {} : { processStandardDeviation: Number(spread) }),
  }
}

/** Has everything a clause may refer to, so that only what is wrong with the clause itself is found. */
const complete: Characteristic = {
  unit: 'mm',
  tolerance: { lower: 0, upper: 1 },
  processStandardDeviation: 1,
}

/** What is wrong with a clause whatever it is about; empty when nothing is. */
export const problemsOfClause = (value: unknown): Problem[] =>
  clauseProblems(value, complete).filter(({ code }) => code !== 'unit-of-another-quantity')

/** Places of clauses whose subject and measure stand in an earlier clause already. */
export function repeatedClauses(clauses: readonly Clause[]): number[] {
  const keys = clauses.map(clauseKey)
  return keys.flatMap((key, place) => (keys.indexOf(key) < place ? [place] : []))
}

/** The clauses that cannot be computed for some of the characteristics, by what keeps them from it. */
export function clauseWarnings(
  clauses: readonly Clause[],
  characteristics: readonly CheckedCharacteristic[],
): ClauseWarning[] {
  const found = new Map<string, ClauseWarning>()
  clauses.forEach((clause, place) => {
    for (const of of characteristics) {
      for (const { code, path, message } of clauseProblems(clause, computedCharacteristic(of))) {
        const key = `${place} ${code} ${path} ${message}`
        const warning = found.get(key) ?? {
          clause: place,
          code,
          path,
          message,
          count: 0,
          characteristicIds: [],
        }
        warning.characteristicIds.push(of.characteristicId)
        warning.count += 1
        found.set(key, warning)
      }
    }
  })
  return [...found.values()]
}

/**
 * The warnings that keep a proposal from being sent: a clause that can be computed for none of the characteristics it
 * would apply to. For a single characteristic these are all warnings there are.
 */
export function blockingWarnings(
  warnings: readonly ClauseWarning[],
  characteristics: readonly CheckedCharacteristic[],
): ClauseWarning[] {
  const hit = (clause: number) =>
    new Set(warnings.filter((each) => each.clause === clause).flatMap((each) => each.characteristicIds))
  return warnings.filter(({ clause }) => hit(clause).size === characteristics.length)
}

/** Clauses on a point estimate or a zero-difference test that would apply to characteristics of class safety. */
export function safetyFlags(
  clauses: readonly Clause[],
  characteristics: readonly CheckedCharacteristic[],
): SafetyFlag[] {
  const safety = characteristics.filter((each) => each.class === 'safety')
  if (safety.length === 0) return []
  const characteristicIds = safety.map((each) => each.characteristicId)
  return clauses.flatMap((clause, place): SafetyFlag[] => {
    if (clauseDescriptor(clause).rule?.(clause, complete)?.type === 'zero-test')
      return [{ clause: place, code: 'zero-difference', count: characteristicIds.length, characteristicIds }]
    return clauseBasis(clause) === 'estimate'
      ? [{ clause: place, code: 'point-estimate', count: characteristicIds.length, characteristicIds }]
      : []
  })
}
