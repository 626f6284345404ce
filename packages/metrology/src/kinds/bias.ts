import {
  absolute,
  add,
  compare,
  divide,
  multiply,
  rational,
  squareRoot,
  subtract,
  toNumber,
  type Rational,
} from '../decimal'
import { tTails, tTwoSided } from '../distributions'
import { given, readCommon, type CommonFields } from '../input/common'
import type { Reader } from '../input/reader'
import { dataChecks } from '../statistics/data-checks'
import {
  complement,
  eatsMargin,
  intervalAround,
  oneSidedCritical,
  positionAgainstMargin,
  twoSidedCritical,
} from '../statistics/mean-interval'
import { moments } from '../statistics/moments'
import type { BiasOutput, Warning } from '../types'
import { capabilityIndices } from './bias-indices'

export interface BiasArguments extends CommonFields {
  readings: readonly number[]
  reference: { value: number; standardUncertainty?: number }
  /** Conventions of Cg and Cgk: share of a width and multiple of s; without a width that of the tolerance. */
  index: { share: number; sigmas: number; width?: number }
}

/** Reads the input of `bias`. Throws `InvalidInput` with the path of what is missing or out of bounds. */
export function readBias(reader: Reader): BiasArguments {
  const common = readCommon(reader)
  const readings = reader.numbers('readings', 1)
  const index = reader.optionalObject('index')
  return {
    ...common,
    readings,
    reference: readReference(reader),
    index: {
      share: index?.optionalNumber('share', { above: 0 }) ?? 0.2,
      sigmas: index?.optionalNumber('sigmas', { above: 0 }) ?? 6,
      ...given('width', index?.optionalNumber('width', { above: 0 })),
    },
  }
}

/** Reads `reference`: its value and, where given, its standard uncertainty (at least 0), in the unit of the readings. */
export function readReference(reader: Reader): BiasArguments['reference'] {
  const source = reader.object('reference')
  return {
    value: source.number('value'),
    ...given('standardUncertainty', source.optionalNumber('standardUncertainty', { least: 0 })),
  }
}

/**
 * Bias of a gauge from repeated readings of one reference object: estimate, spread, tests and intervals, indices,
 * all in the unit of the readings. Readings are taken as independent and normal with one spread. One-sample t test
 * and interval: Student 1908; two one-sided tests: Schuirmann 1987; indices: see `bias-indices`.
 */
export function bias(input: BiasArguments): BiasOutput {
  const { readings, reference, confidence, coverageFactor, margin, resolution } = input
  const of = moments(readings)
  const { n, standardDeviation } = of
  const degreesOfFreedom = n - 1
  const alpha = complement(confidence)
  const estimate = toNumber(subtract(of.mean, rational(reference.value)))
  const varies = standardDeviation !== null && standardDeviation !== 0
  // A difference beyond the range of numbers is told by a warning of `finish`; nothing is decided on it.
  const spread = varies && Number.isFinite(estimate) ? standardDeviation : null
  const standardError = standardDeviation === null ? null : standardDeviation / Math.sqrt(n)
  const t = spread !== null && standardError ? estimate / standardError : null
  const critical = n > 1 ? twoSidedCritical(alpha, degreesOfFreedom) : null
  const halfWidth = critical !== null && standardError !== null ? critical * standardError : null
  const width = input.index.width === undefined ? toleranceWidth(input) : rational(input.index.width)
  const { share, sigmas } = input.index
  const index = capabilityIndices({ share, sigmas, width }, confidence, estimate, spread, n)
  const uncertain = withUncertainty(input, of.variance, estimate, n)
  return {
    kind: 'bias',
    n,
    mean: toNumber(of.mean),
    reference: { value: reference.value, standardUncertainty: reference.standardUncertainty ?? null },
    bias: estimate,
    standardDeviation,
    standardError,
    degreesOfFreedom,
    confidence,
    t,
    pValue: t === null ? null : tTwoSided(t, degreesOfFreedom),
    interval: halfWidth === null ? null : intervalAround(estimate, halfWidth),
    zeroTest: {
      alpha,
      criticalValue: critical,
      allowedBias: halfWidth,
      accepts: t === null || halfWidth === null ? null : Math.abs(estimate) <= halfWidth,
    },
    equivalence: equivalence(estimate, spread, standardError, n, margin, alpha),
    intervalInside: {
      accepts:
        spread === null || halfWidth === null || margin === undefined
          ? null
          : positionAgainstMargin(estimate, halfWidth, margin) === 'inside',
    },
    index: { share, sigmas, width: width && toNumber(width) },
    ...index,
    shareOfTolerance: shareOfTolerance(estimate, input),
    shareOfProcess: shareOfProcess(estimate, input),
    resolutionUsed: uncertain.resolutionUsed,
    withUncertainty: uncertain,
    minimum: of.minimum,
    maximum: of.maximum,
    lag1Autocorrelation: of.lag1Autocorrelation,
    warnings: [
      ...inputWarnings(input),
      ...(!varies ? [noSpread(n)] : dataChecks(readings, of, resolution)),
      ...referenceWarnings(reference.standardUncertainty, coverageFactor, margin),
    ],
  }
}

function equivalence(
  estimate: number,
  spread: number | null,
  standardError: number | null,
  n: number,
  margin: number | undefined,
  alpha: number,
): BiasOutput['equivalence'] {
  const df = n - 1
  // Beyond alpha of one half the 1 − 2·alpha interval does not exist.
  const criticalValue = n > 1 && alpha <= 0.5 ? oneSidedCritical(alpha, df) : null
  const halfWidth = criticalValue !== null && standardError !== null ? criticalValue * standardError : null
  const interval = halfWidth === null ? null : intervalAround(estimate, halfWidth)
  const result = { alpha, margin: margin ?? null, criticalValue, interval }
  if (margin === undefined || spread === null || !standardError) {
    return { ...result, pLower: null, pUpper: null, pValue: null, accepts: null }
  }
  const above = toNumber(subtract(rational(estimate), rational(-margin)))
  const below = toNumber(subtract(rational(estimate), rational(margin)))
  const pLower = tTails(above / standardError, df).upper
  const pUpper = tTails(below / standardError, df).lower
  const accepts = halfWidth === null ? null : positionAgainstMargin(estimate, halfWidth, margin) === 'inside'
  return { ...result, pLower, pUpper, pValue: Math.max(pLower, pUpper), accepts }
}

/**
 * Bias with the uncertainty of the reference value, √(s²/n + u²); s is replaced by resolution/√12 where that is
 * larger (JCGM 100 for a rectangular distribution). |bias| + k·u is compared with the margin exactly.
 */
function withUncertainty(
  { reference, coverageFactor, margin, resolution }: BiasArguments,
  variance: Rational | null,
  estimate: number,
  n: number,
): BiasOutput['withUncertainty'] {
  if (variance === null) {
    return {
      repeatability: null,
      resolutionUsed: false,
      coverageFactor,
      standardUncertainty: null,
      expandedUncertainty: null,
      insideMargin: null,
    }
  }
  const step = rational(resolution ?? 0)
  const ofResolution = divide(multiply(step, step), rational(12))
  const resolutionUsed = compare(ofResolution, variance) > 0
  const repeatability = resolutionUsed ? ofResolution : variance
  const u = rational(reference.standardUncertainty ?? 0)
  const total = add(divide(repeatability, rational(n)), multiply(u, u))
  const standardUncertainty = squareRoot(total)
  const insideMargin = (): boolean | null => {
    if (margin === undefined || repeatability.numerator === 0n || !Number.isFinite(estimate)) return null
    const room = divide(subtract(rational(margin), absolute(rational(estimate))), rational(coverageFactor))
    return room.numerator >= 0n && compare(total, multiply(room, room)) <= 0
  }
  return {
    repeatability: squareRoot(repeatability),
    resolutionUsed,
    coverageFactor,
    standardUncertainty,
    expandedUncertainty: coverageFactor * standardUncertainty,
    insideMargin: insideMargin(),
  }
}

function toleranceWidth({ tolerance }: BiasArguments): Rational | null {
  const { lower, upper } = tolerance ?? {}
  return lower === undefined || upper === undefined ? null : subtract(rational(upper), rational(lower))
}

function shareOfTolerance(estimate: number, input: BiasArguments): number | null {
  const width = toleranceWidth(input)
  return width && Number.isFinite(estimate) ? toNumber(divide(absolute(rational(estimate)), width)) : null
}

function shareOfProcess(estimate: number, input: BiasArguments): number | null {
  if (input.processStandardDeviation === undefined || !Number.isFinite(estimate)) return null
  const variation = multiply(rational(input.sigmas), rational(input.processStandardDeviation))
  return toNumber(divide(absolute(rational(estimate)), variation))
}

function inputWarnings({ margin, tolerance, confidence }: BiasArguments): Warning[] {
  const warnings: Warning[] = []
  if (margin === undefined) {
    warnings.push({ code: 'no-margin', message: 'No margin is given: equivalence is not decided.' })
  }
  if (!tolerance) {
    warnings.push({
      code: 'no-tolerance',
      message: 'No tolerance is given: indices and the share of tolerance are not defined.',
    })
  } else if (tolerance.lower === undefined || tolerance.upper === undefined) {
    warnings.push({
      code: 'one-sided-tolerance',
      message:
        'The tolerance has one limit and so no width: indices and the share of tolerance are not defined.',
    })
  }
  if (confidence < 0.5) {
    warnings.push({
      code: 'confidence-too-low',
      message: 'At a confidence below one half the interval of the equivalence test does not exist.',
    })
  }
  return warnings
}

function noSpread(n: number): Warning {
  return n === 1
    ? { code: 'one-reading', message: 'One reading has no spread: nothing can be decided from it.' }
    : {
        code: 'below-resolution',
        message:
          'The readings do not vary: their spread is below the resolution, and nothing can be decided.',
      }
}

function referenceWarnings(u: number | undefined, factor: number, margin: number | undefined): Warning[] {
  if (u === undefined || margin === undefined || !eatsMargin(u, factor, margin)) return []
  return [
    {
      code: 'reference-uncertainty-too-large',
      message: 'The expanded uncertainty of the reference value uses up the whole margin.',
      figures: { expandedUncertainty: factor * u, margin },
    },
  ]
}
