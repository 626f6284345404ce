import * as contract from '../../../contract/files'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { keepAttachment, storeAttachment } from './attachments.service'
import { downloadOf, fileById } from './files.service'

export const filesRoutes: Route[] = [
  preparedRoute(contract.uploadAttachment, storeAttachment, ({ tenant, prepared }) =>
    keepAttachment(tenant, prepared),
  ),
  tenantRoute(contract.readFile, ({ tenant, params }) => fileById(tenant, params.fileId)),
  tenantRoute(contract.downloadFile, ({ tenant, params }) => downloadOf(tenant, params.fileId)),
]
