import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { selectCalibrationOn, type CalibratedThing } from './calibrations.repository'
import { selectGauge, type GaugeRow } from './gauges.repository'
import { selectStandard, type StandardRow } from './standards.repository'

/** One gauge of this organisation, archived or not; 404 for those of others. */
export async function gaugeById(tenant: Tenant, gaugeId: string): Promise<GaugeRow> {
  const row = await selectGauge(tenant, gaugeId)
  if (!row) throw notFound('gauge')
  return row
}

/** One reference standard of this organisation, archived or not; 404 for those of others. */
export async function standardById(tenant: Tenant, standardId: string): Promise<StandardRow> {
  const row = await selectStandard(tenant, standardId)
  if (!row) throw notFound('reference standard')
  return row
}

export interface CalibrationOnDay {
  calibratedOn: string
  dueOn: string
  certificateNumber: string
  fileId: string | null
}

/** The calibration that counts on a calendar day: the latest made on or before it; null where there is none. */
export async function calibrationOn(
  tenant: Tenant,
  thing: CalibratedThing,
  day: string,
): Promise<CalibrationOnDay | null> {
  const row = await selectCalibrationOn(tenant, thing, day)
  if (!row) return null
  const { calibratedOn, dueOn, certificateNumber, fileId } = row
  return { calibratedOn, dueOn, certificateNumber, fileId }
}
