import { listCoverage, listWaiting, readCounts } from '../../../contract/front'
import { tenantRoute, type Route } from '../../http/route'
import { listOfCoverage } from './coverage.service'
import { selectCounts } from './waiting.repository'
import { listOfWaiting } from './waiting.service'

export const frontRoutes: Route[] = [
  tenantRoute(readCounts, ({ tenant }) => selectCounts(tenant)),
  tenantRoute(listWaiting, ({ tenant, query }) => listOfWaiting(tenant, query)),
  tenantRoute(listCoverage, ({ tenant, query }) => listOfCoverage(tenant, query)),
]
