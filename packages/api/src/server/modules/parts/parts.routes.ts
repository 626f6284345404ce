import * as contract from '../../../contract/parts'
import { tenantRoute, type Route } from '../../http/route'
import {
  addRevisionTo,
  archivePartOf,
  changePartOf,
  enterPart,
  listOfParts,
  partById,
  restorePartOf,
  revisionsOfPart,
} from './parts.service'

export const partsRoutes: Route[] = [
  tenantRoute(contract.listParts, ({ tenant, query }) => listOfParts(tenant, query)),
  tenantRoute(contract.createPart, ({ tenant, body }) => enterPart(tenant, body)),
  tenantRoute(contract.readPart, ({ tenant, params }) => partById(tenant, params.partId)),
  tenantRoute(contract.changePart, ({ tenant, params, body }) => changePartOf(tenant, params.partId, body)),
  tenantRoute(contract.archivePart, ({ tenant, params, body }) =>
    archivePartOf(tenant, params.partId, body.expectedVersion),
  ),
  tenantRoute(contract.restorePart, ({ tenant, params, body }) =>
    restorePartOf(tenant, params.partId, body.expectedVersion),
  ),
  tenantRoute(contract.listRevisions, ({ tenant, params, query }) =>
    revisionsOfPart(tenant, params.partId, query),
  ),
  tenantRoute(contract.addRevision, ({ tenant, params, body }) => addRevisionTo(tenant, params.partId, body)),
]
