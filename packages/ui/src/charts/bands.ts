import { textWidth, niceAxis, type Axis } from './scales'

/** The chances of the three verdicts at one place of the x axis; they add to one. */
export interface BandPoint {
  x: number
  meets: number
  notShown: number
  fallsShort: number
}

export type BandName = 'meets' | 'not-shown' | 'falls-short'

export interface BandsInput {
  points: readonly BandPoint[]
  width: number
  height: number
  words: Record<BandName, string>
  yFormat: (value: number) => string
}

export interface BandsLayout {
  left: number
  right: number
  top: number
  bottom: number
  x: Axis
  y: Axis
  bands: { name: BandName; path: string; label: { x: number; y: number; text: string } | null }[]
}

const names: readonly BandName[] = ['meets', 'not-shown', 'falls-short']
const size = 11

/** Lower edge of each band of a point, and the top: they stand on one another. */
const edges = ({ meets, notShown }: BandPoint): [number, number, number, number] => [
  0,
  meets,
  Math.min(1, meets + notShown),
  1,
]

/**
 * The chance of each verdict as bands that stand on one another and always fill the height. A band is named where it
 * is widest, if the name fits there. Null without points.
 */
export function layoutBands({ points, width, height, words, yFormat }: BandsInput): BandsLayout | null {
  const [first] = points
  const end = points.at(-1)
  if (!first || !end) return null
  const top = 30
  const bottom = height - 42
  const y = niceAxis([0, 1], [bottom, top], { spacing: 44, format: yFormat })
  const left = 14 + Math.max(...y.ticks.map(({ label }) => textWidth(label, size)))
  const right = width - 14
  const x = niceAxis([first.x, end.x], [left, right], { spacing: 64, snap: false })
  const bands = names.map((name, at) => {
    const edge = (which: 0 | 1) =>
      points.map((point) => ({ x: x.scale.at(point.x), y: y.scale.at(edges(point)[at + which] ?? 0) }))
    const [lower, upper] = [edge(0), edge(1)]
    const write = ({ x: px, y: py }: { x: number; y: number }) => `${px.toFixed(1)} ${py.toFixed(1)}`
    const path = `M${[...upper, ...lower.toReversed()].map(write).join('L')}Z`
    return { name, path, label: labelIn(lower, upper, words[name], left, right) }
  })
  return { left, right, top, bottom, x, y, bands }
}

/** The place inside a band where its name has most room; null where it fits nowhere. */
function labelIn(
  lower: { x: number; y: number }[],
  upper: { x: number; y: number }[],
  text: string,
  left: number,
  right: number,
): { x: number; y: number; text: string } | null {
  const half = textWidth(text, size) / 2 + 4
  let best: { room: number; x: number; y: number } | null = null
  for (const { x } of lower) {
    if (x - half < left || x + half > right) continue
    const under = lower
      .map((point, index) => ({ point, above: upper[index]! }))
      .filter(({ point }) => Math.abs(point.x - x) <= half)
    const floor = Math.min(...under.map(({ point }) => point.y))
    const ceiling = Math.max(...under.map(({ above }) => above.y))
    const room = floor - ceiling
    const middle = (floor + ceiling) / 2
    if (room > 18 && (!best || room > best.room)) best = { room, x, y: middle + 4 }
  }
  return best && { x: best.x, y: best.y, text }
}
