import * as contract from '../../../contract/standards'
import { tenantRoute, type Route } from '../../http/route'
import {
  archiveStandardOf,
  changeStandardOf,
  listOfStandards,
  readStandardOf,
  registerStandard,
  restoreStandardOf,
} from './standards.service'

export const standardsRoutes: Route[] = [
  tenantRoute(contract.listStandards, ({ tenant, query }) => listOfStandards(tenant, query)),
  tenantRoute(contract.createStandard, ({ tenant, body }) => registerStandard(tenant, body)),
  tenantRoute(contract.readStandard, ({ tenant, params }) => readStandardOf(tenant, params.standardId)),
  tenantRoute(contract.changeStandard, ({ tenant, params, body }) =>
    changeStandardOf(tenant, params.standardId, body),
  ),
  tenantRoute(contract.archiveStandard, ({ tenant, params, body }) =>
    archiveStandardOf(tenant, params.standardId, body.expectedVersion),
  ),
  tenantRoute(contract.restoreStandard, ({ tenant, params, body }) =>
    restoreStandardOf(tenant, params.standardId, body.expectedVersion),
  ),
]
