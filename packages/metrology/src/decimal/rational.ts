import { bitLength } from './bit-length'

/** An exact fraction; the denominator is above zero. Fractions are not reduced: they stay short enough here. */
export interface Rational {
  numerator: bigint
  denominator: bigint
}

/** Nothing, as a fraction. */
export const zero: Rational = { numerator: 0n, denominator: 1n }

/** Ten to a whole, non-negative power. */
export function powerOfTen(exponent: number): bigint {
  return BigInt('1' + '0'.repeat(exponent))
}

/**
 * Coefficient and power of ten of the shortest decimal text that reads back as the same number, so that 0.1 is
 * exactly one tenth, as it was entered. Domain: finite numbers.
 */
export function decimalParts(value: number): { coefficient: bigint; exponent: number } {
  const [digits = '0', power = '0'] = String(value).split('e')
  const [whole = '0', fraction = ''] = digits.split('.')
  return { coefficient: BigInt(whole + fraction), exponent: Number(power) - fraction.length }
}

/** The exact value of the shortest decimal form of a finite number. */
export function rational(value: number): Rational {
  const { coefficient, exponent } = decimalParts(value)
  return exponent >= 0
    ? { numerator: coefficient * powerOfTen(exponent), denominator: 1n }
    : { numerator: coefficient, denominator: powerOfTen(-exponent) }
}

/** Exact sum. */
export const add = (a: Rational, b: Rational): Rational => ({
  numerator: a.numerator * b.denominator + b.numerator * a.denominator,
  denominator: a.denominator * b.denominator,
})

/** Exact difference a − b. */
export const subtract = (a: Rational, b: Rational): Rational => add(a, negate(b))

/** −a */
export const negate = (a: Rational): Rational => ({ numerator: -a.numerator, denominator: a.denominator })

/** |a| */
export const absolute = (a: Rational): Rational => (a.numerator < 0n ? negate(a) : a)

/** Exact product. */
export const multiply = (a: Rational, b: Rational): Rational => ({
  numerator: a.numerator * b.numerator,
  denominator: a.denominator * b.denominator,
})

/** Quotient of two fractions; the divisor must not be zero. */
export function divide(a: Rational, b: Rational): Rational {
  if (b.numerator === 0n) throw new RangeError('Division by zero in exact arithmetic.')
  const sign = b.numerator < 0n ? -1n : 1n
  return { numerator: a.numerator * b.denominator * sign, denominator: a.denominator * b.numerator * sign }
}

/** −1, 0 or 1 as a is less than, equal to or greater than b. */
export function compare(a: Rational, b: Rational): -1 | 0 | 1 {
  const left = a.numerator * b.denominator
  const right = b.numerator * a.denominator
  return left < right ? -1 : left > right ? 1 : 0
}

/**
 * The double nearest to a fraction, ties to even, formed with integers alone so that it does not depend on how an
 * engine reads long decimal text. Infinity (with the sign) beyond the range of doubles.
 */
export function toNumber({ numerator, denominator }: Rational): number {
  if (numerator === 0n) return 0
  const negative = numerator < 0n
  const magnitude = negative ? -numerator : numerator
  // The quotient keeps 53 bits, or fewer where the result is subnormal (its last bit weighs 2^-1074).
  const lead = bitLength(magnitude) - bitLength(denominator)
  let shift = Math.min(54 - lead, 1074)
  let [quotient, remainder] = shifted(magnitude, denominator, shift)
  const surplus = bitLength(quotient) - 53
  if (surplus > 0) {
    shift -= surplus
    ;[quotient, remainder] = shifted(magnitude, denominator, shift)
  }
  const divisor = shift >= 0 ? denominator : denominator << BigInt(-shift)
  const twice = remainder * 2n
  if (twice > divisor || (twice === divisor && quotient % 2n === 1n)) quotient += 1n
  const result = scaleByPowerOfTwo(Number(quotient), -shift)
  return negative ? -result : result
}

function shifted(numerator: bigint, denominator: bigint, shift: number): [bigint, bigint] {
  const top = shift >= 0 ? numerator << BigInt(shift) : numerator
  const bottom = shift >= 0 ? denominator : denominator << BigInt(-shift)
  return [top / bottom, top % bottom]
}

/**
 * The square root of a fraction of zero or above as the nearest double, also where the fraction itself is outside
 * the range of doubles.
 */
export function squareRoot({ numerator, denominator }: Rational): number {
  if (numerator <= 0n) return 0
  // An even shift brings the quotient to about 128 bits: a whole root of 64, whose own shift is half of it.
  const lead = bitLength(numerator) - bitLength(denominator)
  const shift = 2 * Math.floor((128 - lead) / 2)
  const [quotient] = shifted(numerator, denominator, shift)
  const root = wholeRoot(quotient)
  return toNumber(
    shift >= 0
      ? { numerator: root, denominator: 1n << BigInt(shift / 2) }
      : { numerator: root << BigInt(-shift / 2), denominator: 1n },
  )
}

/** The largest integer whose square does not exceed a value below 2^1023: Newton's iteration from a double. */
function wholeRoot(value: bigint): bigint {
  let root = BigInt(Math.floor(Math.sqrt(Number(value)))) + 1n
  for (;;) {
    const next = (root + value / root) / 2n
    if (next === root || next === root + 1n) break
    root = next
  }
  while (root * root > value) root -= 1n
  while ((root + 1n) * (root + 1n) <= value) root += 1n
  return root
}

/** value · 2^power with one rounding at most: two half steps keep the intermediate product a normal number. */
export function scaleByPowerOfTwo(value: number, power: number): number {
  const half = Math.trunc(power / 2)
  return value * powerOfTwo(half) * powerOfTwo(power - half)
}

/** Two to a whole power between −1022 and 1023, exactly, by repeated squaring. */
function powerOfTwo(power: number): number {
  let result = 1
  let square = power < 0 ? 0.5 : 2
  for (let left = Math.abs(power); left > 0; left = Math.floor(left / 2)) {
    if (left % 2 === 1) result *= square
    if (left > 1) square *= square
  }
  return result
}
