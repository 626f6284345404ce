import { add, divide, rational, toNumber } from '../decimal'
import type { Reader } from '../input/reader'
import { moments } from '../statistics/moments'
import type { SummaryOutput, Warning } from '../types'

/**
 * Mean, sample standard deviation (divisor n − 1), lag-1 autocorrelation, extremes and median of readings, in their
 * unit. Checked against NIST StRD, univariate summary statistics.
 */
export function summary(reader: Reader): SummaryOutput {
  const readings = reader.numbers('readings', 1)
  const { n, mean, standardDeviation, lag1Autocorrelation, minimum, maximum } = moments(readings)
  const warnings: Warning[] = []
  if (n === 1) {
    warnings.push({
      code: 'one-reading',
      message: 'One reading has no spread: the standard deviation is not defined.',
    })
  } else if (standardDeviation === 0) {
    warnings.push({
      code: 'below-resolution',
      message: 'The readings do not vary: the autocorrelation is not defined.',
    })
  }
  return {
    kind: 'summary',
    n,
    mean: toNumber(mean),
    standardDeviation,
    lag1Autocorrelation,
    minimum,
    maximum,
    median: median(readings),
    warnings,
  }
}

/** The middle value, or the mean of the two middle ones, formed in decimal. */
function median(readings: readonly number[]): number {
  const sorted = Float64Array.from(readings).sort()
  const middle = sorted.length / 2
  const upper = sorted[Math.floor(middle)] ?? 0
  if (sorted.length % 2 === 1) return upper
  const lower = sorted[middle - 1] ?? 0
  return toNumber(divide(add(rational(lower), rational(upper)), rational(2)))
}
