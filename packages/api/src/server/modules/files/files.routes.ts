import * as contract from '../../../contract/files'
import { tenantRoute, type Route } from '../../http/route'
import { downloadOf, fileById } from './files.service'

export const filesRoutes: Route[] = [
  tenantRoute(contract.readFile, ({ tenant, params }) => fileById(tenant, params.fileId)),
  tenantRoute(contract.downloadFile, ({ tenant, params }) => downloadOf(tenant, params.fileId)),
]
