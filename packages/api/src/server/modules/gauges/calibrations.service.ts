import type { addGaugeCalibration, listGaugeCalibrations } from '../../../contract/calibrations'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { invalidInput, notFound } from '../../errors'
import { fileById, keepFile, type FileToKeep } from '../files/files.service'
import { isArchived } from '../parts/parts.errors'
import { shareCalibration } from '../standing/standing.share.service'
import {
  insertCalibration,
  selectCalibration,
  selectCalibrations,
  setCertificate,
  type CalibratedThing,
} from './calibrations.repository'
import { reportCalibration, subjectOf, thingById as rowOf } from './gauge-events.service'
import { hasCertificate } from './gauges.errors'
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
  refuseDayToCome(body, await todayOf(tenant))
  const fileId = certificate ? await keepFile(tenant, certificate) : null
  const { words, ...entered } = body
  const calibration = await insertCalibration(tenant, { ...entered, ...thing, fileId })
  tenant.record({
    type: 'calibration.entered',
    subject: subjectOf(thing),
    data: {
      ...entered,
      calibrationId: calibration.id,
      certificateSha256: certificate?.stored.sha256 ?? null,
    },
  })
  const named = { thing, code: row.code }
  if (body.foundWithinLimits) await shareCalibration(tenant, named, calibration)
  else
    await reportCalibration(
      tenant,
      named,
      { happenedOn: body.calibratedOn, words: words || foundOutOfLimits(body.certificateNumber) },
      calibration.id,
    )
  return { ...calibration, certificate: fileId ? await fileById(tenant, fileId) : null }
}

/** Refuses a calibration of a day that is still to come. */
export function refuseDayToCome({ calibratedOn }: { calibratedOn: string }, today: string): void {
  if (calibratedOn > today)
    throw invalidInput([
      { path: 'body.calibratedOn', message: 'This day is still to come. Enter the day of the calibration.' },
    ])
}

const foundOutOfLimits = (certificateNumber: string): string =>
  `Found out of limits at its calibration, certificate ${certificateNumber}.`

/** Adds the certificate to a calibration that was entered without one; one that is there is never replaced. */
export async function attachCertificate(
  tenant: Tenant,
  thing: CalibratedThing,
  calibrationId: string,
  certificate: FileToKeep,
): Promise<CalibrationAnswer> {
  await rowOf(tenant, thing)
  const calibration = await selectCalibration(tenant, thing, calibrationId)
  if (!calibration) throw notFound('calibration')
  const fileId = await keepFile(tenant, certificate)
  const updated = await setCertificate(tenant, calibrationId, fileId)
  if (!updated) throw hasCertificate()
  tenant.record({
    type: 'calibration.certificate-added',
    subject: subjectOf(thing),
    data: {
      calibrationId,
      certificateNumber: updated.certificateNumber,
      certificateSha256: certificate.stored.sha256,
    },
  })
  return { ...updated, certificate: await fileById(tenant, fileId) }
}
