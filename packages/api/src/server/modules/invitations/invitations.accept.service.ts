import type { Permission } from '../../../contract/access'
import type { AnswerOf, BodyOf } from '../../../contract/define'
import type { acceptInvitation } from '../../../contract/invitations'
import { invitationMove, invitationState, type InvitationMove } from '../../../contract/moves/invitation'
import { dayIn } from '../../calendar'
import { newId } from '../../db/columns'
import { withPerson, withTenant, type Tenant } from '../../db/tenant'
import { invalidInput, wrongState } from '../../errors'
import { authorise } from '../../http/authorise'
import type { SignedIn } from '../../http/session'
import type { Services } from '../../services'
import { siteNamed } from '../gauges/sites.repository'
import { selectMember } from '../organisations/members.repository'
import { hasEnded } from '../organisations/organisations.lookup.service'
import { selectOrganisation } from '../organisations/organisations.repository'
import * as errors from './invitations.errors'
import { invitationFor, type InvitationDependencies } from './invitations.find.service'
import { tellOfMember, tellOfSupplier } from './invitations.messages'
import { insertFounded, useInvitation, type FoundInvitation } from './invitations.token.repository'
import { hashOf } from './invitations.token'

type Acceptance = BodyOf<typeof acceptInvitation>
type Accepted = AnswerOf<typeof acceptInvitation>

/**
 * Accepts an invitation in one transaction, with the organisation that invites locked: whoever comes second sees what
 * the first has done, and whatever is refused leaves the invitation as it was. A member joins in the transaction of
 * the organisation that invites; a supplier accepts in that of the organisation it acts for.
 */
export async function acceptInvitationOf(
  dependencies: InvitationDependencies,
  services: Services,
  { userId, authenticatedAt }: SignedIn,
  body: Acceptance,
): Promise<Accepted> {
  const { database } = dependencies
  const { token } = body
  const { kind, orgId, side } = await withPerson(database, userId, (tx) =>
    invitationFor(dependencies, tx, userId, { token, lock: false }),
  )
  const organisationId = kind === 'member' ? orgId : (body.organisationId ?? newId())
  const context = { organisationId, userId, side, roles: [], authenticatedAt }
  return withTenant(database, services, context, async (tenant) => {
    const found = await invitationFor(dependencies, tenant.tx, userId, { token, lock: true })
    const { permission } = requireOpen(found, tenant.now)
    if (kind === 'member') return join(tenant, found, token)
    await bringOrganisation(tenant, body, permission)
    return beginRelationship(tenant, found, token)
  })
}

/** The move that accepting is; refused where the invitation is used, revoked or over. */
function requireOpen(found: FoundInvitation, now: string): InvitationMove {
  const { kind, organisation, expiresOn } = found
  const state = invitationState(found, dayIn(found.timeZone, now))
  const move = invitationMove('accept', kind, state)
  if (move) return move
  if (state === 'accepted') throw errors.usedInvitation()
  if (state === 'revoked') throw errors.revokedInvitation(organisation)
  if (state === 'expired') throw errors.expiredInvitation(organisation, expiresOn)
  throw wrongState('invitation', state)
}

/** Makes the person a member. The members of the organisation cannot change before this transaction ends. */
async function join(tenant: Tenant, found: FoundInvitation, token: string): Promise<Accepted> {
  const { userId, organisationId } = tenant
  const { id, roles, endsOn, side, organisation } = found
  const before = await selectMember(tenant, userId)
  if (before && !hasEnded(before.membership.endsOn, dayIn(found.timeZone, tenant.now)))
    throw errors.memberAlready(organisation)
  await useInvitation(tenant, hashOf(token), null)
  tenant.record({
    type: 'member.joined',
    subject: { type: 'member', id: userId },
    data: { invitation: id, roles, endsOn },
  })
  await tellOfMember(tenant, found)
  return { organisationId, side, relationshipId: null }
}

/** Begins the relationship of the organisation that accepts with the one that invites; its chain begins with it. */
async function beginRelationship(tenant: Tenant, found: FoundInvitation, token: string): Promise<Accepted> {
  const { id: organisationId, name } = await selectOrganisation(tenant)
  if (found.orgId === organisationId) throw errors.supplierItself(name)
  if (found.supplying.includes(organisationId)) throw errors.suppliesAlready(name, found.organisation)
  const relationship = { id: newId(), supplierOrgId: organisationId, customerOrgId: found.orgId }
  await useInvitation(tenant, hashOf(token), relationship.id)
  tenant.record({
    type: 'relationship.begun',
    relationship,
    subject: { type: 'relationship', id: relationship.id },
    data: { invitation: found.id, timeZone: found.timeZone, supplierNumber: found.supplierNumber },
  })
  tellOfSupplier(tenant, found, name)
  return { organisationId, side: found.side, relationshipId: relationship.id }
}

/** The organisation that accepts: one that the person administers, or a new one that they found with it. */
async function bringOrganisation(
  tenant: Tenant,
  { token, organisationId, newOrganisation }: Acceptance,
  permission: Permission | null,
): Promise<void> {
  if (organisationId && permission) return authorise(tenant, permission)
  if (!newOrganisation)
    throw invalidInput([
      { path: 'body.organisationId', message: 'Choose the organisation that accepts, or enter a new one.' },
    ])
  const { name, timeZone, site } = newOrganisation
  await insertFounded(tenant, hashOf(token), { name, timeZone })
  await siteNamed(tenant, site)
  tenant.record({
    type: 'organisation.founded',
    subject: { type: 'organisation', id: tenant.organisationId },
    data: { name, timeZone },
  })
}
