import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { placeCurveLabels, spread } from './labels'

describe('labels in one column', () => {
  it('stay where they belong when there is room', () =>
    expect(spread([10, 60, 120], 14, [0, 200])).toEqual([10, 60, 120]))
  it('move apart in their order', () => expect(spread([50, 48, 52], 14, [0, 200])).toEqual([62, 48, 76]))
  it('stay inside the drawing', () => expect(spread([198, 199, 200], 14, [0, 200])).toEqual([172, 186, 200]))
  it('never touch while the column is long enough', () =>
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -50, max: 350 }), { minLength: 2, maxLength: 8 }), (wanted) => {
        const placed = [...spread(wanted, 14, [0, 300])].sort((a, b) => a - b)
        placed.slice(1).forEach((at, index) => expect(at - placed[index]!).toBeGreaterThanOrEqual(14))
        expect(placed[0]).toBeGreaterThanOrEqual(0)
        expect(placed.at(-1)).toBeLessThanOrEqual(300)
      }),
    ))
})

describe('names beside curves', () => {
  const frame = { x: 40, y: 10, width: 500, height: 180 }
  const falling = (from: number) =>
    Array.from({ length: 101 }, (_, at) => {
      const x = 40 + at * 5
      return { x, y: 10 + 180 / (1 + Math.exp(-(x - from) / 20)) }
    })
  const curves = [
    { label: 'equivalence, round 3', points: falling(330) },
    { label: 'zero test, in force', points: falling(120) },
  ]
  const boxOf = (label: string, place: { x: number; y: number; anchor: string }) => {
    const width = label.length * 6
    return {
      left: place.anchor === 'start' ? place.x : place.x - width,
      right: place.anchor === 'start' ? place.x + width : place.x,
      y: place.y,
    }
  }

  it('stay inside the frame and off each other', () => {
    const [a, b] = placeCurveLabels(curves, frame).map((place, at) => boxOf(curves[at]!.label, place)) as [
      ReturnType<typeof boxOf>,
      ReturnType<typeof boxOf>,
    ]
    for (const box of [a, b]) {
      expect(box.left).toBeGreaterThanOrEqual(40)
      expect(box.right).toBeLessThanOrEqual(540 + 6)
    }
    expect(a.right < b.left || b.right < a.left || Math.abs(a.y - b.y) >= 14).toBe(true)
  })
  it('keep off the curves', () => {
    placeCurveLabels(curves, frame).forEach((place, at) => {
      const box = boxOf(curves[at]!.label, place)
      const touched = curves
        .flatMap(({ points }) => points)
        .filter((point) => point.x > box.left && point.x < box.right && Math.abs(point.y - box.y) < 6)
      expect(touched).toEqual([])
    })
  })
  it('give way to what is there already', () => {
    const everywhere = [{ x: 40, y: 10, width: 400, height: 180 }]
    const [place] = placeCurveLabels(curves.slice(0, 1), frame, everywhere)
    expect(place!.x).toBeGreaterThanOrEqual(440)
  })
})
