import { decimalPlaces, formatNumber } from '../format'

/** A decimal step: `mantissa` · 10^`exponent` with mantissa 1, 2 or 5. */
export interface Step {
  mantissa: 1 | 2 | 5
  exponent: number
}

/** Where values of a quantity stand along an axis, in pixels. */
export interface LinearScale {
  domain: readonly [number, number]
  range: readonly [number, number]
  at(value: number): number
}

/** Value of `count` steps, formed in decimal so that 3 · 0.1 is 0.3. */
export const stepValue = (step: Step, count: number): number =>
  Number(`${step.mantissa * count}e${step.exponent}`)

const sizeOf = (step: Step): number => stepValue(step, 1)

/** The next coarser step: 1, 2, 5, 10, … */
export function coarser({ mantissa, exponent }: Step): Step {
  if (mantissa === 5) return { mantissa: 1, exponent: exponent + 1 }
  return { mantissa: mantissa === 1 ? 2 : 5, exponent }
}

/** The finest step of 1, 2 or 5 times a power of ten that is at least `size`. */
export function stepAtLeast(size: number): Step {
  let step: Step = { mantissa: 1, exponent: Math.floor(Math.log10(size)) - 1 }
  // The tolerance keeps 0.30000000000000004 from asking for 0.5.
  while (sizeOf(step) < size * (1 - 1e-9)) step = coarser(step)
  return step
}

/** The domain widened to whole steps on both sides. */
export function snapDomain([low, high]: readonly [number, number], step: Step): [number, number] {
  const size = sizeOf(step)
  const first = Math.floor(low / size + 1e-9)
  const last = Math.max(Math.ceil(high / size - 1e-9), first + 1)
  return [stepValue(step, first), stepValue(step, last)]
}

/** All multiples of the step within the domain, ends included. */
export function multiples([low, high]: readonly [number, number], step: Step): number[] {
  const size = sizeOf(step)
  const first = Math.ceil(low / size - 1e-9)
  const last = Math.floor(high / size + 1e-9)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, at) => stepValue(step, first + at))
}

/** Decimal places that tell the multiples of a step apart. */
export const stepPlaces = (step: Step): number => decimalPlaces(sizeOf(step))

export function linearScale(
  domain: readonly [number, number],
  range: readonly [number, number],
): LinearScale {
  const width = domain[1] - domain[0]
  const at = (value: number) =>
    width === 0 ? (range[0] + range[1]) / 2 : range[0] + ((value - domain[0]) / width) * (range[1] - range[0])
  return { domain, range, at }
}

/** Widths of Noto Sans characters in parts of the type size; everything else counts as a wide letter. */
const narrow = new Map(
  Object.entries({ '.': 0.27, ',': 0.27, ' ': 0.26, '\u202F': 0.15, '/': 0.37, i: 0.26, l: 0.26, t: 0.36 }),
)

/** Width of a short text in pixels; close enough to keep labels apart, and the same in every environment. */
export function textWidth(text: string, size: number): number {
  let width = 0
  for (const character of text)
    width += narrow.get(character) ?? (/[0-9−+±%a-z]/.test(character) ? 0.585 : 0.68)
  return width * size
}

export interface Axis {
  scale: LinearScale
  step: Step
  ticks: { value: number; at: number; label: string }[]
}

/**
 * An axis over the extent, widened to whole steps, with as many labelled ticks as fit at `spacing` pixels apart.
 * `format` writes a tick's label; the default shows the places of the step.
 */
export function niceAxis(
  extent: readonly [number, number],
  range: readonly [number, number],
  {
    spacing,
    format,
    snap = true,
  }: { spacing: number; format?: (value: number, places: number) => string; snap?: boolean },
): Axis {
  const length = Math.abs(range[1] - range[0])
  const [low, high] = extent[0] === extent[1] ? [extent[0] - 0.5, extent[1] + 0.5] : extent
  let step = stepAtLeast(((high - low) * spacing) / Math.max(length, spacing))
  let domain = snap ? snapDomain([low, high], step) : ([low, high] as [number, number])
  // Snapping widens the domain, which may ask for a coarser step once more.
  while (
    (length / (domain[1] - domain[0])) * sizeOf(step) < spacing * 0.8 &&
    domain[1] - domain[0] > sizeOf(step)
  ) {
    step = coarser(step)
    if (snap) domain = snapDomain([low, high], step)
  }
  const scale = linearScale(domain, range)
  const places = stepPlaces(step)
  const label = (value: number) => format?.(value, places) ?? formatNumber(value, { digits: places })
  return {
    scale,
    step,
    ticks: multiples(domain, step).map((value) => ({ value, at: scale.at(value), label: label(value) })),
  }
}
