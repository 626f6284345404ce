import { listCoverage, listWaiting, readCounts } from '../../../contract/front'
import { tenantRoute, type Route } from '../../http/route'
import { listOfCoverage } from './coverage.service'
import { countsOf, listOfWaiting } from './waiting.service'

export const frontRoutes: Route[] = [
  tenantRoute(readCounts, ({ tenant }) => countsOf(tenant)),
  tenantRoute(listWaiting, ({ tenant, query }) => listOfWaiting(tenant, query)),
  tenantRoute(listCoverage, ({ tenant, query }) => listOfCoverage(tenant, query)),
]
