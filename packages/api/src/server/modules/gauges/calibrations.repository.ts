import { and, desc, eq, inArray, isNull, lte, sql, type AnyColumn, type SQL } from 'drizzle-orm'
import { dueSoonDays, type CalibrationStanding } from '../../../contract/calibrations'
import type { listGaugeCalibrations } from '../../../contract/calibrations'
import type { QueryOf } from '../../../contract/define'
import { addDays } from '../../calendar'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { files } from '../files/files.table'
import { calibrations, gauges, type referenceStandards } from './gauges.table'

export type CalibrationRow = typeof calibrations.$inferSelect

/** What a calibration is of: one gauge or one reference standard. */
export type CalibratedThing = { gaugeId: string } | { standardId: string }

/** Rows of one gauge or one reference standard. */
export const ofThing = (thing: CalibratedThing) =>
  'gaugeId' in thing ? eq(calibrations.gaugeId, thing.gaugeId) : eq(calibrations.standardId, thing.standardId)

export const latestFirst = [
  desc(calibrations.calibratedOn),
  desc(calibrations.createdAt),
  desc(calibrations.id),
] as const

/** The latest calibration made on or before a day. */
export async function selectCalibrationOn(
  tenant: Tenant,
  thing: CalibratedThing,
  day: string,
): Promise<CalibrationRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(calibrations)
    .where(
      and(eq(calibrations.orgId, tenant.organisationId), ofThing(thing), lte(calibrations.calibratedOn, day)),
    )
    .orderBy(...latestFirst)
    .limit(1)
  return row
}

/** For a lateral join: per row of a list the calibration that counts on the day, by the same rule. */
export const latestOn = ({ tx }: Tenant, table: typeof gauges | typeof referenceStandards, day: string) =>
  tx
    .select({
      calibratedOn: calibrations.calibratedOn,
      dueOn: calibrations.dueOn,
      foundWithinLimits: calibrations.foundWithinLimits,
    })
    .from(calibrations)
    .where(
      and(
        eq(calibrations.orgId, table.orgId),
        eq(table === gauges ? calibrations.gaugeId : calibrations.standardId, table.id),
        lte(calibrations.calibratedOn, day),
      ),
    )
    .orderBy(...latestFirst)
    .limit(1)
    .as('latest')

/** SQL of the standing on a day; `standingOn` of the contract says the same of one row. */
export function hasStanding(
  standing: CalibrationStanding | undefined,
  dueOn: AnyColumn,
  day: string,
): SQL | undefined {
  const soonUntil = addDays(day, dueSoonDays)
  switch (standing) {
    case undefined:
      return undefined
    case 'none':
      return sql`${dueOn} is null`
    case 'overdue':
      return sql`${dueOn} < ${day}`
    case 'due-soon':
      return sql`${dueOn} between ${day} and ${soonUntil}`
    case 'in-date':
      return sql`${dueOn} > ${soonUntil}`
  }
}

/** One page of calibrations with their certificates; every row carries the total. */
export async function selectCalibrations(
  tenant: Tenant,
  thing: CalibratedThing,
  query: QueryOf<typeof listGaugeCalibrations>,
) {
  const { calibratedOn, dueOn, certificateNumber, laboratory } = calibrations
  return tenant.tx
    .select({ calibration: calibrations, certificate: files, total: totalOverPages })
    .from(calibrations)
    .leftJoin(files, and(eq(files.orgId, calibrations.orgId), eq(files.id, calibrations.fileId)))
    .where(
      and(
        eq(calibrations.orgId, tenant.organisationId),
        ofThing(thing),
        containing(query.search, certificateNumber, laboratory),
      ),
    )
    .orderBy(...orderOf({ calibratedOn, dueOn }, query.sort, calibrations.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** Every calibration of some gauges. */
export async function selectCalibrationsOfGauges(
  { tx, organisationId }: Tenant,
  gaugeIds: readonly string[],
): Promise<CalibrationRow[]> {
  if (gaugeIds.length === 0) return []
  return tx
    .select()
    .from(calibrations)
    .where(and(eq(calibrations.orgId, organisationId), inArray(calibrations.gaugeId, [...gaugeIds])))
}

export async function insertCalibration(
  tenant: Tenant,
  row: Omit<typeof calibrations.$inferInsert, 'orgId' | 'createdAt' | 'createdBy'>,
): Promise<CalibrationRow> {
  const [inserted] = await tenant.tx
    .insert(calibrations)
    .values({ ...row, orgId: tenant.organisationId, createdAt: tenant.now, createdBy: tenant.userId })
    .returning()
  if (!inserted) throw new Error('The calibration was not stored.')
  return inserted
}

/** One calibration of a gauge or a reference standard. */
export async function selectCalibration(
  tenant: Tenant,
  thing: CalibratedThing,
  calibrationId: string,
): Promise<CalibrationRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(calibrations)
    .where(
      and(eq(calibrations.orgId, tenant.organisationId), ofThing(thing), eq(calibrations.id, calibrationId)),
    )
  return row
}

/** Gives a calibration its certificate; undefined where it has one already. */
export async function setCertificate(
  tenant: Tenant,
  calibrationId: string,
  fileId: string,
): Promise<CalibrationRow | undefined> {
  const [row] = await tenant.tx
    .update(calibrations)
    .set({ fileId })
    .where(
      and(
        eq(calibrations.orgId, tenant.organisationId),
        eq(calibrations.id, calibrationId),
        isNull(calibrations.fileId),
      ),
    )
    .returning()
  return row
}
