/** A decimal number as a whole coefficient and a power of ten: exactly `coefficient · 10^exponent`. */
interface Parts {
  coefficient: bigint
  exponent: number
}

/** Reads decimal text as `decimalText` of the contract lets it through. */
function partsOf(text: string): Parts {
  const [digits = '0', power = '0'] = text.toLowerCase().replace(/^\+/, '').split('e')
  const [whole = '', fraction = ''] = digits.split('.')
  const signless = (whole + fraction).replace('-', '') || '0'
  const coefficient = BigInt(signless)
  return {
    coefficient: digits.startsWith('-') ? -coefficient : coefficient,
    exponent: Number(power) - fraction.length,
  }
}

const scaled = ({ coefficient, exponent }: Parts, to: number): bigint =>
  coefficient === 0n ? 0n : coefficient * 10n ** BigInt(exponent - to)

/**
 * −1, 0 or 1 as the number in `a` is less than, equal to or greater than the one in `b`; compared digit by digit
 * as entered, so that numbers a double cannot tell apart still differ.
 */
export function compareDecimals(a: string, b: string): -1 | 0 | 1 {
  const [left, right] = [partsOf(a), partsOf(b)]
  const to = Math.min(left.exponent, right.exponent)
  const [x, y] = [scaled(left, to), scaled(right, to)]
  return x < y ? -1 : x > y ? 1 : 0
}

/** The difference `a − b` as decimal text, exactly, with the places of the finer of the two. */
export function subtractDecimals(a: string, b: string): string {
  const [left, right] = [partsOf(a), partsOf(b)]
  const to = Math.min(left.exponent, right.exponent, 0)
  const difference = scaled(left, to) - scaled(right, to)
  const digits = (difference < 0n ? -difference : difference).toString().padStart(1 - to, '0')
  const text = to === 0 ? digits : `${digits.slice(0, to)}.${digits.slice(to)}`
  return difference < 0n ? `-${text}` : text
}

/** Whether the number in `a` is a whole multiple of the one in `step`, exactly; every number is one of zero's. */
export function isMultipleOf(a: string, step: string): boolean {
  const [value, unit] = [partsOf(a), partsOf(step)]
  const to = Math.min(value.exponent, unit.exponent)
  const divisor = scaled(unit, to)
  return divisor === 0n || scaled(value, to) % divisor === 0n
}
