import * as contract from '../../../contract/house-terms'
import { tenantRoute, type Route } from '../../http/route'
import { offer } from './house-terms.offer.service'
import { houseTermsById, listOfHouseTerms } from './house-terms.read.service'
import { begin, discard, publish, save } from './house-terms.service'

export const houseTermsRoutes: Route[] = [
  tenantRoute(contract.listHouseTerms, ({ tenant, query }) => listOfHouseTerms(tenant, query)),
  tenantRoute(contract.beginHouseTerms, ({ tenant, body }) => begin(tenant, body)),
  tenantRoute(contract.readHouseTerms, ({ tenant, params }) => houseTermsById(tenant, params.houseTermsId)),
  tenantRoute(contract.saveHouseTerms, ({ tenant, params, body }) => save(tenant, params.houseTermsId, body)),
  tenantRoute(contract.publishHouseTerms, ({ tenant, params, body }) =>
    publish(tenant, params.houseTermsId, body.expectedVersion),
  ),
  tenantRoute(contract.discardHouseTerms, ({ tenant, params, body }) =>
    discard(tenant, params.houseTermsId, body.expectedVersion),
  ),
  tenantRoute(contract.offerHouseTerms, ({ tenant, params, body }) =>
    offer(tenant, params.houseTermsId, body),
  ),
]
