import type { BodyOf, QueryOf } from '../../../contract/define'
import type { Invitation, inviteMember, inviteSupplier, listInvitations } from '../../../contract/invitations'
import {
  invitationDays,
  invitationMove,
  invitationState,
  type InvitationKind,
  type InvitationMove,
} from '../../../contract/moves/invitation'
import { addDays } from '../../calendar'
import { newId } from '../../db/columns'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, wrongState } from '../../errors'
import { lockOrganisation, selectMemberWithAddress } from '../organisations/members.repository'
import { todayOf } from '../organisations/organisations.lookup.service'
import { namesOfPeople } from '../organisations/people.repository'
import { selectOwnAddress } from '../sign-in/sign-in.repository'
import { sameAddress } from './invitations.address'
import { isMember, lastDayOver, ownMember, ownSupplier } from './invitations.errors'
import {
  insertInvitation,
  insertInvitationMail,
  selectInvitation,
  selectInvitations,
  updateInvitation,
  type InvitationRow,
} from './invitations.repository'
import { hashOf, newNonce, tokenOf } from './invitations.token'

/** One page of this organisation's invitations of a kind. */
export async function listOfInvitations(
  tenant: Tenant,
  kind: InvitationKind,
  query: QueryOf<typeof listInvitations>,
) {
  const today = await todayOf(tenant)
  return paged(
    query,
    (page) => selectInvitations(tenant, kind, page, today),
    (rows) =>
      asInvitations(
        tenant,
        rows.map(({ invitation }) => invitation),
        today,
      ),
  )
}

/** Invites a person to be a member, into the app of the side on which the inviter acts. */
export async function inviteMemberOf(
  tenant: Tenant,
  secret: string,
  { email, roles, endsOn, message }: BodyOf<typeof inviteMember>,
): Promise<Invitation> {
  const today = await todayOf(tenant)
  if (endsOn !== null && endsOn < today)
    throw invalidInput([{ path: 'body.endsOn', message: 'Enter today or a later day, or leave it empty.' }])
  if (await isOwnAddress(tenant, email)) throw ownMember()
  const member = await selectMemberWithAddress(tenant, email, today)
  if (member) throw isMember(member.name)
  return send(tenant, secret, { kind: 'member', side: tenant.side, email, roles, endsOn, message }, today)
}

/** Invites a company to supply this organisation. */
export async function inviteSupplierOf(
  tenant: Tenant,
  secret: string,
  body: BodyOf<typeof inviteSupplier>,
): Promise<Invitation> {
  if (await isOwnAddress(tenant, body.email)) throw ownSupplier()
  return send(tenant, secret, { kind: 'supplier', side: 'supplier', ...body }, await todayOf(tenant))
}

const isOwnAddress = async ({ tx, userId }: Tenant, email: string): Promise<boolean> =>
  sameAddress((await selectOwnAddress(tx, userId)).email, email)

type Offer = Omit<
  Parameters<typeof insertInvitation>[1],
  'id' | 'nonce' | 'tokenHash' | 'createdAt' | 'sentAt' | 'expiresOn'
>

async function send(tenant: Tenant, secret: string, offer: Offer, today: string): Promise<Invitation> {
  const id = newId()
  const move = requireMove('invite', offer.kind, null)
  const row = await insertInvitation(tenant, {
    ...{ id, ...offer, createdAt: tenant.now },
    ...sending(tenant, secret, id, offer.endsOn ?? null, today),
  })
  await insertInvitationMail(tenant, id)
  return told(tenant, move, row, today)
}

/** A new token, good for its days from today, and never beyond the last day of what it offers. */
function sending({ now }: Tenant, secret: string, id: string, endsOn: string | null, today: string) {
  const nonce = newNonce()
  const last = addDays(today, invitationDays)
  return {
    ...{ nonce, tokenHash: hashOf(tokenOf(secret, { id, nonce })), sentAt: now },
    expiresOn: endsOn !== null && endsOn < last ? endsOn : last,
  }
}

/** Sends an invitation again: a new link by mail, and the old one is dead. */
export async function resendOf(
  tenant: Tenant,
  secret: string,
  kind: InvitationKind,
  id: string,
  expectedVersion: number,
): Promise<Invitation> {
  const { row, move, today } = await moving(tenant, 'resend', kind, id)
  if (row.endsOn !== null && row.endsOn < today) throw lastDayOver(row.endsOn)
  const next = sending(tenant, secret, id, row.endsOn, today)
  const renewed = await updateInvitation(tenant, id, expectedVersion, next)
  if (!renewed) throw changedMeanwhile('invitation')
  await insertInvitationMail(tenant, id)
  return told(tenant, move, renewed, today)
}

/** Revokes an invitation: its link is dead. */
export async function revokeOf(
  tenant: Tenant,
  kind: InvitationKind,
  id: string,
  expectedVersion: number,
): Promise<Invitation> {
  const { move, today } = await moving(tenant, 'revoke', kind, id)
  const revoked = await updateInvitation(tenant, id, expectedVersion, {
    revokedAt: tenant.now,
    revokedBy: tenant.userId,
  })
  if (!revoked) throw changedMeanwhile('invitation')
  return told(tenant, move, revoked, today)
}

/** The invitation to be moved, with the organisation locked, so that nobody accepts it meanwhile. */
async function moving(tenant: Tenant, name: InvitationMove['name'], kind: InvitationKind, id: string) {
  await lockOrganisation(tenant)
  const row = await selectInvitation(tenant, kind, id)
  if (!row) throw notFound('invitation')
  const today = await todayOf(tenant)
  return { row, today, move: requireMove(name, kind, invitationState(row, today)) }
}

function requireMove(
  name: InvitationMove['name'],
  kind: InvitationKind,
  state: Parameters<typeof invitationMove>[2],
): InvitationMove {
  const move = invitationMove(name, kind, state)
  if (!move) throw wrongState('invitation', state ?? 'not there')
  return move
}

async function told(
  tenant: Tenant,
  { event }: InvitationMove,
  row: InvitationRow,
  today: string,
): Promise<Invitation> {
  const { id, kind, roles, endsOn, expiresOn } = row
  // Neither the address nor the supplier's name: what names people stays outside the record.
  const data = { kind, expiresOn, ...(kind === 'member' ? { roles, endsOn } : {}) }
  tenant.record({ type: event, subject: { type: 'invitation', id }, data })
  const [invitation] = await asInvitations(tenant, [row], today)
  if (!invitation) throw new Error('The invitation was not read.')
  return invitation
}

async function asInvitations(
  tenant: Tenant,
  rows: readonly InvitationRow[],
  today: string,
): Promise<Invitation[]> {
  const names = await namesOfPeople(
    tenant,
    rows.flatMap(({ invitedBy, acceptedBy }) => [invitedBy, acceptedBy]),
  )
  return rows.map((row) => ({
    ...row,
    state: invitationState(row, today),
    invitedBy: names.get(row.invitedBy) ?? null,
    acceptedBy: names.get(row.acceptedBy ?? '') ?? null,
  }))
}
