import { invitations, type InvitationKind, type SentQueryOf } from '@evenrule/api/contract'
import { useApi } from '../../session/client'
import { useHere } from '../common'

type Invitation = invitations.Invitation

/** What can be done with the invitations of a kind: each kind has addresses of its own, for who may differs. */
export function useInvitations(kind: InvitationKind) {
  const api = useApi()
  const here = useHere()
  const version = ({ rowVersion }: Invitation) => ({ expectedVersion: rowVersion })
  const asMember = ({ id }: Invitation) => here.params({ invitationId: id })
  const asSupplier = ({ id }: Invitation) => here.params({ supplierInvitationId: id })
  type Query = SentQueryOf<typeof invitations.listInvitations>
  return kind === 'member'
    ? {
        mayInvite: here.allows('members.invite'),
        list: (query: Query) => api.call(invitations.listInvitations, { params: here.params(), query }),
        resend: (row: Invitation) =>
          api.call(invitations.resendInvitation, { params: asMember(row), body: version(row) }),
        revoke: (row: Invitation) =>
          api.call(invitations.revokeInvitation, { params: asMember(row), body: version(row) }),
      }
    : {
        mayInvite: here.allows('suppliers.invite'),
        list: (query: Query) =>
          api.call(invitations.listSupplierInvitations, { params: here.params(), query }),
        resend: (row: Invitation) =>
          api.call(invitations.resendSupplierInvitation, { params: asSupplier(row), body: version(row) }),
        revoke: (row: Invitation) =>
          api.call(invitations.revokeSupplierInvitation, { params: asSupplier(row), body: version(row) }),
      }
}
