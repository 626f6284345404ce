import { calendarTicks } from '../charts/calendar'
import {
  coarser,
  linearScale,
  multiples,
  snapDomain,
  stepAtLeast,
  stepPlaces,
  stepValue,
  textWidth,
  type Step,
} from '../charts/scales'
import { formatNumber } from '../format'

/** Ends of an interval or of limits; null or left out where open. */
export interface RuleEnds {
  lower?: number | null
  upper?: number | null
}

export interface MarginRuleInput {
  estimate: number | null
  interval: RuleEnds | null
  limits: RuleEnds
  /** Further values that the scale must hold, so that two rules beside each other share it. */
  holding?: readonly number[]
  /** Width of the drawing in pixels. */
  width: number
  /** A rule for a table cell: no numbers, little height. */
  compact?: boolean
  /** Values are day numbers (`dayNumber`): ticks stand at firsts of months. */
  calendar?: boolean
  /** Writes the number under a major tick. */
  format?: (value: number, places: number) => string
}

export interface RuleTick {
  x: number
  kind: 'major' | 'half' | 'minor'
  /** Only on major ticks of a full-size rule. */
  label?: string
}

export interface MarginRuleLayout {
  width: number
  height: number
  /** Ends of the ruled line. */
  from: number
  to: number
  ticks: RuleTick[]
  /** The allowed zone, from limit to limit; an open side runs to the end of the rule. */
  zone: { x: number; width: number } | null
  limits: number[]
  bar: { x: number; width: number } | null
  estimate: number | null
  domain: readonly [number, number]
}

const labelSize = 11
const labelGap = 14
/** Room at both ends: for a limit's pointer, and so that rules of one column start and end together. */
const endRoom = { full: 26, compact: 6 }
const leastBar = 3

const defined = (values: (number | null | undefined)[]): number[] =>
  values.filter((value): value is number => typeof value === 'number' && Number.isFinite(value))

/**
 * The values a rule must hold, widened so that limits stand clear of its ends. Shares and counts, which cannot be
 * negative, start at zero when no lower limit says otherwise.
 */
function extentOf({ estimate, interval, limits, holding = [] }: MarginRuleInput): [number, number] | null {
  const bounds = defined([limits.lower, limits.upper])
  const values = defined([estimate, interval?.lower, interval?.upper, ...bounds, ...holding])
  if (!values.length) return null
  let low = Math.min(...values)
  let high = Math.max(...values)
  const fromZero = limits.lower == null && low >= 0
  if (fromZero) low = 0
  const reach = bounds.length === 2 ? Math.abs(bounds[1]! - bounds[0]!) : high - low
  const room = 0.22 * (reach || Math.abs(high) || 1)
  if (!fromZero && (bounds.includes(low) || interval?.lower == null)) low -= room
  if (bounds.includes(high) || high - low < reach + room) high += bounds.length === 2 ? room : room * 2
  // An interval or estimate beyond the limits must not touch the end of the rule either.
  const clear = 0.05 * (high - low)
  if (!fromZero && !bounds.includes(low)) low -= clear
  if (!bounds.includes(high)) high += clear
  // Values that a double hardly tells apart still get a rule with a width.
  const least = 1e-9 * Math.max(Math.abs(low), Math.abs(high), 1e-3)
  return high - low < least ? [low - Math.max(room, least), high + Math.max(room, least)] : [low, high]
}

/** Divisions between two major ticks, and which of them is the half. */
function divisions(step: Step, pixels: number): { count: number; half: number | null } {
  const fit = (count: number) => pixels / count >= 4.5
  if (step.mantissa === 2)
    return fit(4) ? { count: 4, half: 2 } : fit(2) ? { count: 2, half: 1 } : { count: 1, half: null }
  if (fit(10)) return { count: 10, half: 5 }
  if (fit(5)) return { count: 5, half: null }
  return fit(2) ? { count: 2, half: 1 } : { count: 1, half: null }
}

/** Leaves out numbers that would touch the one before; happens only where two alone are too long for the drawing. */
function thinOut(ticks: RuleTick[], width: number): RuleTick[] {
  let end = 0
  return ticks.map((tick) => {
    if (!tick.label) return tick
    const half = textWidth(tick.label, labelSize) / 2
    if (tick.x - half < end - 0.5 || tick.x + half > width + 0.5) return { x: tick.x, kind: tick.kind }
    end = tick.x + half
    return tick
  })
}

/** The finest step whose labels stand apart, with the domain snapped to it and the side room the end labels need. */
function chooseScale(extent: [number, number], input: MarginRuleInput) {
  const format = input.format ?? ((value: number, places: number) => formatNumber(value, { digits: places }))
  let step = stepAtLeast((extent[1] - extent[0]) / 16)
  for (;;) {
    const domain = snapDomain(extent, step)
    const places = stepPlaces(step)
    const majors = multiples(domain, step)
    const labels = majors.map((value) => format(value, places))
    const widest = input.compact ? 0 : Math.max(...labels.map((label) => textWidth(label, labelSize)))
    const least = input.compact ? endRoom.compact : endRoom.full
    // Numbers too long for the drawing may not eat the rule; thinOut drops those that do not fit.
    const room = Math.min(Math.max(least, Math.ceil(widest / 2)), Math.floor(input.width / 4))
    const length = input.width - 2 * room
    const spacing = (length * stepValue(step, 1)) / (domain[1] - domain[0])
    const apart = input.compact ? 22 : Math.max(widest + labelGap, 40)
    if (spacing >= apart || majors.length <= 2) return { step, domain, majors, labels, room, spacing }
    step = coarser(step)
  }
}

/** Firsts of months as ticks; the labelled ones are the major ones. */
function calendarRule(domain: readonly [number, number], at: (value: number) => number): RuleTick[] {
  const most = Math.max(1, Math.floor((at(domain[1]) - at(domain[0])) / 76))
  return calendarTicks(domain[0], domain[1], most).map(({ day, label }) => ({
    x: at(day),
    kind: label ? 'major' : 'half',
    label,
  }))
}

function rule(
  majors: number[],
  labels: string[],
  step: Step,
  spacing: number,
  at: (value: number) => number,
) {
  const { count, half } = divisions(step, spacing)
  const ticks: RuleTick[] = []
  majors.forEach((value, index) => {
    ticks.push({ x: at(value), kind: 'major', label: labels[index] })
    if (index === majors.length - 1) return
    for (let part = 1; part < count; part += 1)
      ticks.push({ x: at(value) + (spacing * part) / count, kind: part === half ? 'half' : 'minor' })
  })
  return ticks
}

/**
 * Where everything of a margin rule stands, in pixels. The scale always holds the limits, the interval and the
 * estimate; numbers under the major ticks neither collide nor leave the drawing. Null when there is nothing to draw.
 */
export function layoutMarginRule(input: MarginRuleInput): MarginRuleLayout | null {
  const extent = extentOf(input)
  if (!extent || input.width < 40) return null
  // A calendar has its own ticks; of the number scale it keeps only what both need.
  const { step, domain, majors, labels, room, spacing } = input.calendar
    ? { ...chooseScale(extent, { ...input, compact: true }), domain: extent, room: endRoom.full }
    : chooseScale(extent, input)
  const [from, to] = [room, input.width - room]
  const { at } = linearScale(domain, [from, to])
  const { lower, upper } = input.limits
  const limits = defined([lower, upper])
  const start = lower == null ? from : at(lower)
  const end = upper == null ? to : at(upper)
  const interval = defined([input.interval?.lower, input.interval?.upper]).length ? input.interval : null
  const left = interval && (interval.lower == null ? from : at(interval.lower))
  const right = interval && (interval.upper == null ? to : at(interval.upper))
  const ruled = input.calendar ? calendarRule(domain, at) : rule(majors, labels, step, spacing, at)
  const ticks = thinOut(ruled, input.width)
  return {
    width: input.width,
    height: input.compact ? 20 : 54,
    from,
    to,
    domain,
    ticks: input.compact ? ticks.map(({ x, kind }) => ({ x, kind })) : ticks,
    zone: limits.length && end > start ? { x: start, width: end - start } : null,
    limits: limits.map(at),
    bar:
      left !== null && right !== null
        ? { x: Math.min(left, (left + right - leastBar) / 2), width: Math.max(right - left, leastBar) }
        : null,
    estimate: input.estimate === null || !Number.isFinite(input.estimate) ? null : at(input.estimate),
  }
}
