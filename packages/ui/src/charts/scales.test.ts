import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { linearScale, multiples, niceAxis, snapDomain, stepAtLeast, stepValue, textWidth } from './scales'

describe('steps of a scale', () => {
  it('are formed in decimal', () => expect(stepValue({ mantissa: 1, exponent: -1 }, 3)).toBe(0.3))
  it.each([
    [0.0007, 0.001],
    [0.3, 0.5],
    [0.1 + 0.2, 0.5],
    [1, 1],
    [1.01, 2],
    [2300, 5000],
  ])('of at least %d are %d', (size, step) => expect(stepValue(stepAtLeast(size), 1)).toBe(step))
  it('are the finest of 1, 2, 5 times a power of ten that is large enough', () =>
    fc.assert(
      fc.property(fc.double({ min: 1e-9, max: 1e9, noNaN: true }), (size) => {
        const value = stepValue(stepAtLeast(size), 1)
        expect(value).toBeGreaterThanOrEqual(size * (1 - 1e-8))
        expect(value).toBeLessThanOrEqual(size * 2.5 * (1 + 1e-8))
      }),
    ))
})

describe('snapDomain', () => {
  const step = { mantissa: 1, exponent: -3 } as const
  it('widens to whole steps', () => expect(snapDomain([-0.0034, 0.0031], step)).toEqual([-0.004, 0.004]))
  it('leaves whole steps where they are', () =>
    expect(snapDomain([-0.004, 0.004], step)).toEqual([-0.004, 0.004]))
  it('never closes up', () => expect(snapDomain([0.002, 0.002], step)).toEqual([0.002, 0.003]))
})

describe('multiples', () => {
  it('include both ends', () =>
    expect(multiples([0, 0.3], { mantissa: 1, exponent: -1 })).toEqual([0, 0.1, 0.2, 0.3]))
})

describe('linearScale', () => {
  it('maps ends to ends', () => {
    const scale = linearScale([0, 10], [20, 120])
    expect([scale.at(0), scale.at(5), scale.at(10)]).toEqual([20, 70, 120])
  })
  it('puts everything in the middle of an empty domain', () =>
    expect(linearScale([3, 3], [0, 100]).at(3)).toBe(50))
})

describe('niceAxis', () => {
  it('holds the extent and keeps its labels apart', () =>
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        fc.integer({ min: 120, max: 1200 }),
        (low, width, length) => {
          const axis = niceAxis([low, low + width], [0, length], { spacing: 60 })
          const slack = 1e-6 * Math.max(Math.abs(low), width)
          expect(axis.scale.domain[0]).toBeLessThanOrEqual(low + slack)
          expect(axis.scale.domain[1]).toBeGreaterThanOrEqual(low + width - slack)
          axis.ticks.slice(1).forEach((tick, at) => expect(tick.at - axis.ticks[at]!.at).toBeGreaterThan(30))
        },
      ),
    ))
  it('labels with the places of its step', () =>
    expect(niceAxis([0, 4], [0, 600], { spacing: 60 }).ticks.map((tick) => tick.label)).toEqual([
      '0.0',
      '0.5',
      '1.0',
      '1.5',
      '2.0',
      '2.5',
      '3.0',
      '3.5',
      '4.0',
    ]))
})

describe('textWidth', () => {
  it('grows with the text and the size', () => {
    expect(textWidth('−0.0025', 11)).toBeGreaterThan(textWidth('0.0025', 11))
    expect(textWidth('10', 22)).toBe(2 * textWidth('10', 11))
  })
})
