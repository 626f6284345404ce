import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bitLength } from './bit-length'
import {
  add,
  compare,
  decimalParts,
  divide,
  multiply,
  rational,
  scale,
  squareRoot,
  subtract,
  toNumber,
} from '.'

const finite = fc.double({ noNaN: true, noDefaultInfinity: true })
const runs = { seed: 1, numRuns: 1000 }

describe('exact arithmetic on entered numbers', () => {
  it('takes a number as it was written, not as the nearest binary fraction', () => {
    expect(decimalParts(0.1)).toEqual({ coefficient: 1n, exponent: -1 })
    expect(decimalParts(-2.5e-7)).toEqual({ coefficient: -25n, exponent: -8 })
    expect(toNumber(subtract(rational(24.025), rational(23.975)))).toBe(0.05)
    expect(24.025 - 23.975).not.toBe(0.05)
    expect(compare(add(rational(0.1), rational(0.2)), rational(0.3))).toBe(0)
  })

  it('gives every number back unchanged', () => {
    fc.assert(
      fc.property(finite, (value) => Object.is(toNumber(rational(value)), value === 0 ? 0 : value)),
      runs,
    )
  })

  it('rounds to the nearest number and ties to even', () => {
    const half = 2n ** 53n
    expect(toNumber({ numerator: half + 1n, denominator: 1n })).toBe(2 ** 53)
    expect(toNumber({ numerator: half + 3n, denominator: 1n })).toBe(2 ** 53 + 4)
    expect(toNumber({ numerator: 1n, denominator: 3n })).toBe(1 / 3)
    expect(toNumber({ numerator: -1n, denominator: 3n })).toBe(-1 / 3)
    expect(toNumber(rational(5e-324))).toBe(5e-324)
    expect(toNumber(multiply(rational(1e308), rational(10)))).toBe(Infinity)
    expect(toNumber(divide(rational(-1e308), rational(0.01)))).toBe(-Infinity)
    expect(toNumber(divide(rational(5e-324), rational(4)))).toBe(0)
  })

  it('divides whole numbers as a correctly rounding machine does', () => {
    const whole = fc.integer({ min: -(2 ** 31), max: 2 ** 31 - 1 })
    fc.assert(
      fc.property(whole, fc.integer({ min: 1, max: 2 ** 31 - 1 }), (a, b) => {
        const exact = toNumber(divide(rational(a), rational(b)))
        return exact === a / b
      }),
      runs,
    )
  })

  it('takes square roots of squares exactly and of others to the nearest number', () => {
    const root = fc.double({ min: 1e-150, max: 1e150, noNaN: true })
    fc.assert(
      fc.property(root, (value) => squareRoot(multiply(rational(value), rational(value))) === value),
      runs,
    )
    fc.assert(
      fc.property(fc.integer({ min: 1 }), (value) => squareRoot(rational(value)) === Math.sqrt(value)),
      runs,
    )
    expect(squareRoot(rational(0))).toBe(0)
    // 10^-400 is below every number, its root is not.
    expect(squareRoot(multiply(rational(1e-200), rational(1e-200)))).toBe(1e-200)
  })

  it('orders fractions as numbers are ordered', () => {
    fc.assert(
      fc.property(
        finite,
        finite,
        (a, b) => compare(rational(a), rational(b)) === Math.sign(a - b) || a === b,
      ),
      runs,
    )
  })

  it('refuses to divide by zero', () => {
    expect(() => divide(rational(1), rational(0))).toThrow(RangeError)
  })

  it('brings values to whole multiples of one power of ten', () => {
    expect(scale([1.5, 2.25, 0])).toEqual({ integers: [150n, 225n, 0n], exponent: -2 })
    expect(scale([3e21, 1e22])).toEqual({ integers: [3n, 10n], exponent: 21 })
    expect(scale([0, 0])).toEqual({ integers: [0n, 0n], exponent: 0 })
  })

  it('counts binary digits', () => {
    expect([0n, 1n, 2n, 255n, 256n, 2n ** 100n].map(bitLength)).toEqual([0, 1, 2, 8, 9, 101])
  })
})
