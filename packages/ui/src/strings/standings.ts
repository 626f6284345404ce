import type { Side } from '@evenrule/api/contract'
import type {
  EquipmentKind,
  GaugeEventKind,
  Standing,
  StandingCause,
  StandingState,
} from '@evenrule/api/contract/standing'
import type { StandingEntry } from '@evenrule/api/contract/standings'
import { formatCount, formatDate } from '../format'

/** How an acceptance stands, in a list or a heading. */
export const standingStateWords: Record<StandingState, string> = {
  stands: 'stands',
  'on-hold': 'on hold',
  suspended: 'suspended',
  expired: 'expired',
  lapsed: 'lapsed',
  reopened: 'reopened',
}

const equipment: Record<EquipmentKind, string> = { gauge: 'gauge', standard: 'reference standard' }
const nameOf = ({ of, code }: { of: EquipmentKind; code: string }): string => `${equipment[of]} ${code}`

/** What happened to a gauge or a standard, behind its name. */
export const equipmentEventWords: Record<GaugeEventKind, string> = {
  'reported-out-of-limits': 'was found out of limits',
  repaired: 'was repaired',
  moved: 'was moved',
  changed: 'was changed in software or fixture',
}

const sinceWords: Record<Exclude<StandingState, 'stands'>, string> = {
  'on-hold': 'On hold',
  suspended: 'Suspended',
  expired: 'Expired',
  lapsed: 'Lapsed',
  reopened: 'Reopened',
}

/** Somebody's words at the end of a sentence, with one full stop whether or not they brought their own. */
const quoted = (said: string): string => `“${said}”${/[.!?…]$/.test(said) ? '' : '.'}`

function causeText(cause: StandingCause): string {
  switch (cause.kind) {
    case 'calibration-overdue':
      return `The calibration of ${nameOf(cause)} was due on ${formatDate(cause.dueOn)}.`
    case 'gauge-event': {
      const doubt = cause.inDoubtSince
        ? ` Readings are in doubt since its last good calibration on ${formatDate(cause.inDoubtSince)}.`
        : ''
      const event = `${equipmentEventWords[cause.event]} on ${formatDate(cause.happenedOn)}`
      return `The ${nameOf(cause)} ${event}: ${quoted(cause.words)}${doubt}`
    }
    case 'validity':
      return `The ${formatCount(cause.months, 'month')} agreed since the acceptance are over.`
    case 'condition':
      return `A condition was due on ${formatDate(cause.dueOn)} and is not confirmed.`
    case 'revision':
      return {
        same: `Revision ${cause.label} of the part is out. Its limits are the same, but the acceptance was not carried over to it.`,
        differ: `Revision ${cause.label} of the part has other limits for this characteristic.`,
        missing: `Revision ${cause.label} of the part no longer has this characteristic.`,
      }[cause.limits]
  }
}

/** What makes it stand again, or takes its place. */
function liftText(cause: StandingCause, customer: string): string {
  switch (cause.kind) {
    case 'calibration-overdue':
      return 'A calibration that finds it within limits lifts this.'
    case 'gauge-event':
      return `A newer accepted submission lifts this, or an approver of ${customer} lets it stand again.`
    case 'validity':
      return 'A new submission takes its place.'
    case 'condition':
      return `It stands again once ${customer} confirms the condition; otherwise a new submission takes its place.`
    case 'revision':
      return cause.limits === 'same'
        ? `An approver of ${customer} can carry it over on the page of the part.`
        : cause.limits === 'differ'
          ? 'A new submission under the new limits takes its place.'
          : ''
  }
}

/** How an acceptance stands: the decisive part, and why and what lifts it. */
export function describeStanding(standing: Standing, customer: string): { strong: string; rest: string } {
  const { state, cause, since } = standing
  if (state === 'stands' || !cause) return { strong: '', rest: lifeText(standing) }
  return {
    strong: `${sinceWords[state]} since ${formatDate(since)}.`,
    rest: [causeText(cause), liftText(cause, customer)].filter(Boolean).join(' '),
  }
}

/** How long it stands if nothing happens. */
export function lifeText({ until, calibrationDueOn }: Standing): string {
  const valid = until === null ? 'The acceptance does not run out.' : `Valid until ${formatDate(until)}.`
  return calibrationDueOn === null
    ? valid
    : `${valid} The next calibration it rests on is due on ${formatDate(calibrationDueOn)}.`
}

/** One line of what happened to an acceptance. */
export function describeStandingEntry(entry: StandingEntry): { what: string; words: string } {
  switch (entry.kind) {
    case 'calibration':
      return {
        what: `The ${nameOf(entry)} was calibrated and found within limits; next due ${formatDate(entry.dueOn)}`,
        words: '',
      }
    case 'gauge-event': {
      const doubt = entry.inDoubtSince ? `, in doubt since ${formatDate(entry.inDoubtSince)}` : ''
      return { what: `The ${nameOf(entry)} ${equipmentEventWords[entry.event]}${doubt}`, words: entry.words }
    }
    case 'reinstated':
      return { what: `${entry.by ?? someone.customer} let it stand again`, words: entry.words }
    case 'carried-over':
      return {
        what: `${entry.by ?? someone.customer} carried it over to revision ${entry.revision}`,
        words: '',
      }
  }
}

const someone: Record<Side, string> = {
  supplier: 'Somebody of the supplier',
  customer: 'An approver of the customer',
}

export const standingSectionWords = {
  heading: 'Does the acceptance still stand?',
  yes: 'Yes.',
  no: 'No.',
  history: 'What happened to it',
  reinstate: 'Let it stand again',
  reinstateTitle: 'Let the acceptance stand again?',
  reinstateText: (supplier: string) =>
    `What was reported of the gauge so far no longer suspends it. ${supplier} is told at once, and your reason stands in the record of both sides.`,
  reinstateWords: 'Why it stands again',
  reinstateMissing: 'Say why it stands again.',
} as const
