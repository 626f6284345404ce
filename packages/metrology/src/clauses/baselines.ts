import { convertExactly, findUnit } from '../units'
import { multiply, rational, subtract, toNumber, type Rational } from '../decimal'
import type { AgreedBaseline, Characteristic, Margin, Problem, ProblemCode, ReasonCode } from '../types'

/** Process variation is taken as six process standard deviations throughout the clauses. */
const sigmasOfProcess = 6

export type Baseline = 'tolerance' | 'process'

/**
 * The width a share refers to, in the characteristic's unit; null where the characteristic does not have it. A
 * tolerance with one limit has the width that was agreed in its stead, where one was.
 */
export function baselineWidth(base: Baseline, of: Characteristic, agreed?: AgreedBaseline): Rational | null {
  if (base === 'process') return processWidth(of)
  const { lower, upper } = of.tolerance ?? {}
  if (lower !== undefined && upper !== undefined) return subtract(rational(upper), rational(lower))
  return agreed && isOneSided(of) ? agreedWidth(agreed, of) : null
}

function processWidth({ processStandardDeviation: sigma }: Characteristic): Rational | null {
  return sigma === undefined ? null : multiply(rational(sigmasOfProcess), rational(sigma))
}

/** Whether the tolerance has exactly one limit. */
const isOneSided = ({ tolerance }: Characteristic): boolean =>
  tolerance !== undefined && (tolerance.lower === undefined) !== (tolerance.upper === undefined)

/** What stands in for the width of a one-sided tolerance; null where it cannot be formed or is no width. */
function agreedWidth(agreed: AgreedBaseline, of: Characteristic): Rational | null {
  const width = formed(agreed, of)
  return width && width.numerator > 0n ? width : null
}

function formed(agreed: AgreedBaseline, of: Characteristic): Rational | null {
  if (agreed.kind === 'process') return processWidth(of)
  if (agreed.kind === 'absolute') return convertExactly(rational(agreed.value), agreed.unit, of.unit)
  const { lower, upper } = of.tolerance ?? {}
  const bound = rational(agreed.value)
  if (upper !== undefined) return subtract(rational(upper), bound)
  return lower === undefined ? null : subtract(bound, rational(lower))
}

/** Why a baseline is not there: the same code for a problem before signing and a reason afterwards. */
export function missingBaseline(base: Baseline): ProblemCode & ReasonCode {
  return base === 'process' ? 'no-process-spread' : 'no-tolerance-width'
}

/**
 * What keeps a share of a baseline from being formed for a characteristic; empty where nothing does. `paths` are those
 * of the base and of what was agreed to stand in for the width.
 */
export function baselineProblems(
  base: Baseline,
  of: Characteristic,
  paths: { base: string; agreed: string },
  agreed?: AgreedBaseline,
): Problem[] {
  if (agreed?.kind === 'absolute' && !findUnit(agreed.unit))
    return [unitProblem(agreed.unit, of, `${paths.agreed}.unit`)]
  if (baselineWidth(base, of, agreed)) return []
  if (base === 'tolerance' && agreed && isOneSided(of)) return [agreedProblem(agreed, of, paths.agreed)]
  return [
    {
      code: missingBaseline(base),
      path: paths.base,
      message:
        base === 'process'
          ? 'No standard deviation of the process is known; name a share of tolerance or an absolute value instead.'
          : 'There is no two-sided tolerance to take a share of; agree what stands in for its width, or name a share of process variation or an absolute value instead.',
    },
  ]
}

function agreedProblem(agreed: AgreedBaseline, of: Characteristic, path: string): Problem {
  if (agreed.kind === 'process') {
    return {
      code: 'no-process-spread',
      path: `${path}.kind`,
      message: 'No standard deviation of the process is known to stand in for the width of the tolerance.',
    }
  }
  if (agreed.kind === 'absolute') return unitProblem(agreed.unit, of, `${path}.unit`)
  const side = of.tolerance?.upper === undefined ? 'above the lower limit' : 'below the upper limit'
  return {
    code: 'bound-beyond-limit',
    path: `${path}.value`,
    message: `The natural bound must lie ${side} of the characteristic.`,
  }
}

/** A margin in the characteristic's unit; null where it cannot be formed there (see `marginProblems`). */
export function marginInUnit(margin: Margin, of: Characteristic): number | null {
  const exact = exactMargin(margin, of)
  const value = exact && toNumber(exact)
  return value !== null && value > 0 && Number.isFinite(value) ? value : null
}

/** What was agreed to stand in for the width of a one-sided tolerance, where a margin names it. */
const agreedFor = (margin: Margin): AgreedBaseline | undefined =>
  margin.base === 'tolerance' ? margin.baseline : undefined

function exactMargin(margin: Margin, of: Characteristic): Rational | null {
  if (margin.base === 'absolute') return convertExactly(rational(margin.value), margin.unit, of.unit)
  const width = baselineWidth(margin.base, of, agreedFor(margin))
  return width && multiply(rational(margin.share), width)
}

/** What keeps a margin from being formed in the characteristic’s unit, with paths below `path`; empty where nothing does. */
export function marginProblems(margin: Margin, of: Characteristic, path: string): Problem[] {
  if (margin.base !== 'absolute') {
    const paths = { base: `${path}.base`, agreed: `${path}.baseline` }
    const problems = baselineProblems(margin.base, of, paths, agreedFor(margin))
    if (problems.length > 0) return problems
  }
  const exact = exactMargin(margin, of)
  if (exact)
    return sizeProblems(toNumber(exact), of, `${path}.${margin.base === 'absolute' ? 'value' : 'share'}`)
  return margin.base === 'absolute' ? [unitProblem(margin.unit, of, `${path}.unit`)] : []
}

/** A unit that is not in the list, or measures something else than the characteristic. */
function unitProblem(unit: string, of: Characteristic, path: string): Problem {
  return findUnit(unit)
    ? {
        code: 'unit-of-another-quantity',
        path,
        message: `A value in ${unit} cannot limit a characteristic in ${of.unit}.`,
      }
    : { code: 'unit-unknown', path, message: `The unit ${unit} is not in the list of units.` }
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
