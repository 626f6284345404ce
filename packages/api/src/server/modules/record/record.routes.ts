import { listEvents, listRecordChoices, verifyRecord } from '../../../contract/record'
import { tenantRoute, type Route } from '../../http/route'
import { checkChain, choicesOf, listOfEvents } from './record.service'

export const recordRoutes: Route[] = [
  tenantRoute(listEvents, ({ tenant, query }) => listOfEvents(tenant, query)),
  tenantRoute(listRecordChoices, ({ tenant, query }) => choicesOf(tenant, query)),
  tenantRoute(verifyRecord, ({ tenant, params, query }) => checkChain(tenant, params.chainId, query.hash)),
]
