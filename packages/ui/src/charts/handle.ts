import type { LinearScale } from './scales'

/** A value that can be dragged along the x axis of a plot, or moved by keys. */
export interface HandleInput {
  /** What it sets: "Planned readings". */
  label: string
  value: number
  least: number
  most: number
  /** Values are whole steps. */
  step: number
  /** The value in words: "25 readings". */
  text: string
}

/** The nearest whole step inside the bounds, without the dust of binary fractions. */
export function snapped(
  value: number,
  { least, most, step }: Pick<HandleInput, 'least' | 'most' | 'step'>,
): number {
  const bounded = Math.min(Math.max(value, least), most)
  const whole = Number((Math.round(bounded / step) * step).toPrecision(12))
  return Math.min(Math.max(whole, least), most)
}

/** The value at a place of the drawing, in pixels. */
export function valueAt(pixel: number, { domain, range }: LinearScale): number {
  const length = range[1] - range[0]
  return length === 0 ? domain[0] : domain[0] + ((pixel - range[0]) / length) * (domain[1] - domain[0])
}

const steps: Record<string, number> = {
  ArrowLeft: -1,
  ArrowDown: -1,
  ArrowRight: 1,
  ArrowUp: 1,
  PageDown: -10,
  PageUp: 10,
}

/** Where a key moves the value to; null for a key that does not. */
export function keyed(key: string, handle: HandleInput): number | null {
  if (key === 'Home') return handle.least
  if (key === 'End') return handle.most
  const count = steps[key]
  return count === undefined ? null : snapped(handle.value + count * handle.step, handle)
}

/** A step of one, two or five hundredths of a value, so that keys move it by a reasonable amount. */
export function stepOf(value: number): number {
  const places = Math.floor(Math.log10(value)) - 1
  return Number(`1e${places}`)
}
