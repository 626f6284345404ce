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

/** What keeps a share of a baseline from being formed for a characteristic, at `path`; empty where nothing does. */
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
  const exact = exactMargin(margin, of)
  const value = exact && toNumber(exact)
  return value !== null && value > 0 && Number.isFinite(value) ? value : null
}

function exactMargin(margin: Margin, of: Characteristic): Rational | null {
  if (margin.base === 'absolute') return convertExactly(rational(margin.value), margin.unit, of.unit)
  const width = baselineWidth(margin.base, of)
  return width && multiply(rational(margin.share), width)
}

/** What keeps a margin from being formed in the characteristic’s unit, with paths below `path`; empty where nothing does. */
export function marginProblems(margin: Margin, of: Characteristic, path: string): Problem[] {
  const exact = exactMargin(margin, of)
  if (exact)
    return sizeProblems(toNumber(exact), of, `${path}.${margin.base === 'absolute' ? 'value' : 'share'}`)
  if (margin.base !== 'absolute') return baselineProblems(margin.base, of, `${path}.base`)
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

/** A margin so small or large in the characteristic's unit that no number holds it. */
function sizeProblems(value: number, of: Characteristic, path: string): Problem[] {
  if (value > 0 && Number.isFinite(value)) return []
  const code = value > 0 ? 'too-large' : 'too-small'
  return [
    {
      code,
      path,
      message: `The margin is ${code === 'too-large' ? 'too large' : 'too small'} to be written in ${of.unit}.`,
    },
  ]
}
