import * as contract from '../../../contract/studies'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { readReadings } from './readings/read'
import { abandonStudyOf } from './studies.abandon.service'
import { listOfStudies } from './studies.list.service'
import { previewOf } from './studies.preview.service'
import { readingsFileOf, readStudyOf, runSheetFileOf } from './studies.read.service'
import { planOf, registerStudyOf } from './studies.register.service'
import { readToStore, storeReadingsOf } from './studies.store.service'

export const studiesRoutes: Route[] = [
  tenantRoute(contract.planStudy, ({ tenant, body }) => planOf(tenant, body)),
  tenantRoute(contract.listStudies, ({ tenant, query }) => listOfStudies(tenant, query)),
  tenantRoute(contract.registerStudy, ({ tenant, body }) => registerStudyOf(tenant, body)),
  tenantRoute(contract.readStudy, ({ tenant, params }) => readStudyOf(tenant, params.studyId)),
  tenantRoute(contract.downloadRunSheet, ({ tenant, params, query }) =>
    runSheetFileOf(tenant, params.studyId, query.separator),
  ),
  preparedRoute(
    contract.previewReadings,
    async ({ body, file }) => ({ read: await readReadings(body, file), file }),
    ({ tenant, params, body, prepared }) => previewOf(tenant, params.studyId, body, prepared),
  ),
  preparedRoute(
    contract.storeReadings,
    async ({ body, file, services }) => {
      const read = await readToStore(body, file)
      const stored = file && (await services.files.put(file.bytes))
      return { read, file: file && stored ? { ...file, contentType: 'text/csv', stored } : null }
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
