import { placeCurveLabels, type Box } from './labels'
import { niceAxis, textWidth, type Axis } from './scales'

/** How a curve is drawn: the proposal solid, the one in force dashed, what rewards the wrong thing in rust. */
export type CurveStyle = 'solid' | 'dashed' | 'rust' | 'rust-dashed'

export interface CurveSeries {
  label: string
  points: readonly { x: number; y: number }[]
  style?: CurveStyle
}

/** Two lists that go together as points; what is not defined leaves a gap. */
export const pointsOf = (xs: readonly number[], ys: readonly (number | null)[]) =>
  xs.map((x, at) => ({ x, y: ys[at] ?? Number.NaN }))

export interface CurveInput {
  series: readonly CurveSeries[]
  width: number
  height: number
  /** A value on the x axis with a pointer: the margin, the planned number of readings. */
  pointer?: { x: number; label: string } | null
  /** Tints the area from the left end, or from minus to plus the pointer, up to it. */
  zone?: boolean
  /** A value on the x axis that is marked by a slide: names keep clear of it. */
  slide?: number | null
  /** A horizontal limit. */
  limit?: { y: number; label: string } | null
  xFormat?: (value: number, places: number) => string
  yFormat?: (value: number, places: number) => string
  yDomain?: readonly [number, number]
  yFromZero?: boolean
}

export interface CurveLayout {
  left: number
  right: number
  top: number
  bottom: number
  x: Axis
  y: Axis
  zone: { x: number; width: number } | null
  pointer: { x: number; label: string; labelX: number; anchor: 'start' | 'end' } | null
  limit: { y: number; label: string } | null
  curves: {
    path: string
    style: CurveStyle
    label: string
    labelX: number
    labelY: number
    anchor: 'start' | 'end'
  }[]
}

const extent = (values: number[]): [number, number] =>
  values.reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  )

/** A polyline of points in pixels; a gap where a value is not defined. */
const pathOf = (points: { x: number; y: number }[]): string =>
  points.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join('')

/** The points of a curve with more between them where they stand apart, so that labels keep off the whole line. */
function followed(points: { x: number; y: number }[], step = 8): { x: number; y: number }[] {
  return points.flatMap((point, at) => {
    const next = points[at + 1]
    if (!next) return [point]
    const count = Math.max(1, Math.ceil(Math.hypot(next.x - point.x, next.y - point.y) / step))
    return Array.from({ length: count }, (_, part) => ({
      x: point.x + ((next.x - point.x) * part) / count,
      y: point.y + ((next.y - point.y) * part) / count,
    }))
  })
}

/** Where everything of a plot of curves stands, in pixels. Null without a single defined point. */
export function layoutCurves(input: CurveInput): CurveLayout | null {
  const series = input.series.map((each) => ({
    ...each,
    points: each.points.filter(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)),
  }))
  const all = series.flatMap(({ points }) => points)
  if (!all.length) return null
  const top = 30
  const bottom = input.height - 42
  const xs = extent([...all.map(({ x }) => x), ...(input.pointer ? [input.pointer.x] : [])])
  const ys = input.yDomain ?? extent([...all.map(({ y }) => y), ...(input.limit ? [input.limit.y] : [])])
  const yRange: [number, number] = [Math.min(ys[0], input.yFromZero ? 0 : ys[0]), ys[1]]
  const y = niceAxis(yRange, [bottom, top], { spacing: 44, format: input.yFormat })
  const left = 14 + Math.max(...y.ticks.map(({ label }) => textWidth(label, 11)))
  const right = input.width - 14
  const x = niceAxis(xs, [left, right], { spacing: 64, format: input.xFormat, snap: false })
  const pixels = series.map((each) => ({
    ...each,
    points: each.points.map((point) => ({ x: x.scale.at(point.x), y: y.scale.at(point.y) })),
  }))

  const pointerX = input.pointer ? x.scale.at(input.pointer.x) : 0
  const wide = input.pointer ? textWidth(input.pointer.label, 11) + 10 : 0
  const anchor = pointerX + wide > right ? 'end' : 'start'
  const pointer = input.pointer && {
    x: pointerX,
    label: input.pointer.label,
    anchor: anchor as 'start' | 'end',
    labelX: pointerX + (anchor === 'start' ? 9 : -9),
  }
  const taken: Box[] = pointer ? [{ x: pointer.x - 4, y: top - 14, width: 8, height: bottom - top + 14 }] : []
  if (input.slide != null)
    taken.push({ x: x.scale.at(input.slide) - 5, y: top, width: 10, height: bottom - top })
  const limit = input.limit && { y: y.scale.at(input.limit.y), label: input.limit.label }
  if (limit) {
    const width = textWidth(limit.label, 11)
    taken.push(
      { x: right - width - 4, y: limit.y - 17, width: width + 4, height: 17 },
      { x: left, y: limit.y - 1, width: right - left, height: 2 },
    )
  }
  const frame = { x: left + 4, y: top, width: right - left - 4, height: bottom - top - 4 }
  const labels = placeCurveLabels(
    pixels.map(({ label, points }) => ({ label, points: followed(points) })),
    frame,
    taken,
  )
  const zoneStart = input.pointer && xs[0] < 0 ? x.scale.at(-Math.abs(input.pointer.x)) : left
  return {
    left,
    right,
    top,
    bottom,
    x,
    y,
    zone: input.zone && input.pointer ? { x: zoneStart, width: Math.max(0, pointerX - zoneStart) } : null,
    pointer: pointer ?? null,
    limit: limit ?? null,
    curves: pixels.map(({ label, style, points }, at) => ({
      label,
      style: style ?? 'solid',
      path: pathOf(points),
      labelX: labels[at]!.x,
      labelY: labels[at]!.y + 4,
      anchor: labels[at]!.anchor,
    })),
  }
}
