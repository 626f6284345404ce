import type { gaugeEvents } from '@evenrule/api/contract'
import { formatCount, formatDate } from '../format'

/** What happened to a gauge, in a table and in choices. */
export const gaugeEventKindWords: Record<gaugeEvents.GaugeEventKind, string> = {
  'reported-out-of-limits': 'found out of limits',
  repaired: 'repaired',
  moved: 'moved',
  changed: 'software or fixture changed',
}

const hints: Record<gaugeEvents.GaugeEventKind, string> = {
  'reported-out-of-limits': 'reaches back to the last good calibration',
  repaired: 'parts exchanged, adjusted or ground',
  moved: 'to another place or another foundation',
  changed: 'another version, program, fixture or probe',
}

export const gaugeEventChoices = (['reported-out-of-limits', 'repaired', 'moved', 'changed'] as const).map(
  (value) => ({ value, label: gaugeEventKindWords[value], hint: hints[value] }),
)

export const gaugeEventWords = {
  heading: 'What happened to it',
  report: 'Report an event',
  title: (code: string) => `What happened to ${code}?`,
  kind: 'Event',
  happenedOn: 'On',
  words: 'In a few words',
  wordsHint: 'The customers concerned read these words; the file stays with you.',
  what: 'In words',
  file: 'File',
  fileHint: 'Optional: a report or photograph, as PDF, PNG or JPEG, at most 20 MB.',
  consequence: 'Acceptances',
  kindMissing: 'Choose what happened.',
  happenedOnMissing: 'Enter the day on which it happened.',
  wordsMissing: 'Say in a few words what happened.',
  send: (suspended: number) =>
    suspended === 0 ? 'Report it' : `Report it and suspend ${formatCount(suspended, 'acceptance')}`,
  by: (name: string | null, day: string) => `Reported by ${name ?? 'somebody of before'}, ${day}`,
  certificate: (number: string) => `certificate ${number}`,
  emptyTitle: 'Nothing reported',
  emptyText:
    'Report here when the gauge is found out of limits, repaired, moved or changed: acceptances are then suspended as agreed, and each customer is told of theirs.',
} as const

/** What an event did when it was reported. */
export function consequenceText({
  suspended,
  stays,
}: Pick<gaugeEvents.GaugeEvent, 'suspended' | 'stays'>): string {
  if (suspended === 0 && stays === 0) return 'none concerned'
  return [suspended > 0 ? `${suspended} suspended` : '', stays > 0 ? `${stays} stayed, as agreed` : '']
    .filter(Boolean)
    .join(', ')
}

export const effectWords = {
  looking: 'Looking what it concerns …',
  list: 'Acceptances concerned',
  submission: (number: number) => `Submission ${number}`,
  about: ({ customer, partNumber, characteristicNumber, characteristicName }: Concerned) =>
    `${customer}: ${partNumber} no. ${characteristicNumber} ${characteristicName}`,
  effects: { suspended: 'will be suspended', stays: 'stays, as agreed' },
} as const

type Concerned = gaugeEvents.EventEffect['acceptances'][number]

const listed = (names: readonly string[]): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`

/** What reporting it will do: the decisive part, and the rest. */
export function effectAnswer(effect: gaugeEvents.EventEffect): { strong: string; rest: string } {
  const { suspended, stays, underReview, reachesBack, lastGoodOn } = effect
  const customers = [
    ...new Set(
      effect.acceptances.filter((each) => each.effect === 'suspended').map(({ customer }) => customer),
    ),
  ]
  const doubt = !reachesBack
    ? ''
    : lastGoodOn
      ? `, in doubt since its last good calibration on ${formatDate(lastGoodOn)}`
      : ', in doubt from the beginning: no good calibration is entered'
  const rest = [
    stays > 0 ? `${formatCount(stays, 'acceptance')} ${stays === 1 ? 'stays' : 'stay'}, as agreed.` : '',
    underReview > 0
      ? `${formatCount(underReview, 'submission')} under review: the customer is told and decides knowing it.`
      : '',
    suspended + stays + underReview > 0 ? 'Every customer concerned is told.' : '',
  ]
  return {
    strong:
      suspended === 0
        ? 'No acceptance will be suspended.'
        : `${formatCount(suspended, 'acceptance')} with ${listed(customers)} will be suspended${doubt}.`,
    rest: rest.filter(Boolean).join(' '),
  }
}
