import * as contract from '../../../contract/calibrations'
import type { PrepareCall } from '../../http/route'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { invalidInput } from '../../errors'
import { certificateType } from '../files/files.content'
import type { FileToKeep } from '../files/files.service'
import { addCalibration, attachCertificate, calibrationsOf } from './calibrations.service'

/** Checks the certificate by its content and stores its bytes, before the transaction. */
export async function storeCertificate({
  file,
  services,
}: Pick<PrepareCall<typeof contract.addGaugeCalibration>, 'file' | 'services'>): Promise<FileToKeep | null> {
  if (!file) return null
  const contentType = certificateType(file)
  return { ...file, contentType, stored: await services.files.put(file.bytes) }
}

async function storeNeeded(call: Parameters<typeof storeCertificate>[0]): Promise<FileToKeep> {
  const stored = await storeCertificate(call)
  if (stored) return stored
  throw invalidInput([{ path: 'body.file', message: 'Choose the certificate as PDF, PNG or JPEG.' }])
}

export const calibrationsRoutes: Route[] = [
  tenantRoute(contract.listGaugeCalibrations, ({ tenant, params, query }) =>
    calibrationsOf(tenant, { gaugeId: params.gaugeId }, query),
  ),
  preparedRoute(contract.addGaugeCalibration, storeCertificate, ({ tenant, params, body, prepared }) =>
    addCalibration(tenant, { gaugeId: params.gaugeId }, body, prepared),
  ),
  preparedRoute(contract.attachGaugeCertificate, storeNeeded, ({ tenant, params, prepared }) =>
    attachCertificate(tenant, { gaugeId: params.gaugeId }, params.calibrationId, prepared),
  ),
  tenantRoute(contract.listStandardCalibrations, ({ tenant, params, query }) =>
    calibrationsOf(tenant, { standardId: params.standardId }, query),
  ),
  preparedRoute(contract.addStandardCalibration, storeCertificate, ({ tenant, params, body, prepared }) =>
    addCalibration(tenant, { standardId: params.standardId }, body, prepared),
  ),
  preparedRoute(contract.attachStandardCertificate, storeNeeded, ({ tenant, params, prepared }) =>
    attachCertificate(tenant, { standardId: params.standardId }, params.calibrationId, prepared),
  ),
]
