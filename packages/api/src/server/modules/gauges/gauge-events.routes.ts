import * as contract from '../../../contract/gauge-events'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { storeCertificate } from './calibrations.routes'
import { eventsOfGauge, previewOf, reportEventOf } from './gauge-events.service'

export const gaugeEventsRoutes: Route[] = [
  tenantRoute(contract.listGaugeEvents, ({ tenant, params, query }) =>
    eventsOfGauge(tenant, params.gaugeId, query),
  ),
  tenantRoute(contract.previewGaugeEvent, ({ tenant, params, query }) =>
    previewOf(tenant, { gaugeId: params.gaugeId }, query),
  ),
  tenantRoute(contract.previewStandardEvent, ({ tenant, params, query }) =>
    previewOf(tenant, { standardId: params.standardId }, query),
  ),
  preparedRoute(contract.reportGaugeEvent, storeCertificate, ({ tenant, params, body, prepared }) =>
    reportEventOf(tenant, { gaugeId: params.gaugeId }, body, prepared),
  ),
]
