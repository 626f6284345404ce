import * as contract from '../../../contract/requests'
import { tenantRoute, type Route } from '../../http/route'
import { ask, moveDate, withdraw } from './requests.ask.service'
import { listOfChoices, listOfRequests, readRequestOf } from './requests.read.service'

export const requestsRoutes: Route[] = [
  tenantRoute(contract.listRequests, ({ tenant, query }) => listOfRequests(tenant, query)),
  tenantRoute(contract.askForProof, ({ tenant, body }) => ask(tenant, body)),
  tenantRoute(contract.listRequestChoices, ({ tenant, query }) => listOfChoices(tenant, query)),
  tenantRoute(contract.readRequest, ({ tenant, params }) => readRequestOf(tenant, params.requestId)),
  tenantRoute(contract.moveRequestDate, ({ tenant, params, body }) =>
    moveDate(tenant, params.requestId, body),
  ),
  tenantRoute(contract.withdrawRequest, ({ tenant, params, body }) =>
    withdraw(tenant, params.requestId, body),
  ),
]
