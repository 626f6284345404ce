import type { IncentiveChange } from '@evenrule/metrology'
import { formatChance } from '../format'

/** What is changed to see whether a clause rewards the right thing. */
export const incentiveWords: Record<IncentiveChange, string> = {
  'worse-repeatability': 'A gauge with twice the spread',
  'more-readings': 'Twice as many readings',
  'stricter-risk': 'Half the risk level',
}

/** Which direction of the chance to pass a sound clause shows for each change. */
const soundDirection: Record<IncentiveChange, 'more' | 'less'> = {
  'worse-repeatability': 'less',
  'more-readings': 'more',
  'stricter-risk': 'less',
}

export interface IncentiveSentence {
  /** "A gauge with twice the spread" */
  change: string
  /** "passes more often: 38 % → 80 %" */
  effect: string
  /** Whether the clause rewards the wrong thing here. */
  wrong: boolean
}

/** The effect of one change in words; chances that differ by less than a billionth count as equal. */
export function describeIncentive(change: IncentiveChange, before: number, after: number): IncentiveSentence {
  const difference = after - before
  const direction = Math.abs(difference) <= 1e-9 ? 'same' : difference > 0 ? 'more' : 'less'
  const words = {
    same: 'passes as often',
    more: 'passes more often',
    less: 'passes less often',
  }[direction]
  return {
    change: incentiveWords[change],
    effect: `${words}: ${formatChance(before)} → ${formatChance(after)}`,
    wrong: direction !== 'same' && direction !== soundDirection[change],
  }
}
