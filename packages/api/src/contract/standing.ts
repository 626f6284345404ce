import { z } from 'zod'
import { calendarDate, uuid } from './common'
import { addDays, addMonths, laterDay } from './days'
import type { ResolvedTerms } from './terms'

/** How an accepted submission stands on a day; derived from facts and the day, never stored. */
export const standingStates = ['stands', 'on-hold', 'suspended', 'expired', 'lapsed', 'reopened'] as const
export type StandingState = (typeof standingStates)[number]

/** What can happen to a gauge that puts its acceptances in doubt. */
export const gaugeEventKinds = ['reported-out-of-limits', 'repaired', 'moved', 'changed'] as const
export type GaugeEventKind = (typeof gaugeEventKinds)[number]

/** What is calibrated: the gauge of the task, or a reference standard of its studies. */
export const equipmentKinds = ['gauge', 'standard'] as const
export type EquipmentKind = (typeof equipmentKinds)[number]

/** How the limits of a characteristic in a newer revision compare with those that were accepted. */
export const limitsComparisons = ['same', 'differ', 'missing'] as const
export type LimitsComparison = (typeof limitsComparisons)[number]

const equipment = { of: z.enum(equipmentKinds), code: z.string() }

export const standingCauseSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('calibration-overdue'), ...equipment, dueOn: calendarDate }),
  z.object({
    kind: z.literal('gauge-event'),
    ...equipment,
    event: z.enum(gaugeEventKinds),
    eventId: uuid,
    happenedOn: calendarDate,
    /** Day of the last good calibration where the event reaches back to it; null where it does not, or none is known. */
    inDoubtSince: calendarDate.nullable(),
    words: z.string(),
  }),
  z.object({ kind: z.literal('validity'), months: z.number().int() }),
  z.object({ kind: z.literal('condition'), dueOn: calendarDate }),
  /** The newest revision of the part, to which the acceptance was not carried over. */
  z.object({ kind: z.literal('revision'), label: z.string(), limits: z.enum(limitsComparisons) }),
])
export type StandingCause = z.output<typeof standingCauseSchema>

export const standingSchema = z.object({
  state: z.enum(standingStates),
  /** First day in this state: the day of the acceptance for one that stands. */
  since: calendarDate,
  /** Last day of the agreed validity; null where it does not run out. */
  until: calendarDate.nullable(),
  /** That last day while the acceptance stands and the day is near (`runsOutWithin`); null otherwise. */
  runsOutOn: calendarDate.nullable(),
  /** Day on which the first calibration that it rests on is due; null where none is known. */
  calibrationDueOn: calendarDate.nullable(),
  /** Null for one that stands. */
  cause: standingCauseSchema.nullable(),
})
export type Standing = z.output<typeof standingSchema>

/** Days before its last day from which an acceptance runs out soon: both sides are reminded then. */
export const runsOutWithin = 60

/** What the agreement says of the life of an acceptance, as frozen in the submission. */
export type StandingTerms = Omit<ResolvedTerms, 'readingsTakerMaySign'>

/** The term that says what each event does. */
export const termOfEvent = {
  'reported-out-of-limits': 'outOfLimits',
  repaired: 'repaired',
  moved: 'moved',
  changed: 'changed',
} as const satisfies Record<GaugeEventKind, keyof StandingTerms>

interface EquipmentFact {
  of: EquipmentKind
  /** Tells two pieces of equipment apart; means nothing to the customer. */
  thingId: string
  code: string
}

/** A calibration that found the equipment within limits. */
export interface CalibrationFact extends EquipmentFact {
  calibratedOn: string
  dueOn: string
}

export interface GaugeEventFact extends EquipmentFact {
  eventId: string
  kind: GaugeEventKind
  happenedOn: string
  /** When it was reported: what was reported before the acceptance, the customer accepted knowing it. */
  enteredAt: string
  inDoubtSince: string | null
  words: string
}

/** A newer revision of the part than the accepted one, in order. */
export interface RevisionFact {
  label: string
  addedOn: string
  limits: LimitsComparison
  /** Day on which the customer carried the acceptance over; null where they did not. */
  carriedOverOn: string | null
}

/** Everything the standing of an accepted submission follows from. Days are the relationship's calendar days. */
export interface StandingFacts {
  acceptedAt: string
  acceptedOn: string
  terms: StandingTerms
  conditions: readonly { dueOn: string; confirmedOn: string | null }[]
  calibrations: readonly CalibrationFact[]
  events: readonly GaugeEventFact[]
  /** When the customer's approver reinstated it: that lifts what was reported before. */
  reinstatements: readonly { at: string; on: string }[]
  revisions: readonly RevisionFact[]
}

interface Cause {
  state: Exclude<StandingState, 'stands'>
  since: string
  cause: StandingCause
}

/**
 * How an acceptance stands on a calendar day: a function of the facts and the day alone. What has ended does not
 * come back, so the end that came first is told before a suspension, and a suspension before a hold.
 */
export function standingOf(facts: StandingFacts, day: string): Standing {
  const { acceptedOn } = facts
  const until = lastDayOf(facts)
  const due = newestCalibrations(facts, day).map(({ dueOn }) => dueOn)
  const found = firstEnd(facts, day) ?? suspension(facts, day) ?? hold(facts, day)
  return {
    state: found?.state ?? 'stands',
    since: found ? laterDay(found.since, acceptedOn) : acceptedOn,
    until,
    runsOutOn: !found && until !== null && until <= addDays(day, runsOutWithin) ? until : null,
    calibrationDueOn: due.sort()[0] ?? null,
    cause: found?.cause ?? null,
  }
}

/** The last day of the agreed validity; null where it does not run out. */
export const lastDayOf = ({
  acceptedOn,
  terms: { validityMonths },
}: Pick<StandingFacts, 'acceptedOn'> & { terms: Pick<StandingTerms, 'validityMonths'> }): string | null =>
  validityMonths === null ? null : addMonths(acceptedOn, validityMonths)

function firstEnd(facts: StandingFacts, day: string): Cause | undefined {
  const ends = [expiry(facts, day), lapse(facts, day), reopening(facts, day)].filter(
    (end) => end !== undefined,
  )
  return ends.sort((a, b) => compare(a.since, b.since))[0]
}

function expiry(facts: StandingFacts, day: string): Cause | undefined {
  const until = lastDayOf(facts)
  const months = facts.terms.validityMonths
  if (until === null || months === null || day <= until) return undefined
  return { state: 'expired', since: addDays(until, 1), cause: { kind: 'validity', months } }
}

function lapse({ conditions }: StandingFacts, day: string): Cause | undefined {
  const [missed] = conditions
    .filter(({ dueOn, confirmedOn }) => dueOn < day && (confirmedOn === null || confirmedOn > day))
    .map(({ dueOn }) => dueOn)
    .sort()
  return missed === undefined
    ? undefined
    : { state: 'lapsed', since: addDays(missed, 1), cause: { kind: 'condition', dueOn: missed } }
}

/** Whether an acceptance holds for a newer revision: carried over by then, with the limits as they were accepted. */
const isCarriedOver = ({ limits, carriedOverOn }: RevisionFact, day: string): boolean =>
  limits === 'same' && carriedOverOn !== null && carriedOverOn <= day

function reopening({ revisions }: StandingFacts, day: string): Cause | undefined {
  const known = revisions.filter(({ addedOn }) => addedOn <= day)
  const newest = known.at(-1)
  if (!newest || isCarriedOver(newest, day)) return undefined
  const lastCarried = known.findLastIndex((revision) => isCarriedOver(revision, day))
  const { addedOn } = known[lastCarried + 1] ?? newest
  return {
    state: 'reopened',
    since: addedOn,
    cause: { kind: 'revision', label: newest.label, limits: newest.limits },
  }
}

/** The first of the events since the acceptance, or since it was reinstated, that suspend it by the terms. */
function suspension(
  { acceptedAt, terms, events, reinstatements }: StandingFacts,
  day: string,
): Cause | undefined {
  const lifted = reinstatements.filter(({ on }) => on <= day).map(({ at }) => at)
  const [first] = events
    .filter(
      ({ kind, happenedOn, enteredAt }) =>
        happenedOn <= day &&
        terms[termOfEvent[kind]] === 'suspended' &&
        [acceptedAt, ...lifted].every((instant) => enteredAt > instant),
    )
    .sort((a, b) => compare(a.happenedOn, b.happenedOn) || compare(a.enteredAt, b.enteredAt))
  if (!first) return undefined
  const { kind: event, of, code, eventId, happenedOn, inDoubtSince, words } = first
  return {
    state: 'suspended',
    since: happenedOn,
    cause: { kind: 'gauge-event', of, code, event, eventId, happenedOn, inDoubtSince, words },
  }
}

function hold(facts: StandingFacts, day: string): Cause | undefined {
  if (facts.terms.calibrationOverdue === 'stays') return undefined
  const [overdue] = newestCalibrations(facts, day)
    .filter(({ dueOn }) => dueOn < day)
    .sort((a, b) => compare(a.dueOn, b.dueOn))
  if (!overdue) return undefined
  const { of, code, dueOn } = overdue
  return {
    state: 'on-hold',
    since: addDays(dueOn, 1),
    cause: { kind: 'calibration-overdue', of, code, dueOn },
  }
}

/** Of each piece of equipment the newest calibration made by the day. */
function newestCalibrations({ calibrations }: StandingFacts, day: string): CalibrationFact[] {
  const inOrder = calibrations
    .filter(({ calibratedOn }) => calibratedOn <= day)
    .sort((a, b) => compare(a.calibratedOn, b.calibratedOn) || compare(a.dueOn, b.dueOn))
  return [...new Map(inOrder.map((each) => [each.thingId, each])).values()]
}

const compare = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)
