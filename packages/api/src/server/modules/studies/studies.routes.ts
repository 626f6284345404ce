import * as contract from '../../../contract/studies'
import { tableTypes } from '../../tables/content'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { abandonStudyOf } from './studies.abandon.service'
import { listOfStudies } from './studies.list.service'
import { previewOf, readToPreview } from './studies.preview.service'
import { readingsFileOf, readStudyOf, runSheetCsvOf, runSheetXlsxOf } from './studies.read.service'
import { planOf, registerStudyOf } from './studies.register.service'
import { readToStore, storeReadingsOf } from './studies.store.service'

export const studiesRoutes: Route[] = [
  tenantRoute(contract.planStudy, ({ tenant, body }) => planOf(tenant, body)),
  tenantRoute(contract.listStudies, ({ tenant, query }) => listOfStudies(tenant, query)),
  tenantRoute(contract.registerStudy, ({ tenant, body }) => registerStudyOf(tenant, body)),
  tenantRoute(contract.readStudy, ({ tenant, params }) => readStudyOf(tenant, params.studyId)),
  tenantRoute(contract.downloadRunSheet, ({ tenant, params, query }) =>
    runSheetCsvOf(tenant, params.studyId, query.separator),
  ),
  tenantRoute(contract.downloadRunSheetWorkbook, ({ tenant, params }) =>
    runSheetXlsxOf(tenant, params.studyId),
  ),
  preparedRoute(
    contract.previewReadings,
    async ({ body, file, ask }) => ({ read: await readToPreview(body, file, ask), file }),
    ({ tenant, params, body, prepared }) => previewOf(tenant, params.studyId, body, prepared),
  ),
  preparedRoute(
    contract.storeReadings,
    async ({ body, file, services }) => {
      const read = await readToStore(body, file)
      const stored = file && (await services.files.put(file.bytes))
      const contentType = tableTypes[read.readAs.kind]
      return { read, file: file && stored ? { ...file, contentType, stored } : null }
    },
    ({ tenant, params, body, prepared }) => storeReadingsOf(tenant, params.studyId, body, prepared),
  ),
  tenantRoute(contract.downloadReadings, ({ tenant, params }) =>
    readingsFileOf(tenant, params.studyId, params.revision),
  ),
  tenantRoute(contract.abandonStudy, ({ tenant, params, body }) =>
    abandonStudyOf(tenant, params.studyId, body),
  ),
]
