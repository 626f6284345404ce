import { listRelationships } from '../../../contract/relationships'
import { tenantRoute, type Route } from '../../http/route'
import { listOfRelationships } from './relationships.service'

export const relationshipsRoutes: Route[] = [
  tenantRoute(listRelationships, ({ tenant, query }) => listOfRelationships(tenant, query)),
]
