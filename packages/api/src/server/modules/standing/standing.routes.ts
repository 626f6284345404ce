import * as contract from '../../../contract/standings'
import { tenantRoute, type Route } from '../../http/route'
import { readStandingOf, reinstateSubmission } from './standing.acts.service'
import { carryOversOf, carryOverTo } from './standing.carry.service'

export const standingRoutes: Route[] = [
  tenantRoute(contract.readStanding, ({ tenant, params }) => readStandingOf(tenant, params.submissionId)),
  tenantRoute(contract.reinstate, ({ tenant, params, body }) =>
    reinstateSubmission(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.listCarryOvers, ({ tenant, params, query }) =>
    carryOversOf(tenant, params.partId, query),
  ),
  tenantRoute(contract.carryOver, ({ tenant, params, body }) => carryOverTo(tenant, params.partId, body)),
]
