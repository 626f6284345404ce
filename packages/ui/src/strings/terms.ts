import { noExpiry, type TermField } from '@evenrule/api/contract'
import { formatCount } from '../format'
import { several } from './agreements'

/** What an agreement says beside its clauses, as forms and tables name it. */
export const termLabels: Record<TermField, string> = {
  validityMonths: 'An acceptance holds for',
  calibrationOverdue: 'Calibration overdue',
  outOfLimits: 'Gauge found out of limits',
  repaired: 'Gauge repaired',
  moved: 'Gauge moved',
  changed: 'Software or fixture changed',
  readingsTakerMaySign: 'Who took the readings may sign',
}

/** One plain sentence on each, under its field. */
export const termHints: Record<TermField, string> = {
  validityMonths: 'Whole months from the day of acceptance; proof is due anew after that.',
  calibrationOverdue: 'What becomes of an acceptance while gauge or standard is past its calibration date.',
  outOfLimits: 'Reaches back to the last good calibration.',
  repaired: 'What becomes of an acceptance on the day of the repair.',
  moved: 'What becomes of it when the gauge goes to another place.',
  changed: 'What becomes of it when software or fixture is changed.',
  readingsTakerMaySign: 'Whether the approver of a submission may be who took its readings.',
}

const stops = { suspended: 'acceptance is suspended', stays: 'acceptance stays' } as const

/** The entries of each field that is a choice, the strictest first. */
export const termChoices: Partial<Record<TermField, Readonly<Record<string, string>>>> = {
  calibrationOverdue: {
    'on-hold': 'acceptance is on hold until a calibration finds it within limits',
    stays: stops.stays,
  },
  outOfLimits: stops,
  repaired: stops,
  moved: stops,
  changed: stops,
  readingsTakerMaySign: { false: 'no, another approver signs', true: 'yes' },
}

export const termWords = {
  heading: 'Terms',
  intro: 'What becomes of an acceptance later, and who may sign.',
  notSaid: 'not said here',
  said: (count: number) =>
    count === 0
      ? 'Nothing is said here.'
      : `${several(count, 'term')} ${count === 1 ? 'is' : 'are'} said here.`,
  set: 'Set terms',
  hide: 'Hide terms',
  months: 'months',
  neverExpires: 'no time limit',
  noLimit: 'No time limit, whatever a wider agreement says',
  unsaid: (usual: string) => `Where nobody says it: ${usual}.`,
  caption: 'Terms side by side',
  term: 'Term',
  monthsProblem: 'Enter whole months from 1 to 120, tick that there is no time limit, or leave it empty.',
} as const

/** The value of any term; null is what is not said. */
type Value = number | string | boolean | null

/** The value of one term for reading. */
export function describeTerm(field: TermField, value: Value): string {
  if (value === null) return termWords.notSaid
  if (value === noExpiry) return termWords.neverExpires
  if (field === 'validityMonths') return formatCount(Number(value), 'month')
  return termChoices[field]?.[String(value)] ?? String(value)
}

/** The same where nothing is left open: no validity means no time limit. */
export const describeResolvedTerm = (field: TermField, value: Value): string =>
  field === 'validityMonths' && value === null ? termWords.neverExpires : describeTerm(field, value)
