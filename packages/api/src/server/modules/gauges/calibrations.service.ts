import type { addGaugeCalibration, listGaugeCalibrations } from '../../../contract/calibrations'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { fileById, keepFile, type FileToKeep } from '../files/files.service'
import { isArchived } from '../parts/parts.errors'
import { insertCalibration, selectCalibrations, type CalibratedThing } from './calibrations.repository'
import { gaugeById, standardById } from './gauges.lookup.service'
import { todayOf } from '../organisations/organisations.lookup.service'

type CalibrationAnswer = AnswerInputOf<typeof addGaugeCalibration>

/** One page of the calibrations of a gauge or a reference standard. */
export async function calibrationsOf(
  tenant: Tenant,
  thing: CalibratedThing,
  query: QueryOf<typeof listGaugeCalibrations>,
) {
  await rowOf(tenant, thing)
  return paged(
    query,
    (page) => selectCalibrations(tenant, thing, page),
    (rows) => rows.map(({ calibration, certificate }) => ({ ...calibration, certificate })),
  )
}

/** Enters a calibration, with its certificate where there is one. Calibrations are never changed afterwards. */
export async function addCalibration(
  tenant: Tenant,
  thing: CalibratedThing,
  body: BodyOf<typeof addGaugeCalibration>,
  certificate: FileToKeep | null,
): Promise<CalibrationAnswer> {
  const row = await rowOf(tenant, thing)
  if (row.archivedAt) throw isArchived('gaugeId' in thing ? 'gauge' : 'reference standard')
  if (body.calibratedOn > (await todayOf(tenant)))
    throw invalidInput([
      { path: 'body.calibratedOn', message: 'This day is still to come. Enter the day of the calibration.' },
    ])
  const fileId = certificate ? await keepFile(tenant, certificate) : null
  const calibration = await insertCalibration(tenant, { ...body, ...thing, fileId })
  tenant.record({
    type: 'calibration.entered',
    subject: { type: 'gaugeId' in thing ? 'gauge' : 'reference-standard', id: row.id },
    data: { ...body, calibrationId: calibration.id, certificateSha256: certificate?.stored.sha256 ?? null },
  })
  return { ...calibration, certificate: fileId ? await fileById(tenant, fileId) : null }
}

const rowOf = (tenant: Tenant, thing: CalibratedThing): Promise<{ id: string; archivedAt: string | null }> =>
  'gaugeId' in thing ? gaugeById(tenant, thing.gaugeId) : standardById(tenant, thing.standardId)
