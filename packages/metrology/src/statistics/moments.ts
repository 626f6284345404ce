import { bitLength } from '../decimal/bit-length'
import { powerOfTen, scale, squareRoot, toNumber, type Rational } from '../decimal'

/** Exact mean and spread of readings; everything is formed without rounding until the last step. */
export interface Moments {
  n: number
  mean: Rational
  /** Σ(x − x̄)² / (n − 1); null for one reading. */
  variance: Rational | null
  /** √variance; null for one reading. */
  standardDeviation: number | null
  /** Lag-1 autocorrelation; null where the readings do not vary. */
  lag1Autocorrelation: number | null
  minimum: number
  maximum: number
  /** x − x̄ of each reading in one common unit, which is not that of the readings: for ratios only. */
  deviations(): number[]
}

/**
 * Mean, sample variance (divisor n − 1) and lag-1 autocorrelation Σ(xᵢ−x̄)(xᵢ₊₁−x̄)/Σ(xᵢ−x̄)² of at least one
 * finite reading, exact on the shortest decimal forms. NIST StRD, univariate summary statistics, defines all three.
 */
export function moments(readings: readonly number[]): Moments {
  const { integers, exponent } = scale(readings)
  const n = BigInt(integers.length)
  // Differences to the first value keep the integers short where the readings share leading digits.
  const first = integers[0] ?? 0n
  const shifted = integers.map((value) => value - first)
  let sum = 0n
  let squares = 0n
  let minimum = readings[0] ?? 0
  let maximum = minimum
  for (const value of shifted) {
    sum += value
    squares += value * value
  }
  for (const reading of readings) {
    if (reading < minimum) minimum = reading
    if (reading > maximum) maximum = reading
  }
  const mean = inUnits(sum + first * n, n, exponent)
  // n²·Σ(x − x̄)² = n·(n·Σx² − (Σx)²), exact in integers.
  const spread = n * squares - sum * sum
  const variance = n > 1n ? inUnits(spread, n * (n - 1n), 2 * exponent) : null
  return {
    n: integers.length,
    mean,
    variance,
    standardDeviation: variance ? squareRoot(variance) : null,
    lag1Autocorrelation: spread > 0n ? lag1(shifted, sum, n, spread) : null,
    minimum,
    maximum,
    deviations: () => inCommonUnit(shifted.map((value) => n * value - sum)),
  }
}

/** Whole numbers as doubles of at most 62 bits, all divided by the same power of two. */
function inCommonUnit(values: readonly bigint[]): number[] {
  let longest = 0
  for (const value of values) longest = Math.max(longest, bitLength(value < 0n ? -value : value))
  const surplus = BigInt(Math.max(0, longest - 62))
  return values.map((value) => Number(value >> surplus))
}

/** Σ(n·xᵢ − Σx)(n·xᵢ₊₁ − Σx) over n·(n·Σx² − (Σx)²): both sides carry the same n². */
function lag1(values: readonly bigint[], sum: bigint, n: bigint, spread: bigint): number {
  let products = 0n
  let previous: bigint | null = null
  for (const value of values) {
    const deviation = n * value - sum
    if (previous !== null) products += previous * deviation
    previous = deviation
  }
  return toNumber({ numerator: products, denominator: n * spread })
}

/** (numerator / denominator) · 10^exponent as a fraction. */
function inUnits(numerator: bigint, denominator: bigint, exponent: number): Rational {
  return exponent >= 0
    ? { numerator: numerator * powerOfTen(exponent), denominator }
    : { numerator, denominator: denominator * powerOfTen(-exponent) }
}
