import { compareDecimals, subtractDecimals } from '../../../../contract/decimal'

type Text = string | null

/** What stands there already where the file says the same number: spreadsheets drop the zeros of 24.000. */
export const keptDecimal = (stands: Text | undefined, entered: Text): Text =>
  stands && entered && compareDecimals(stands, entered) === 0 ? stands : entered

/** Both limits of a nominal with a symmetric tolerance, exactly. */
export function limitsAround(nominal: string, tolerance: string): { lowerLimit: string; upperLimit: string } {
  const width = tolerance.replace(/^\+/, '')
  return {
    lowerLimit: subtractDecimals(nominal, width),
    upperLimit: subtractDecimals(nominal, width.startsWith('-') ? width.slice(1) : `-${width}`),
  }
}
