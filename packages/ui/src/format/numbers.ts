import type { Unit } from './units'

/** Between a number and its unit: thin, and never broken at a line's end (U+202F). */
export const thinSpace = '\u202F'
export const minusSign = '\u2212'
/** Stands for a figure that is not defined. */
export const noFigure = '–'

export interface NumberFormat {
  unit?: Unit
  /** Decimal places, exactly. */
  digits?: number
  /** Smallest step of the gauge or of the scale: its decimal places are used. */
  resolution?: number | null
  /** Writes a plus sign before positive values. */
  signed?: boolean
}

/** Multiplies by a power of ten in decimal, on the shortest text of the number: 1.005 by 10² is 100.5. */
export function shiftDecimal(value: number, places: number): number {
  const [mantissa = '0', exponent = '0'] = String(value).split('e')
  return Number(`${mantissa}e${Number(exponent) + places}`)
}

/** Decimal places in the shortest text of a number: 0.0025 has four, 5e-7 seven, 20 none. */
export function decimalPlaces(value: number): number {
  const [mantissa = '', exponent = '0'] = String(value).split('e')
  return Math.max(0, (mantissa.split('.')[1]?.length ?? 0) - Number(exponent))
}

/** Rounds half away from zero to the given places, in decimal. */
function roundTo(value: number, digits: number): string {
  const rounded = shiftDecimal(Math.round(shiftDecimal(Math.abs(value), digits)), -digits)
  const text = rounded.toFixed(digits)
  return value < 0 && Number(text) !== 0 ? `-${text}` : text
}

/** Decimal places that show `significant` digits of a value; never more than its own text has. */
export function placesFor(value: number, significant: number): number {
  if (value === 0) return 0
  const magnitude = Math.floor(Math.log10(Math.abs(value)))
  return Math.min(decimalPlaces(value), Math.max(0, significant - 1 - magnitude))
}

/** Groups of three from 10 000 on, with the same thin space. */
const grouped = (text: string): string => {
  const [whole = '', fraction] = text.split('.')
  const digits = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, thinSpace) : whole
  return fraction === undefined ? digits : `${digits}.${fraction}`
}

const closeUnits = new Set(['°', '′', '″'])

/** A unit with the space that belongs before it; degrees of angle stand close. */
export const unitText = (unit: Unit): string => (!unit ? '' : closeUnits.has(unit) ? unit : thinSpace + unit)

/**
 * A number for reading: true minus, the places asked for (or those of the resolution, or at most five
 * significant digits), thin space and unit. Values that are not defined give a dash.
 */
export function formatNumber(value: number | null | undefined, options: NumberFormat = {}): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return noFigure
  const { resolution } = options
  const digits = options.digits ?? (resolution ? decimalPlaces(resolution) : placesFor(value, 5))
  const text = roundTo(value, Math.min(digits, 20))
  const unsigned = grouped(text.replace('-', ''))
  const sign = text.startsWith('-') ? minusSign : options.signed && Number(text) > 0 ? '+' : ''
  return sign + unsigned + unitText(options.unit)
}

/**
 * A fraction as a percentage: 0.05 is "5 %". Without `digits` it is written as entered when short (12.5 %),
 * else to one place, or to two significant digits below one per cent.
 */
export function formatShare(share: number | null | undefined, { digits }: { digits?: number } = {}): string {
  if (share === null || share === undefined || !Number.isFinite(share)) return noFigure
  const percent = shiftDecimal(share, 2)
  const short = decimalPlaces(percent) <= 2
  const places = short ? decimalPlaces(percent) : Math.abs(percent) >= 1 ? 1 : placesFor(percent, 2)
  return formatNumber(percent, { unit: '%', digits: digits ?? places })
}

/** A chance for reading: never "0 %" or "100 %" where it is neither. */
export function formatChance(chance: number | null | undefined): string {
  if (chance === null || chance === undefined || !Number.isFinite(chance)) return noFigure
  if (chance > 0 && chance < 0.001) return `under${thinSpace}0.1${thinSpace}%`
  if (chance < 1 && chance > 0.999) return `over${thinSpace}99.9${thinSpace}%`
  const near = chance > 0.99 || chance < 0.01
  return formatShare(chance, { digits: near && chance !== 0 && chance !== 1 ? 1 : 0 })
}

/** "1 reading", "15 readings". */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${formatNumber(count)} ${count === 1 ? one : many}`
}
