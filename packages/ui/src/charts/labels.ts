import { textWidth } from './scales'

/** A rectangle on a drawing, in pixels. */
export interface Box {
  x: number
  y: number
  width: number
  height: number
}

export interface Point {
  x: number
  y: number
}

const overlap = (a: Box, b: Box): boolean =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height

const holds = (box: Box, point: Point): boolean =>
  point.x >= box.x && point.x <= box.x + box.width && point.y >= box.y && point.y <= box.y + box.height

/**
 * Moves labels that stand in one column apart: each at least `gap` from the next, all between `top` and `bottom`,
 * in their order and as near to where they belong as that allows.
 */
export function spread(
  wanted: readonly number[],
  gap: number,
  [top, bottom]: readonly [number, number],
): number[] {
  const order = wanted.map((_, at) => at).sort((a, b) => wanted[a]! - wanted[b]!)
  const placed = order.map((at) => Math.min(Math.max(wanted[at]!, top), bottom))
  for (let at = 1; at < placed.length; at += 1) placed[at] = Math.max(placed[at]!, placed[at - 1]! + gap)
  for (let at = placed.length - 1; at >= 0; at -= 1) {
    const limit = at === placed.length - 1 ? bottom : placed[at + 1]! - gap
    placed[at] = Math.min(placed[at]!, limit)
  }
  const result = Array.from<number>({ length: wanted.length })
  order.forEach((at, rank) => (result[at] = placed[rank]!))
  return result
}

export interface CurveLabel {
  x: number
  y: number
  anchor: 'start' | 'end'
}

const size = 11
const lineHeight = 15

/**
 * Places for the names of curves beside them: off the frame's edge, other names, `taken` boxes and, as far as that
 * can be had, every curve. Curves are given in pixels, densely enough to follow.
 */
export function placeCurveLabels(
  curves: readonly { label: string; points: readonly Point[] }[],
  frame: Box,
  taken: readonly Box[] = [],
): CurveLabel[] {
  const used: Box[] = [...taken]
  return curves.map(({ label, points }, index) => {
    const width = textWidth(label, size) + 4
    let best: { cost: number; place: CurveLabel; box: Box } | undefined
    points.forEach((point, at) => {
      for (const anchor of ['start', 'end'] as const)
        for (const rise of [0, -12, 12]) {
          const place = { x: point.x + (anchor === 'start' ? 9 : -9), y: point.y + rise, anchor }
          const box = {
            x: anchor === 'start' ? place.x : place.x - width,
            y: place.y - lineHeight / 2,
            width,
            height: lineHeight,
          }
          const inside =
            box.x >= frame.x &&
            box.x + width <= frame.x + frame.width &&
            box.y >= frame.y &&
            box.y + box.height <= frame.y + frame.height
          if (!inside || used.some((other) => overlap(box, other))) continue
          // Steep parts of the curve, near the middle of the frame, read best; each curve prefers another height.
          const slope = Math.abs((points[at + 1]?.y ?? point.y) - (points[at - 1]?.y ?? point.y))
          const height = frame.y + frame.height * (0.38 + 0.2 * index)
          const alone =
            Math.abs(point.y - height) * 0.4 -
            Math.min(slope, 12) * 3 +
            (rise ? 6 : 0) +
            (anchor === 'end' ? 4 : 0)
          // Points in the way are counted, which takes long, only where the place could still be the best.
          if (best && alone >= best.cost) continue
          const crossed = curves.reduce(
            (count, curve) => count + curve.points.filter((each) => holds(box, each)).length,
            0,
          )
          const cost = alone + crossed * 50
          if (!best || cost < best.cost) best = { cost, place, box }
        }
    })
    const fallback = points.at(-1) ?? { x: frame.x, y: frame.y }
    const place: CurveLabel = best?.place ?? { x: fallback.x - 4, y: fallback.y - 10, anchor: 'end' }
    if (best) used.push(best.box)
    return place
  })
}
