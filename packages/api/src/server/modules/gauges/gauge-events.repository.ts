import { and, eq, gte, lte } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listGaugeEvents } from '../../../contract/gauge-events'
import { orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { files } from '../files/files.table'
import { latestFirst, ofThing as ofCalibrated, type CalibratedThing } from './calibrations.repository'
import { gaugeEvents } from './gauge-events.table'
import { calibrations, gauges, referenceStandards } from './gauges.table'

export type GaugeEventRow = typeof gaugeEvents.$inferSelect

const ofThing = (tenant: Tenant, thing: CalibratedThing) =>
  and(
    eq(gaugeEvents.orgId, tenant.organisationId),
    'gaugeId' in thing
      ? eq(gaugeEvents.gaugeId, thing.gaugeId)
      : eq(gaugeEvents.standardId, thing.standardId),
  )

const fromEvents = ({ tx }: Tenant) =>
  tx
    .select({
      event: gaugeEvents,
      file: files,
      certificateNumber: calibrations.certificateNumber,
      total: totalOverPages,
    })
    .from(gaugeEvents)
    .leftJoin(files, and(eq(files.orgId, gaugeEvents.orgId), eq(files.id, gaugeEvents.fileId)))
    .leftJoin(
      calibrations,
      and(eq(calibrations.orgId, gaugeEvents.orgId), eq(calibrations.id, gaugeEvents.calibrationId)),
    )
    .$dynamic()

export type GaugeEventListed = Awaited<ReturnType<typeof selectGaugeEvents>>[number]

/** One page of what happened to a gauge or a reference standard; every row carries the total. */
export async function selectGaugeEvents(
  tenant: Tenant,
  thing: CalibratedThing,
  query: QueryOf<typeof listGaugeEvents>,
) {
  const { happenedOn, createdAt, id } = gaugeEvents
  return fromEvents(tenant)
    .where(ofThing(tenant, thing))
    .orderBy(...orderOf({ happenedOn, createdAt }, query.sort, id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectGaugeEvent(
  tenant: Tenant,
  eventId: string,
): Promise<GaugeEventListed | undefined> {
  const [row] = await fromEvents(tenant).where(
    and(eq(gaugeEvents.orgId, tenant.organisationId), eq(gaugeEvents.id, eventId)),
  )
  return row
}

/** Every event of a gauge or standard on or after a day. */
export async function selectEventsSince(
  tenant: Tenant,
  thing: CalibratedThing,
  day: string,
): Promise<GaugeEventRow[]> {
  return tenant.tx
    .select()
    .from(gaugeEvents)
    .where(and(ofThing(tenant, thing), gte(gaugeEvents.happenedOn, day)))
}

export async function insertGaugeEvent(
  tenant: Tenant,
  row: Omit<typeof gaugeEvents.$inferInsert, 'orgId' | 'createdAt' | 'createdBy'>,
): Promise<GaugeEventRow> {
  const [inserted] = await tenant.tx
    .insert(gaugeEvents)
    .values({ ...row, orgId: tenant.organisationId, createdAt: tenant.now, createdBy: tenant.userId })
    .returning()
  if (!inserted) throw new Error('The event of the gauge was not stored.')
  return inserted
}

/**
 * Lets what is told of a gauge and what is signed on it pass one after the other: an event is seen either by the
 * signature or by the submission it made.
 */
export async function lockThing(
  { tx, organisationId }: Tenant,
  thing: CalibratedThing,
  mode: 'share' | 'update',
): Promise<void> {
  const [table, id] =
    'gaugeId' in thing
      ? ([gauges, thing.gaugeId] as const)
      : ([referenceStandards, thing.standardId] as const)
  await tx
    .select({ id: table.id })
    .from(table)
    .where(and(eq(table.orgId, organisationId), eq(table.id, id)))
    .for(mode === 'update' ? 'no key update' : 'share')
}

/** The newest calibration on or before a day that found the equipment within limits. */
export async function selectLastGood(tenant: Tenant, thing: CalibratedThing, day: string) {
  const [row] = await tenant.tx
    .select()
    .from(calibrations)
    .where(
      and(
        eq(calibrations.orgId, tenant.organisationId),
        ofCalibrated(thing),
        eq(calibrations.foundWithinLimits, true),
        lte(calibrations.calibratedOn, day),
      ),
    )
    .orderBy(...latestFirst)
    .limit(1)
  return row
}
