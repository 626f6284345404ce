import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dayNumber } from '../charts/calendar'
import { textWidth } from '../charts/scales'
import { layoutMarginRule, type MarginRuleInput, type MarginRuleLayout } from './marginRule'

const bias: MarginRuleInput = {
  estimate: -0.0009,
  interval: { lower: -0.0017, upper: -0.0001 },
  limits: { lower: -0.0025, upper: 0.0025 },
  width: 500,
}

const laid = (input: MarginRuleInput): MarginRuleLayout => {
  const layout = layoutMarginRule(input)
  if (!layout) throw new Error('nothing to draw')
  return layout
}
const numbers = (layout: MarginRuleLayout) => layout.ticks.flatMap(({ label }) => (label ? [label] : []))

/** Every part of the drawing that a value puts somewhere. */
const places = (layout: MarginRuleLayout) => [
  ...layout.limits,
  ...(layout.bar ? [layout.bar.x, layout.bar.x + layout.bar.width] : []),
  ...(layout.estimate === null ? [] : [layout.estimate]),
]

describe('the margin rule', () => {
  it('numbers the major ticks of a bias rule in round steps', () =>
    expect(numbers(laid(bias))).toEqual([
      '−0.004',
      '−0.003',
      '−0.002',
      '−0.001',
      '0.000',
      '0.001',
      '0.002',
      '0.003',
      '0.004',
    ]))

  it('starts a share at zero and goes past its limit', () => {
    const layout = laid({ estimate: 0.142, interval: null, limits: { upper: 0.2 }, width: 400 })
    expect(layout.domain[0]).toBe(0)
    expect(layout.domain[1]).toBeGreaterThan(0.2)
    expect(layout.zone?.x).toBe(layout.from)
  })

  it('holds an interval far outside the limits', () => {
    const layout = laid({ ...bias, estimate: 0.9, interval: { lower: 0.4, upper: 1.4 } })
    expect(layout.domain[1]).toBeGreaterThanOrEqual(1.4)
    expect(layout.domain[0]).toBeLessThanOrEqual(-0.0025)
  })

  it('uses fewer numbers on a narrow drawing', () =>
    expect(numbers(laid({ ...bias, width: 250 })).length).toBeLessThan(numbers(laid(bias)).length))

  it('has a half tick in the middle of a wide division', () => {
    const [first, ...rest] = laid({ ...bias, width: 900 }).ticks
    const half = rest.find(({ kind }) => kind === 'half')
    const next = rest.find(({ kind }) => kind === 'major')
    expect(half?.x).toBeCloseTo((first!.x + next!.x) / 2, 6)
  })

  it('draws an interval without width as a thin bar', () =>
    expect(laid({ ...bias, interval: { lower: -0.0009, upper: -0.0009 } }).bar?.width).toBe(3))

  it('runs an open interval to the end of the rule', () => {
    const layout = laid({
      estimate: 0.1,
      interval: { lower: null, upper: 0.15 },
      limits: { upper: 0.2 },
      width: 400,
    })
    expect(layout.bar?.x).toBe(layout.from)
  })

  it('draws no bar for a clause judged on an estimate alone', () =>
    expect(laid({ ...bias, interval: null }).bar).toBeNull())

  it('draws nothing when no value is defined', () =>
    expect(layoutMarginRule({ estimate: null, interval: null, limits: {}, width: 400 })).toBeNull())

  it('rules days by the firsts of months', () => {
    const layout = laid({
      estimate: dayNumber('2026-10-09'),
      interval: null,
      limits: { lower: dayNumber('2026-03-02'), upper: dayNumber('2027-03-01') },
      width: 500,
      calendar: true,
    })
    expect(numbers(layout)).toEqual(['Jan 2026', 'Jul 2026', 'Jan 2027'])
    expect(layout.estimate).toBeGreaterThan(layout.limits[0]!)
  })

  it('leaves out the numbers in a table cell', () => {
    const layout = laid({ ...bias, width: 160, compact: true })
    expect(numbers(layout)).toEqual([])
    expect(layout.height).toBe(20)
  })

  const value = fc
    .tuple(fc.integer({ min: -99_999, max: 99_999 }), fc.integer({ min: -9, max: 3 }))
    .map(([digits, exponent]) => Number(`${digits}e${exponent}`))
  const input = fc.record({
    estimate: fc.option(value),
    interval: fc.option(
      fc.tuple(value, value).map(([a, b]) => ({ lower: Math.min(a, b), upper: Math.max(a, b) })),
    ),
    limits: fc.oneof(
      fc.tuple(value, value).map(([a, b]) => ({ lower: Math.min(a, b), upper: Math.max(a, b) })),
      value.map((upper) => ({ upper })),
      value.map((lower) => ({ lower })),
    ),
    width: fc.integer({ min: 120, max: 1200 }),
    compact: fc.boolean(),
  })

  it('keeps limits, interval and estimate on the rule, whatever they are', () =>
    fc.assert(
      fc.property(input, (any) => {
        const layout = laid(any)
        for (const x of places(layout)) {
          expect(x).toBeGreaterThanOrEqual(layout.from - 2)
          expect(x).toBeLessThanOrEqual(layout.to + 2)
        }
      }),
    ))

  it('keeps its numbers apart and inside the drawing, whatever they are', () =>
    fc.assert(
      fc.property(input, (any) => {
        const labelled = laid(any).ticks.filter(({ label }) => label)
        let end = -1
        for (const { x, label } of labelled) {
          const half = textWidth(label!, 11) / 2
          expect(x - half).toBeGreaterThanOrEqual(end - 0.5)
          end = x + half
        }
        expect(end).toBeLessThanOrEqual(any.width + 1)
      }),
    ))
})
