import type { DemoTask } from './tasks'

/** Decimals that a text shows. */
const decimals = (text: string): number => text.split('.')[1]?.length ?? 0

/** Certified deviations from the nominal in steps of a tenth of the last digit on the drawing. */
const offsets = [2, -3, 4, -1, 3, -2, 1] as const

/**
 * The reference standard of one characteristic: near its nominal (or, where only an upper limit is given, half of
 * it), certified to one digit more than the drawing shows, with an uncertainty of a fortieth of the tolerance.
 */
export function standardFor({ partNumber, limits }: Pick<DemoTask, 'partNumber' | 'limits'>) {
  const [number, name, nominal, lowerLimit, upperLimit, unit] = limits
  const base = nominal || `${Number(upperLimit) / 2}`
  const digits = Math.max(decimals(base), decimals(upperLimit || lowerLimit)) + 1
  const offset = (offsets[(partNumber.length + number) % offsets.length] ?? 1) / 10 ** digits
  const width = lowerLimit && upperLimit ? Number(upperLimit) - Number(lowerLimit) : Number(upperLimit)
  return {
    code: `RS ${partNumber}-${number}`,
    name: `Master for ${name.charAt(0).toLowerCase()}${name.slice(1)}`,
    certifiedValue: (Number(base) + offset).toFixed(digits),
    unit,
    expandedUncertainty: (width / 40).toPrecision(2),
    coverageFactor: '2',
  }
}
