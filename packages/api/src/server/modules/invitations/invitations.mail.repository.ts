import { and, eq, sql } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import { invitationState } from '../../../contract/moves/invitation'
import { dayIn } from '../../calendar'
import type { Transaction } from '../../db/database'
import { organisations } from '../organisations/organisations.table'
import { users } from '../sign-in/sign-in.table'
import type { MailedInvitation } from './invitations.messages'
import { invitations } from './invitations.table'

/** An invitation as its mail is written from it; the token is derived only then. */
export interface InvitationToMail extends MailedInvitation {
  of: 'invitation'
  id: string
  nonce: string
  side: Side
  sentAt: string
}

/**
 * What one sending of an invitation says, read as the organisation that sends it. Null where it is not wanted any
 * more: sent again since then, accepted, revoked, or over.
 */
export async function selectInvitationToMail(
  tx: Transaction,
  { orgId, invitationId, nonce }: { orgId: string; invitationId: string; nonce: string },
  now: string,
): Promise<InvitationToMail | null> {
  await tx.execute(sql`select set_config('app.org_id', ${orgId}, true)`)
  const { kind, side, email, supplierName, roles, endsOn, message, sentAt, expiresOn } = invitations
  const [row] = await tx
    .select({
      invitation: { kind, side, email, supplierName, roles, endsOn, message, sentAt, expiresOn },
      standing: { acceptedAt: invitations.acceptedAt, revokedAt: invitations.revokedAt },
      organisation: organisations.name,
      timeZone: organisations.timeZone,
      inviter: users.name,
    })
    .from(invitations)
    .innerJoin(organisations, eq(organisations.id, invitations.orgId))
    .leftJoin(users, eq(users.id, invitations.invitedBy))
    .where(and(eq(invitations.orgId, orgId), eq(invitations.id, invitationId), eq(invitations.nonce, nonce)))
  if (!row) return null
  const { invitation, standing, organisation, inviter } = row
  const state = invitationState({ ...invitation, ...standing }, dayIn(row.timeZone, now))
  return state === 'pending'
    ? { of: 'invitation', id: invitationId, nonce, ...invitation, organisation, inviter }
    : null
}
