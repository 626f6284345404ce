import { termOfEvent, type GaugeEventKind } from '../../../contract/standing'
import type { Tenant } from '../../db/tenant'
import type { CalibratedThing, CalibrationRow } from '../gauges/calibrations.repository'
import type { GaugeEventRow } from '../gauges/gauge-events.repository'
import { lockThing, selectEventsSince, selectLastGood } from '../gauges/gauge-events.repository'
import { todayOf } from '../organisations/organisations.lookup.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { tellOfEvent, tellOfStandingAgain } from './standing.messages'
import {
  insertCalibrationFacts,
  insertEventFacts,
  keyOf,
  selectConcerned,
  selectEquipment,
  type ConcernedSubmission,
  type NamedThing,
} from './standing.share.repository'
import { standingsOf } from './standing.service'
import { selectAccepted } from './standing.repository'

export type { NamedThing }

const factOf = ({ thing, code }: NamedThing) =>
  'gaugeId' in thing
    ? ({ of: 'gauge', thingId: thing.gaugeId, code } as const)
    : ({ of: 'standard', thingId: thing.standardId, code } as const)

/**
 * At the signature: what the submission rests on from then on, and what happened to its equipment since its readings
 * were taken, so that the customer decides knowing it.
 */
export async function shareAtSigning(tenant: Tenant, submission: SubmissionRow): Promise<void> {
  const { things, readingsSince } = await selectEquipment(tenant, submission)
  const today = await todayOf(tenant)
  for (const named of things) {
    await lockThing(tenant, named.thing, 'share')
    const good = await selectLastGood(tenant, named.thing, today)
    if (good) await insertCalibrationFacts(tenant, [calibrationFact(named, submission, good)])
    if (readingsSince === null) continue
    const events = await selectEventsSince(tenant, named.thing, readingsSince)
    await insertEventFacts(
      tenant,
      events.map((event) => eventFact(named, submission, event)),
    )
  }
}

/**
 * A calibration found the equipment within limits: told to what rests on it. Both sides hear of acceptances that
 * stand again by it.
 */
export async function shareCalibration(
  tenant: Tenant,
  named: NamedThing,
  calibration: CalibrationRow,
): Promise<void> {
  await lockThing(tenant, named.thing, 'update')
  const concerned = await selectConcerned(tenant, named.thing)
  const ids = concerned.map(({ submission }) => submission.id)
  const before = await standingsOf(tenant, ids)
  await insertCalibrationFacts(
    tenant,
    concerned.map(({ submission }) => calibrationFact(named, submission, calibration)),
  )
  const after = await standingsOf(tenant, ids)
  const isLifted = ({ submission: { id } }: ConcernedSubmission) =>
    before.get(id)?.state === 'on-hold' && after.get(id)?.state === 'stands'
  tellOfStandingAgain(tenant, named.code, calibration, concerned.filter(isLifted))
}

export interface EffectOnSubmission extends ConcernedSubmission {
  /** Null while it is under review: the customer decides knowing it. */
  effect: 'suspended' | 'stays' | null
}

/** What an event would do to each submission that rests on the equipment. */
export async function effectOf(
  tenant: Tenant,
  thing: CalibratedThing,
  kind: GaugeEventKind,
): Promise<EffectOnSubmission[]> {
  const concerned = await selectConcerned(tenant, thing)
  const accepted = await selectAccepted(
    tenant,
    concerned.map(({ submission }) => submission.id),
  )
  const terms = new Map(accepted.map((each) => [each.submissionId, each.terms]))
  return concerned.map((each) => ({
    ...each,
    effect: terms.get(each.submission.id)?.[termOfEvent[kind]] ?? null,
  }))
}

/** Tells every submission concerned, and both sides, of what happened to the equipment. */
export async function shareEvent(
  tenant: Tenant,
  named: NamedThing,
  event: GaugeEventRow,
  effects: readonly EffectOnSubmission[],
): Promise<void> {
  await insertEventFacts(
    tenant,
    effects.map(({ submission }) => eventFact(named, submission, event)),
  )
  tellOfEvent(tenant, named, { ...event, inDoubtSince: inDoubtSince(event) }, effects)
}

/** Only what is found out of limits reaches back to the last good calibration. */
export const inDoubtSince = ({
  kind,
  lastGoodOn,
}: Pick<GaugeEventRow, 'kind' | 'lastGoodOn'>): string | null =>
  kind === 'reported-out-of-limits' ? lastGoodOn : null

const calibrationFact = (
  named: NamedThing,
  submission: SubmissionRow,
  { id, calibratedOn, dueOn, createdAt }: CalibrationRow,
) => ({
  ...keyOf(submission),
  ...factOf(named),
  ...{ calibrationId: id, calibratedOn, dueOn, enteredAt: createdAt },
})

const eventFact = (named: NamedThing, submission: SubmissionRow, event: GaugeEventRow) => ({
  ...keyOf(submission),
  ...factOf(named),
  eventId: event.id,
  kind: event.kind,
  happenedOn: event.happenedOn,
  inDoubtSince: inDoubtSince(event),
  words: event.words,
  enteredAt: event.createdAt,
})
