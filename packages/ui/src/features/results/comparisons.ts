import { wayWords as words } from '../../strings/results'
import { writeApart } from './digits'

/** Where an interval lies against ± margin, in numbers; texts differ where the numbers do. */
export function intervalComparison(lower: number, upper: number, margin: number, digits: number): string {
  const bounds = (value: number) => writeApart(Math.abs(value), margin, digits)
  const signed = (value: number) =>
    (value < 0 && bounds(value)[0].match(/[1-9]/) ? '−' : '') + bounds(value)[0]
  const limitBeside = (value: number) => bounds(value)[1]
  if (lower > margin) return words.above(limitBeside(lower), signed(lower))
  if (upper < -margin) return words.below(limitBeside(upper), signed(upper))
  if (upper > margin) return words.reachesAbove(limitBeside(upper), signed(upper))
  if (lower < -margin) return words.reachesBelow(limitBeside(lower), signed(lower))
  return words.inside(limitBeside(upper), signed(lower), signed(upper))
}

/** "0.0012 ≤ 0.0015" or "0.0018 > 0.0015". */
export function atMostComparison(value: number, limit: number, digits: number, unit?: string): string {
  const [a, b] = writeApart(value, limit, digits, { unit })
  return value <= limit ? words.atMost(a, b) : words.over(a, b)
}
