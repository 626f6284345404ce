import type { IncentiveChange } from '@evenrule/metrology'
import { formatChance, formatShare } from '../format'

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

/** Both chances, with as many places as it takes to see that they differ. */
function writeChances(before: number, after: number): string {
  const plain = [before, after].map(formatChance)
  if (before === after || plain[0] !== plain[1]) return plain.join(' → ')
  for (let digits = 1; digits <= 6; digits += 1) {
    const pair = [before, after].map((chance) => formatShare(chance, { digits }))
    if (pair[0] !== pair[1]) return pair.join(' → ')
  }
  return plain.join(' → ')
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
    effect: `${words}: ${writeChances(before, after)}`,
    wrong: direction !== 'same' && direction !== soundDirection[change],
  }
}
