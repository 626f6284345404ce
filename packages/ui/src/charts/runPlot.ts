import type { Ends } from '../format'
import { spread } from './labels'
import { niceAxis, textWidth, type Axis } from './scales'

export interface RunInput {
  readings: readonly number[]
  reference?: number | null
  mean?: number | null
  /** Interval of the mean, as values: a pale band behind the readings. */
  band?: Ends | null
  /** Limits of the readings' mean as values: the reference value plus and minus the margin. */
  margin?: Ends | null
  /** Zero-based places of readings to mark. */
  marked?: readonly number[]
  /** Zero-based places of readings that are chosen, or in question. */
  framed?: readonly number[]
  width: number
  height: number
  yFormat?: (value: number, places: number) => string
  /** Texts beside the lines, written by the caller. */
  words: { reference: string; mean: string; lower: string; upper: string }
}

export interface RunLayout {
  left: number
  right: number
  top: number
  bottom: number
  x: Axis
  y: Axis
  radius: number
  points: { x: number; y: number; marked: boolean; framed: boolean; number: number }[]
  zone: { y: number; height: number } | null
  band: { y: number; height: number } | null
  lines: { kind: 'limit' | 'reference' | 'mean'; y: number; label: string; labelY: number }[]
}

/** Readings in the order taken, with the lines they are judged against, in pixels. Null without readings. */
export function layoutRun(input: RunInput): RunLayout | null {
  const { readings, margin, band, words } = input
  if (!readings.length) return null
  const lines = (
    [
      ['limit', margin?.upper, words.upper],
      ['reference', input.reference, words.reference],
      ['mean', input.mean, words.mean],
      ['limit', margin?.lower, words.lower],
    ] as const
  ).flatMap(([kind, value, label]) => (value == null ? [] : [{ kind, value, label }]))
  const top = 26
  const bottom = input.height - 42
  const ofBand = [band?.lower, band?.upper].filter((end) => end != null)
  const values = [...readings, ...ofBand, ...lines.map(({ value }) => value)]
  const low = values.reduce((a, b) => Math.min(a, b))
  const high = values.reduce((a, b) => Math.max(a, b))
  const room = (high - low || Math.abs(high) || 1) * 0.05
  const y = niceAxis([low - room, high + room], [bottom, top], { spacing: 38, format: input.yFormat })
  const left = 14 + Math.max(...y.ticks.map(({ label }) => textWidth(label, 11)))
  const gutter = Math.max(0, ...lines.map(({ label }) => textWidth(label, 11))) + 14
  const right = Math.max(input.width - gutter, left + 80)
  const inset = Math.min(16, (right - left) / (readings.length * 2))
  const x = niceAxis([1, Math.max(readings.length, 2)], [left + inset, right - inset], {
    spacing: 48,
    snap: false,
    format: (value) => (Number.isInteger(value) ? String(value) : ''),
  })
  const marked = new Set(input.marked)
  const framed = new Set(input.framed)
  const upper = margin?.upper == null ? top : y.scale.at(margin.upper)
  const lower = margin?.lower == null ? bottom : y.scale.at(margin.lower)
  const at = lines.map(({ value }) => y.scale.at(value))
  const labelY = spread(at, 14, [top + 4, bottom - 2])
  return {
    left,
    right,
    top,
    bottom,
    x: { ...x, ticks: firstAnd(x, readings.length) },
    y,
    radius: readings.length > 150 ? 2 : readings.length > 60 ? 2.6 : 3.4,
    points: readings.map((value, index) => ({
      x: x.scale.at(index + 1),
      y: y.scale.at(value),
      marked: marked.has(index),
      framed: framed.has(index),
      number: index + 1,
    })),
    zone:
      margin && (margin.lower != null || margin.upper != null) ? { y: upper, height: lower - upper } : null,
    band:
      band?.lower == null || band.upper == null
        ? null
        : { y: y.scale.at(band.upper), height: y.scale.at(band.lower) - y.scale.at(band.upper) },
    lines: lines.map(({ kind, label }, index) => ({ kind, label, y: at[index]!, labelY: labelY[index]! })),
  }
}

/** Whole reading numbers only, the first one always. */
function firstAnd(axis: Axis, count: number): Axis['ticks'] {
  const first = { value: 1, at: axis.scale.at(1), label: '1' }
  const rest = axis.ticks.filter(
    ({ value, at }) => Number.isInteger(value) && value > 1 && value <= count && at - first.at > 34,
  )
  return [first, ...rest]
}
