import { multiply, rational, subtract, toNumber, type Rational } from '../decimal'
import type { Characteristic, Margin, Problem, ProblemCode, ReasonCode } from '../types'
import { convertExactly, findUnit } from '../units'

/** Process variation is taken as six process standard deviations throughout the clauses. */
const sigmasOfProcess = 6

export type Baseline = 'tolerance' | 'process'

/** The width a share refers to, in the characteristic's unit; null where the characteristic does not have it. */
export function baselineWidth(base: Baseline, of: Characteristic): Rational | null {
  if (base === 'process') {
    const sigma = of.processStandardDeviation
    return sigma === undefined ? null : multiply(rational(sigmasOfProcess), rational(sigma))
  }
  const { lower, upper } = of.tolerance ?? {}
  return lower === undefined || upper === undefined ? null : subtract(rational(upper), rational(lower))
}

/** Why a baseline is not there: the same code for a problem before signing and a reason afterwards. */
export function missingBaseline(base: Baseline): ProblemCode & ReasonCode {
  return base === 'process' ? 'no-process-spread' : 'no-tolerance-width'
}

export function baselineProblems(base: Baseline, of: Characteristic, path: string): Problem[] {
  if (baselineWidth(base, of)) return []
  return [
    {
      code: missingBaseline(base),
      path,
      message:
        base === 'process'
          ? 'No standard deviation of the process is known; name a share of tolerance or an absolute value instead.'
          : 'There is no two-sided tolerance to take a share of; name a share of process variation or an absolute value instead.',
    },
  ]
}

/** A margin in the characteristic's unit; null where it cannot be formed there (see `marginProblems`). */
export function marginInUnit(margin: Margin, of: Characteristic): number | null {
  if (margin.base === 'absolute') {
    const converted = convertExactly(rational(margin.value), margin.unit, of.unit)
    return converted && toNumber(converted)
  }
  const width = baselineWidth(margin.base, of)
  return width && toNumber(multiply(rational(margin.share), width))
}

export function marginProblems(margin: Margin, of: Characteristic, path: string): Problem[] {
  if (margin.base !== 'absolute') return baselineProblems(margin.base, of, `${path}.base`)
  if (marginInUnit(margin, of) !== null) return []
  const unitPath = `${path}.unit`
  return findUnit(margin.unit)
    ? [
        {
          code: 'unit-of-another-quantity',
          path: unitPath,
          message: `A margin in ${margin.unit} cannot limit a characteristic in ${of.unit}.`,
        },
      ]
    : [
        {
          code: 'unit-unknown',
          path: unitPath,
          message: `The unit ${margin.unit} is not in the list of units.`,
        },
      ]
}
