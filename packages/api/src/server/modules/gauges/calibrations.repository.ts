import { and, desc, eq, lte } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { calibrations } from './gauges.table'

export type CalibrationRow = typeof calibrations.$inferSelect

/** What a calibration is of: one gauge or one reference standard. */
export type CalibratedThing = { gaugeId: string } | { standardId: string }

export const ofThing = (thing: CalibratedThing) =>
  'gaugeId' in thing ? eq(calibrations.gaugeId, thing.gaugeId) : eq(calibrations.standardId, thing.standardId)

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
    .orderBy(desc(calibrations.calibratedOn), desc(calibrations.createdAt), desc(calibrations.id))
    .limit(1)
  return row
}
