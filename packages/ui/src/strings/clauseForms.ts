import type { AgreedBaseline } from '@evenrule/metrology'
import { several } from './agreements'

/** Controls of the form of a clause that are the same for every type. */
export const clauseFormWords = {
  textMissing: 'Write it here.',
  longest: (most: number) => `Use ${most} characters or fewer.`,
  keyMissing: 'Choose the clause.',
  noKeys: 'No clause of a wider scope is in force that could be taken away.',
  baseline: 'Where the tolerance has one limit only, the share is of',
  baselineHint: (count: number) =>
    count > 0
      ? `${several(count, 'characteristic')} of this scope ${count === 1 ? 'has' : 'have'} one limit only, so there is no width to take a share of. Without a baseline the clause cannot be computed there.`
      : 'A one-sided tolerance has no width to take a share of. Where there are two limits, their width counts.',
  baselineValue: { 'natural-bound': 'Natural bound', absolute: 'Width', process: '' },
  baselineValueHint: {
    'natural-bound': 'In the unit of the characteristic; 0 for what cannot be negative.',
    absolute: '',
    process: '',
  },
  baselineProblem: (what: string) => `For one-sided tolerances: ${what}`,
  unit: 'Unit',
} as const

/** What stands in for the width of a one-sided tolerance. */
export const baselineKindWords: Record<AgreedBaseline['kind'] | '', string> = {
  '': 'nothing: not for one-sided tolerances',
  'natural-bound': 'the distance from the limit to a natural bound',
  process: 'the process variation (six standard deviations)',
  absolute: 'a width with its unit',
}
