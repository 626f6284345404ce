import * as contract from '../../../contract/gauges'
import { tenantRoute, type Route } from '../../http/route'
import {
  archiveGaugeOf,
  changeGaugeOf,
  listOfGauges,
  listOfSites,
  readGaugeOf,
  registerGauge,
  restoreGaugeOf,
} from './gauges.service'

export const gaugesRoutes: Route[] = [
  tenantRoute(contract.listGauges, ({ tenant, query }) => listOfGauges(tenant, query)),
  tenantRoute(contract.createGauge, ({ tenant, body }) => registerGauge(tenant, body)),
  tenantRoute(contract.readGauge, ({ tenant, params }) => readGaugeOf(tenant, params.gaugeId)),
  tenantRoute(contract.changeGauge, ({ tenant, params, body }) =>
    changeGaugeOf(tenant, params.gaugeId, body),
  ),
  tenantRoute(contract.archiveGauge, ({ tenant, params, body }) =>
    archiveGaugeOf(tenant, params.gaugeId, body.expectedVersion),
  ),
  tenantRoute(contract.restoreGauge, ({ tenant, params, body }) =>
    restoreGaugeOf(tenant, params.gaugeId, body.expectedVersion),
  ),
  tenantRoute(contract.listSites, ({ tenant, query }) => listOfSites(tenant, query)),
]
