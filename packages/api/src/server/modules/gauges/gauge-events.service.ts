import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import type { GaugeEventKind } from '../../../contract/standing'
import type { listGaugeEvents, previewGaugeEvent, reportGaugeEvent } from '../../../contract/gauge-events'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { invalidInput, notFound } from '../../errors'
import { keepFile, type FileToKeep } from '../files/files.service'
import { namesOfPeople } from '../organisations/people.repository'
import { isArchived } from '../parts/parts.errors'
import { sha256 } from '../record/record.append'
import { effectOf, shareEvent, type NamedThing } from '../standing/standing.share.service'
import type { CalibratedThing } from './calibrations.repository'
import {
  insertGaugeEvent,
  lockThing,
  selectGaugeEvent,
  selectGaugeEvents,
  selectLastGood,
  type GaugeEventListed,
  type GaugeEventRow,
} from './gauge-events.repository'
import { gaugeById, standardById } from './gauges.lookup.service'
import { todayOf } from '../organisations/organisations.lookup.service'

type EventAnswer = AnswerInputOf<typeof reportGaugeEvent>
type Effect = AnswerInputOf<typeof previewGaugeEvent>
type Reported = BodyOf<typeof reportGaugeEvent>

/** One page of what happened to a gauge. */
export async function eventsOfGauge(tenant: Tenant, gaugeId: string, query: QueryOf<typeof listGaugeEvents>) {
  await gaugeById(tenant, gaugeId)
  return paged(
    query,
    (page) => selectGaugeEvents(tenant, { gaugeId }, page),
    (rows) => withNames(tenant, rows),
  )
}

/** What an event would do, before it is reported. */
export async function previewOf(
  tenant: Tenant,
  thing: CalibratedThing,
  { kind, happenedOn }: QueryOf<typeof previewGaugeEvent>,
): Promise<Effect> {
  await thingById(tenant, thing)
  const lastGood = await selectLastGood(tenant, thing, happenedOn)
  const effects = await effectOf(tenant, thing, kind)
  return {
    lastGoodOn: lastGood?.calibratedOn ?? null,
    reachesBack: kind === 'reported-out-of-limits',
    ...countsOf(effects),
    underReview: effects.filter(({ effect }) => effect === null).length,
    acceptances: effects.flatMap(({ effect, submission, ...about }) =>
      effect === null
        ? []
        : [{ ...about, effect, submissionId: submission.id, number: submission.number ?? 0 }],
    ),
  }
}

/** `gauge.changed` is what an edit of the gauge leaves, so a change of software or fixture has another name. */
const eventTypes = {
  'reported-out-of-limits': 'gauge.reported-out-of-limits',
  repaired: 'gauge.repaired',
  moved: 'gauge.moved',
  changed: 'gauge.changed-in-use',
} as const satisfies Record<GaugeEventKind, string>

/** Reports what happened to a gauge: acceptances are suspended as agreed, and both sides told. */
export async function reportEventOf(
  tenant: Tenant,
  thing: CalibratedThing,
  reported: Reported,
  file: FileToKeep | null,
): Promise<EventAnswer> {
  const { code, archivedAt } = await thingById(tenant, thing)
  if (archivedAt) throw isArchived('gaugeId' in thing ? 'gauge' : 'reference standard')
  if (reported.happenedOn > (await todayOf(tenant)))
    throw invalidInput([
      { path: 'body.happenedOn', message: 'This day is still to come. Enter the day on which it happened.' },
    ])
  const fileId = file ? await keepFile(tenant, file) : null
  const event = await storeEvent(tenant, { thing, code }, reported, { fileId, calibrationId: null })
  const { id, kind, happenedOn, lastGoodOn } = event
  tenant.record({
    type: eventTypes[kind],
    subject: subjectOf(thing),
    data: {
      ...{ eventId: id, happenedOn, lastGoodOn },
      wordsSha256: sha256(event.words),
      fileSha256: file?.stored.sha256 ?? null,
    },
  })
  return answerOf(tenant, id)
}

/** A calibration that found the equipment out of limits is such an event too. */
export async function reportCalibration(
  tenant: Tenant,
  named: NamedThing,
  reported: Omit<Reported, 'kind'>,
  calibrationId: string,
): Promise<void> {
  const kind = 'reported-out-of-limits'
  await storeEvent(tenant, named, { ...reported, kind }, { fileId: null, calibrationId })
}

async function storeEvent(
  tenant: Tenant,
  named: NamedThing,
  { kind, happenedOn, words }: Reported,
  source: Pick<GaugeEventRow, 'fileId' | 'calibrationId'>,
): Promise<GaugeEventRow> {
  const { thing } = named
  await lockThing(tenant, thing, 'update')
  const lastGood = await selectLastGood(tenant, thing, happenedOn)
  const effects = await effectOf(tenant, thing, kind)
  const event = await insertGaugeEvent(tenant, {
    ...{ gaugeId: null, standardId: null, ...thing },
    ...{ kind, happenedOn, words, lastGoodOn: lastGood?.calibratedOn ?? null },
    ...source,
    ...countsOf(effects),
  })
  await shareEvent(tenant, named, event, effects)
  return event
}

const countsOf = (effects: readonly { effect: 'suspended' | 'stays' | null }[]) => ({
  suspended: effects.filter(({ effect }) => effect === 'suspended').length,
  stays: effects.filter(({ effect }) => effect === 'stays').length,
})

/** The gauge or reference standard; 404 for those of others. */
export const thingById = (
  tenant: Tenant,
  thing: CalibratedThing,
): Promise<{ id: string; code: string; archivedAt: string | null }> =>
  'gaugeId' in thing ? gaugeById(tenant, thing.gaugeId) : standardById(tenant, thing.standardId)

/** What events about it name as their subject. */
export const subjectOf = (thing: CalibratedThing) =>
  'gaugeId' in thing
    ? ({ type: 'gauge', id: thing.gaugeId } as const)
    : ({ type: 'reference-standard', id: thing.standardId } as const)

async function answerOf(tenant: Tenant, eventId: string): Promise<EventAnswer> {
  const row = await selectGaugeEvent(tenant, eventId)
  if (!row) throw notFound('event of the gauge')
  const [answer] = await withNames(tenant, [row])
  if (!answer) throw notFound('event of the gauge')
  return answer
}

async function withNames(tenant: Tenant, rows: readonly GaugeEventListed[]): Promise<EventAnswer[]> {
  const names = await namesOfPeople(
    tenant,
    rows.map(({ event }) => event.createdBy),
  )
  return rows.map(({ event, file, certificateNumber }) => ({
    ...event,
    ...{ file, certificateNumber, reportedBy: names.get(event.createdBy) ?? null },
  }))
}
