import { describe, expect, it } from 'vitest'
import { layoutBands, type BandPoint } from './bands'

const words = { meets: 'meets', 'not-shown': 'not shown', 'falls-short': 'falls short' }
const yFormat = (value: number) => `${value * 100} %`
const points: BandPoint[] = Array.from({ length: 41 }, (_, at) => {
  const meets = Math.max(0, 1 - at / 20)
  const fallsShort = Math.max(0, (at - 20) / 20)
  return { x: at / 10, meets, fallsShort, notShown: 1 - meets - fallsShort }
})
const layout = layoutBands({ points, width: 500, height: 240, words, yFormat })!
const heights = (path: string) =>
  path
    .slice(1, -1)
    .split('L')
    .map((pair) => Number(pair.split(' ')[1]))

describe('bands of chances', () => {
  it('stand on one another and fill the whole height everywhere', () => {
    const [meets, notShown, fallsShort] = layout.bands.map(({ path }) => {
      const all = heights(path)
      return { upper: all.slice(0, points.length), lower: all.slice(points.length).reverse() }
    })
    expect(meets!.lower.every((y) => y === layout.bottom)).toBe(true)
    expect(notShown!.lower).toEqual(meets!.upper)
    expect(fallsShort!.lower).toEqual(notShown!.upper)
    expect(fallsShort!.upper.every((y) => y === layout.top)).toBe(true)
  })

  it('are named inside themselves where there is room', () => {
    expect(layout.bands.map(({ label }) => label?.text)).toEqual(['meets', 'not shown', 'falls short'])
    const [meets, , fallsShort] = layout.bands.map(({ label }) => label!)
    expect(meets!.x).toBeLessThan(fallsShort!.x)
    expect(meets!.y).toBeGreaterThan(fallsShort!.y)
  })

  it('of a rule that leaves nothing open have no name for what is never there', () => {
    const closed = points.map(({ x, meets }) => ({ x, meets, notShown: 0, fallsShort: 1 - meets }))
    const drawn = layoutBands({ points: closed, width: 500, height: 240, words, yFormat })!
    expect(drawn.bands.find(({ name }) => name === 'not-shown')!.label).toBeNull()
  })

  it('too narrow for their name have it above the plot, with a leader into them', () => {
    const narrow = points.map(({ x }) => {
      const meets = x < 2 ? 1 : 0
      const notShown = x >= 2 && x < 2.15 ? 1 : 0
      return { x, meets, notShown, fallsShort: 1 - meets - notShown }
    })
    const drawn = layoutBands({ points: narrow, width: 500, height: 240, words, yFormat })!
    const label = drawn.bands.find(({ name }) => name === 'not-shown')!.label!
    expect(label.y).toBeLessThan(drawn.top)
    expect(label.to!.y).toBeGreaterThan(drawn.top)
    expect(label.to!.x).toBeCloseTo(drawn.x.scale.at(2), 0)
  })

  it('are nothing without points', () => {
    expect(layoutBands({ points: [], width: 500, height: 240, words, yFormat })).toBeNull()
  })
})
