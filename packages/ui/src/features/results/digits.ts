import { decimalPlaces, formatNumber, type NumberFormat } from '../../format'
import type { ClauseResult } from './types'

const mostPlaces = 9

/**
 * Decimal places of figures in the characteristic's unit: one more than the gauge resolves (or, where that is not
 * known, than the readings have), and never fewer than the agreed limit needs.
 */
export function figureDigits({ input, output }: Pick<ClauseResult, 'input' | 'output'>): number {
  const read = input.data?.readings ?? []
  const finest = input.resolution ?? null
  const places =
    finest !== null
      ? decimalPlaces(finest)
      : read.reduce((most, reading) => Math.max(most, decimalPlaces(reading)), 0)
  const limits =
    output.quantity === 'value'
      ? [output.limits?.lower, output.limits?.upper].filter((end) => typeof end === 'number')
      : []
  // A limit that was computed from the readings has no places of its own.
  const agreed = output.study?.equivalence.margin ?? null
  const ofLimit = agreed === null ? 0 : Math.max(0, ...limits.map((limit) => decimalPlaces(limit)))
  return Math.min(mostPlaces, Math.max(places + 1, ofLimit))
}

/** Two numbers written so that they look different where they are: a comparison must not read "0.0025 > 0.0025". */
export function writeApart(
  a: number,
  b: number,
  digits: number,
  options: NumberFormat = {},
): [string, string] {
  for (let places = digits; places < 16; places += 1) {
    const pair: [string, string] = [
      formatNumber(a, { ...options, digits: places }),
      formatNumber(b, { ...options, digits: places }),
    ]
    if (a === b || pair[0] !== pair[1]) return pair
  }
  return [String(a), String(b)]
}
