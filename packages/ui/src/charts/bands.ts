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

/** A name inside its band, or above the plot with a leader down to `to` where it fits nowhere inside. */
export interface BandLabel {
  x: number
  y: number
  text: string
  to: { x: number; y: number } | null
}

export interface BandsLayout {
  left: number
  right: number
  top: number
  bottom: number
  x: Axis
  y: Axis
  bands: { name: BandName; path: string; label: BandLabel | null }[]
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

const leastRoom = 18
const visible = 6

/** The place inside a band where its name has most room, else above the plot; null where there is hardly a band. */
function labelIn(
  lower: { x: number; y: number }[],
  upper: { x: number; y: number }[],
  text: string,
  left: number,
  right: number,
): BandLabel | null {
  const half = textWidth(text, size) / 2 + 4
  let inside: { room: number; x: number; y: number } | null = null
  let widest: { room: number; x: number; y: number } | null = null
  // Every few points are places enough; all of them bound the room.
  const stride = Math.ceil(lower.length / 40)
  for (let at = 0; at < lower.length; at += stride) {
    const { x, y } = lower[at]!
    const top = upper[at]!.y
    if (!widest || y - top > widest.room) widest = { room: y - top, x, y: (y + top) / 2 }
    if (x - half < left || x + half > right) continue
    let floor = Infinity
    let ceiling = -Infinity
    for (const [index, point] of lower.entries()) {
      if (Math.abs(point.x - x) > half) continue
      floor = Math.min(floor, point.y)
      ceiling = Math.max(ceiling, upper[index]!.y)
    }
    const room = floor - ceiling
    if (room > leastRoom && (!inside || room > inside.room)) inside = { room, x, y: (floor + ceiling) / 2 }
  }
  if (inside) return { x: inside.x, y: inside.y + 4, text, to: null }
  if (!widest || widest.room < visible) return null
  const x = Math.min(Math.max(widest.x, left + half), right - half)
  return { x, y: 14, text, to: { x: widest.x, y: widest.y } }
}
