import type { Judgement } from '@evenrule/metrology'
import { dayIso, dayNumber } from '../charts/calendar'
import { formatDate, formatNumber, formatShare, type Ends, type Unit } from '../format'
import { shiftDecimal } from '../format/numbers'

/** A judgement made ready for the margin rule and the line of text beside it. */
export interface RuleFigures {
  /** The figure with its unit, for reading; a dash where it is not defined. */
  text: string
  estimate: number | null
  interval: Ends | null
  limits: Ends | null
  unit: Unit
  /** Values are day numbers. */
  calendar: boolean
  /** Writes a value of the scale without its unit. */
  format(value: number, places?: number): string
}

type Loose = { lower?: number | string | null; upper?: number | string | null } | null

/**
 * Figure, interval and limits as numbers on one scale: shares as percentages, days as day numbers.
 * `digits` are the decimal places of figures in the characteristic's unit.
 */
export function ruleFigures(
  judgement: Pick<Judgement, 'figure' | 'interval' | 'limits' | 'quantity'>,
  { unit, digits }: { unit?: Unit; digits?: number } = {},
): RuleFigures {
  const { figure, quantity } = judgement
  const number = (value: number | string | null | undefined): number | null => {
    if (value === null || value === undefined) return null
    const plain = typeof value === 'string' ? dayNumber(value) : value
    if (!Number.isFinite(plain)) return null
    return quantity === 'share' ? shiftDecimal(plain, 2) : plain
  }
  const ends = (pair: Loose): Ends | null => pair && { lower: number(pair.lower), upper: number(pair.upper) }
  const text = {
    value: () => formatNumber(figure as number | null, { unit, digits }),
    share: () => formatShare(figure as number | null, { digits: 1 }),
    count: () => formatNumber(figure as number | null),
    date: () => formatDate(figure as string | null),
    ratio: () => formatNumber(figure as number | null, { digits: 2 }),
  }[quantity]()
  return {
    text,
    estimate: number(figure),
    interval: ends(judgement.interval),
    limits: ends(judgement.limits),
    unit: { value: unit, share: '%', count: undefined, date: undefined, ratio: undefined }[quantity],
    calendar: quantity === 'date',
    format:
      quantity === 'date'
        ? (value) => formatDate(dayIso(value))
        : (value, places) =>
            // There is no half reading: between whole numbers a scale of counts stays blank.
            quantity === 'count' && !Number.isInteger(value)
              ? ''
              : formatNumber(value, {
                  digits: quantity === 'count' ? 0 : (places ?? (quantity === 'value' ? digits : undefined)),
                }),
  }
}
