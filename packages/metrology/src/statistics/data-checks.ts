import { tQuantile, tTwoSided } from '../distributions'
import type { Warning } from '../types'
import type { Moments } from './moments'

/**
 * What a reader should know of repeated readings of one object before trusting their spread. None of it changes a
 * verdict. Needs at least two readings that differ; indices are zero-based places in the order of reading.
 */
export function dataChecks(
  readings: readonly number[],
  of: Moments,
  resolution: number | undefined,
): Warning[] {
  const deviations = of.deviations()
  const spread = rootMeanSquare(deviations, of.n - 1)
  return [
    fewReadings(of.n),
    fewDistinctValues(readings),
    resolutionAboveSpread(of.standardDeviation, resolution),
    autocorrelation(of),
    outlyingReadings(deviations, spread),
    drift(deviations),
  ].filter((warning) => warning !== null)
}

const rootMeanSquare = (values: readonly number[], divisor: number): number =>
  Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / divisor)

/** Fewer than ten readings: common practice, no source. */
function fewReadings(n: number): Warning | null {
  if (n >= 10) return null
  return {
    code: 'few-readings',
    message: `There are only ${n} readings; at least 10 are common practice.`,
    figures: { n, usual: 10 },
  }
}

/** At most three distinct values: the spread is then mostly that of rounding. */
function fewDistinctValues(readings: readonly number[]): Warning | null {
  const distinct = new Set(readings).size
  if (readings.length <= 3 || distinct > 3) return null
  return {
    code: 'few-distinct-values',
    message: `The ${readings.length} readings take only ${distinct} different values.`,
    figures: { distinct },
  }
}

function resolutionAboveSpread(
  standardDeviation: number | null,
  resolution: number | undefined,
): Warning | null {
  if (resolution === undefined || standardDeviation === null || resolution <= standardDeviation) return null
  return {
    code: 'resolution-above-spread',
    message: `The resolution (${resolution}) is larger than the standard deviation of the readings.`,
    figures: { resolution, standardDeviation },
  }
}

/** |r₁| above 2/√n: readings depend on their neighbours and the interval is too short (Box and Jenkins 1970). */
function autocorrelation({ n, lag1Autocorrelation }: Moments): Warning | null {
  const limit = 2 / Math.sqrt(n)
  if (lag1Autocorrelation === null || Math.abs(lag1Autocorrelation) <= limit) return null
  return {
    code: 'autocorrelation',
    message:
      'Neighbouring readings are alike or opposed: they are not independent, and the interval is too short.',
    figures: { lag1Autocorrelation, limit },
  }
}

/** Grubbs' two-sided test for one outlier at 1 % (Grubbs, Technometrics 11, 1969); needs three readings. */
function outlyingReadings(deviations: readonly number[], spread: number): Warning | null {
  const n = deviations.length
  if (n < 3) return null
  const t = tQuantile(0.005 / n, n - 2)
  const limit = ((n - 1) / Math.sqrt(n)) * Math.sqrt((t * t) / (n - 2 + t * t))
  const readings = deviations.flatMap((deviation, index) =>
    Math.abs(deviation) > limit * spread ? [index] : [],
  )
  if (readings.length === 0) return null
  return {
    code: 'outlying-reading',
    message: `Far from the others: reading ${readings.map((index) => index + 1).join(', ')}.`,
    readings,
    figures: { limit },
  }
}

/** A straight line over the order of reading, its slope tested against zero at 1 %; needs five readings. */
function drift(deviations: readonly number[]): Warning | null {
  const n = deviations.length
  if (n < 5) return null
  const middle = (n - 1) / 2
  let products = 0
  let squares = 0
  deviations.forEach((deviation, index) => {
    products += deviation * (index - middle)
    squares += deviation * deviation
  })
  const orderSquares = (n * (n - 1) * (n + 1)) / 12
  const explained = (products * products) / orderSquares
  const residual = Math.max(0, squares - explained)
  const t = residual > 0 ? Math.sqrt((explained * (n - 2)) / residual) : Infinity
  const pValue = tTwoSided(t, n - 2)
  if (pValue >= 0.01) return null
  return {
    code: 'drift',
    message: `The readings ${products > 0 ? 'rise' : 'fall'} over the order in which they were taken.`,
    figures: { pValue, direction: products > 0 ? 1 : -1 },
  }
}
