import * as contract from '../../../contract/organisations'
import { tenantRoute, type Route } from '../../http/route'
import {
  changeMemberOf,
  changeOrganisationOf,
  endMemberOf,
  listOfMembers,
  organisationOf,
} from './organisations.service'

export const organisationsRoutes: Route[] = [
  tenantRoute(contract.readOrganisation, ({ tenant }) => organisationOf(tenant)),
  tenantRoute(contract.changeOrganisation, ({ tenant, body }) => changeOrganisationOf(tenant, body)),
  tenantRoute(contract.listMembers, ({ tenant, query }) => listOfMembers(tenant, query)),
  tenantRoute(contract.changeMember, ({ tenant, params, body }) =>
    changeMemberOf(tenant, params.userId, body),
  ),
  tenantRoute(contract.endMember, ({ tenant, params, body }) =>
    endMemberOf(tenant, params.userId, body.expectedVersion),
  ),
]
