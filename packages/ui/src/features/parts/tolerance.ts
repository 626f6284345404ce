import { subtractDecimals } from '@evenrule/api/contract/decimal'
import { minusSign, unitText } from '../../format/numbers'
import { toleranceWords as words } from '../../strings/parts'

/** Limits of a characteristic as they were entered: decimal text in `unit`. */
export interface EnteredTolerance {
  nominal: string | null
  lowerLimit: string | null
  upperLimit: string | null
  unit: string
}

/** Decimal text for reading: as entered, with a true minus sign. */
export const decimalForReading = (text: string): string => text.replace('-', minusSign).replace(/^\+/, '')

/** Decimal text with its unit: "0.0006 mm". Pure counts have no unit to show. */
export const withUnit = (text: string, unit: string): string =>
  decimalForReading(text) + unitText(unit === '1' ? null : unit)

const isZero = (text: string): boolean => Number(text) === 0
const signed = (text: string): string =>
  isZero(text) ? '0' : text.startsWith('-') ? decimalForReading(text) : `+${text}`

/**
 * The tolerance as on the drawing, from the numbers as entered and their exact differences: "24.000 ±0.025 mm",
 * "24.000 +0.021/0 mm", "at most 2.0 ml/min".
 */
export function toleranceText({ nominal, lowerLimit, upperLimit, unit }: EnteredTolerance): string {
  const close = unitText(unit === '1' ? null : unit)
  if (lowerLimit !== null && upperLimit !== null) {
    if (nominal === null)
      return words.between(decimalForReading(lowerLimit), decimalForReading(upperLimit)) + close
    const up = subtractDecimals(upperLimit, nominal)
    const down = subtractDecimals(lowerLimit, nominal)
    const range = up === subtractDecimals(nominal, lowerLimit) ? `±${up}` : `${signed(up)}/${signed(down)}`
    return `${decimalForReading(nominal)} ${range}${close}`
  }
  const limit =
    upperLimit !== null
      ? words.atMost(decimalForReading(upperLimit))
      : lowerLimit !== null
        ? words.atLeast(decimalForReading(lowerLimit))
        : ''
  return (nominal === null ? limit : `${decimalForReading(nominal)}, ${limit}`) + close
}

/** A characteristic by its name and tolerance: "Bore Ø 24.000 ±0.025 mm". */
export const characteristicText = (characteristic: EnteredTolerance & { name: string }): string =>
  `${characteristic.name} ${toleranceText(characteristic)}`
