import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { compareDecimals, isMultipleOf, subtractDecimals } from './decimal'

describe('comparing decimals as entered', () => {
  it.each([
    ['0.1', '0.10', 0],
    ['24.025', '24.0250', 0],
    ['-0.5', '0.5', -1],
    ['-0.5', '-0.25', -1],
    ['+3', '3.', 0],
    ['.5', '5e-1', 0],
    ['1e3', '999.999', 1],
    ['0.30000000000000000001', '0.3', 1],
    ['0', '-0.0', 0],
    ['-.5', '-0.5', 0],
  ] as const)('%s against %s is %d', (a, b, order) => {
    expect(compareDecimals(a, b)).toBe(order)
    expect(compareDecimals(b, a)).toBe(order === 0 ? 0 : -order)
  })

  it('orders whole thousandths as their integers are ordered', () =>
    fc.assert(
      fc.property(fc.integer(), fc.integer(), (a, b) => {
        expect(compareDecimals(`${a}e-3`, `${b}e-3`)).toBe(Math.sign(a - b))
      }),
    ))
})

describe('the difference of decimals', () => {
  it.each([
    ['24.025', '24.000', '0.025'],
    ['23.975', '24.000', '-0.025'],
    ['24', '24.000', '0.000'],
    ['0.3', '0.1', '0.2'],
    ['1', '0.0005', '0.9995'],
    ['5', '12', '-7'],
    ['1e3', '1', '999'],
    ['-0.1', '0.05', '-0.15'],
  ])('%s − %s is %s, exactly and with the finer places', (a, b, difference) =>
    expect(subtractDecimals(a, b)).toBe(difference),
  )
})

describe('a whole multiple', () => {
  it.each([
    ['24.001', '0.001', true],
    ['24.0005', '0.001', false],
    ['-0.015', '0.005', true],
    ['0.3', '0.1', true],
    ['25', '0.05', true],
    ['1e-4', '0.0001', true],
    ['0', '0.001', true],
    ['24', '0', true],
  ])('is %s of %s: %s', (a, step, whole) => expect(isMultipleOf(a, step)).toBe(whole))
})
