import type { Verdict } from '@evenrule/metrology'
import type { Ends, Unit } from '../format'
import { unitText } from '../format/numbers'
import { supposedWords, verdictWords } from './verdicts'

interface RuleFigures {
  label?: string
  estimate: number | null
  interval: Ends | null
  limits: Ends
  verdict: Verdict
  unit?: Unit
  /** A what-if: told in words that no verdict has. */
  supposed?: boolean
  write(value: number): string
}

/** Both ends in words. */
function ends({ lower, upper }: Ends, unit: Unit, write: (value: number) => string): string {
  if (lower != null && upper != null) {
    if (upper > 0 && lower === -upper) return `±${write(upper)}${unitText(unit)}`
    return `${write(lower)} to ${write(upper)}${unitText(unit)}`
  }
  if (upper != null) return `at most ${write(upper)}${unitText(unit)}`
  return lower != null ? `at least ${write(lower)}${unitText(unit)}` : ''
}

/**
 * The margin rule for ears:
 * "bias −0.0009 mm, interval −0.0017 to −0.0001 mm, limits ±0.0025 mm, meets".
 */
export function describeRule({
  label = 'estimate',
  estimate,
  interval,
  limits,
  verdict,
  unit,
  supposed,
  write,
}: RuleFigures): string {
  const figure = estimate === null ? 'not defined' : `${write(estimate)}${unitText(unit)}`
  const range = interval && ends(interval, unit, write)
  const allowed = ends(limits, unit, write)
  return [
    `${label} ${figure}`,
    range && `interval ${range}`,
    allowed && `limits ${allowed}`,
    (supposed ? supposedWords : verdictWords)[verdict],
  ]
    .filter(Boolean)
    .join(', ')
}
