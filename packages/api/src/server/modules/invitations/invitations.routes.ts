import * as contract from '../../../contract/invitations'
import { personRoute, tenantRoute, type Route } from '../../http/route'
import { acceptInvitationOf } from './invitations.accept.service'
import { openInvitationOf, refusalsLogged, type InvitationDependencies } from './invitations.find.service'
import {
  inviteMemberOf,
  inviteSupplierOf,
  listOfInvitations,
  resendOf,
  revokeOf,
} from './invitations.service'

export const invitationsRoutes = (dependencies: InvitationDependencies): Route[] => {
  const { invitationSecret: secret } = dependencies
  return [
    tenantRoute(contract.listInvitations, ({ tenant, query }) => listOfInvitations(tenant, 'member', query)),
    tenantRoute(contract.inviteMember, ({ tenant, body }) => inviteMemberOf(tenant, secret, body)),
    tenantRoute(contract.resendInvitation, ({ tenant, params, body }) =>
      resendOf(tenant, secret, 'member', params.invitationId, body.expectedVersion),
    ),
    tenantRoute(contract.revokeInvitation, ({ tenant, params, body }) =>
      revokeOf(tenant, 'member', params.invitationId, body.expectedVersion),
    ),
    tenantRoute(contract.listSupplierInvitations, ({ tenant, query }) =>
      listOfInvitations(tenant, 'supplier', query),
    ),
    tenantRoute(contract.inviteSupplier, ({ tenant, body }) => inviteSupplierOf(tenant, secret, body)),
    tenantRoute(contract.resendSupplierInvitation, ({ tenant, params, body }) =>
      resendOf(tenant, secret, 'supplier', params.supplierInvitationId, body.expectedVersion),
    ),
    tenantRoute(contract.revokeSupplierInvitation, ({ tenant, params, body }) =>
      revokeOf(tenant, 'supplier', params.supplierInvitationId, body.expectedVersion),
    ),

    personRoute(contract.openInvitation, ({ person, services, body }) =>
      refusalsLogged(dependencies, services, person, () =>
        openInvitationOf(dependencies, services, person, body.token),
      ),
    ),
    personRoute(contract.acceptInvitation, ({ person, services, body }) =>
      refusalsLogged(dependencies, services, person, () =>
        acceptInvitationOf(dependencies, services, person, body),
      ),
    ),
  ]
}
