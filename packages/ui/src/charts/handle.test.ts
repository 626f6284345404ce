import { describe, expect, it } from 'vitest'
import { keyed, snapped, stepOf, valueAt, type HandleInput } from './handle'

const handle: HandleInput = { label: 'Spread', value: 0.8, least: 0.02, most: 4, step: 0.02, text: '' }

describe('a handle on an axis', () => {
  it('stands on whole steps inside its bounds, in decimal', () => {
    expect(snapped(0.309, handle)).toBe(0.3)
    expect(snapped(0.059_999, handle)).toBe(0.06)
    expect(snapped(-1, handle)).toBe(0.02)
    expect(snapped(99, handle)).toBe(4)
  })

  it('is found again from the pixel it stands at', () => {
    const scale = {
      domain: [0, 4] as const,
      range: [40, 440] as const,
      at: (value: number) => 40 + 100 * value,
    }
    expect(valueAt(scale.at(1.37), scale)).toBeCloseTo(1.37, 12)
  })

  it('moves by keys, and by no others', () => {
    expect(keyed('ArrowRight', handle)).toBe(0.82)
    expect(keyed('ArrowDown', handle)).toBe(0.78)
    expect(keyed('PageUp', handle)).toBe(1)
    expect(keyed('Home', handle)).toBe(0.02)
    expect(keyed('End', handle)).toBe(4)
    expect(keyed('Tab', handle)).toBeNull()
  })

  it('steps by a hundredth to a tenth of what it is at', () => {
    expect(stepOf(0.8)).toBe(0.01)
    expect(stepOf(25)).toBe(1)
    expect(stepOf(0.00083)).toBe(0.00001)
  })
})
