import { and, eq, gte, isNotNull, isNull, lt, sql, type SQL } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listInvitations } from '../../../contract/invitations'
import type { InvitationKind, InvitationState } from '../../../contract/moves/invitation'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { openAlready } from './invitations.errors'
import { invitations } from './invitations.table'

export type InvitationRow = typeof invitations.$inferSelect
type NewInvitation = Omit<typeof invitations.$inferInsert, 'orgId' | 'invitedBy'>

const open = and(isNull(invitations.acceptedAt), isNull(invitations.revokedAt))

/** Rows that stand so today: SQL of `invitationState`. */
const stands = (state: InvitationState, today: string): SQL | undefined =>
  ({
    pending: and(open, gte(invitations.expiresOn, today)),
    expired: and(open, lt(invitations.expiresOn, today)),
    accepted: isNotNull(invitations.acceptedAt),
    revoked: isNotNull(invitations.revokedAt),
  })[state]

/** One page of the invitations of a kind; every row carries the total. */
export async function selectInvitations(
  { tx, organisationId }: Tenant,
  kind: InvitationKind,
  query: QueryOf<typeof listInvitations>,
  today: string,
) {
  const { createdAt, email, expiresOn, supplierName } = invitations
  return tx
    .select({ invitation: invitations, total: totalOverPages })
    .from(invitations)
    .where(
      and(
        eq(invitations.orgId, organisationId),
        eq(invitations.kind, kind),
        query.state ? stands(query.state, today) : undefined,
        containing(query.search, email, supplierName),
      ),
    )
    .orderBy(...orderOf({ createdAt, email, expiresOn }, query.sort, invitations.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectInvitation(
  { tx, organisationId }: Tenant,
  kind: InvitationKind,
  id: string,
): Promise<InvitationRow | undefined> {
  const [row] = await tx
    .select()
    .from(invitations)
    .where(and(eq(invitations.orgId, organisationId), eq(invitations.kind, kind), eq(invitations.id, id)))
  return row
}

/** Stores an invitation; a second open one to the address is refused at its field. */
export async function insertInvitation(tenant: Tenant, values: NewInvitation): Promise<InvitationRow> {
  const { tx, organisationId: orgId, userId: invitedBy } = tenant
  const [row] = await uniqueOr409(openAlready, () =>
    tx
      .insert(invitations)
      .values({ ...values, orgId, invitedBy })
      .returning(),
  )
  if (!row) throw new Error('The invitation was not stored.')
  return row
}

/** Changes an invitation that still has the version the sender saw; undefined where it has not. */
export async function updateInvitation(
  { tx, organisationId }: Tenant,
  id: string,
  expectedVersion: number,
  values:
    | Pick<InvitationRow, 'nonce' | 'tokenHash' | 'sentAt' | 'expiresOn'>
    | Pick<InvitationRow, 'revokedAt' | 'revokedBy'>,
): Promise<InvitationRow | undefined> {
  const [row] = await tx
    .update(invitations)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(
      and(
        eq(invitations.orgId, organisationId),
        eq(invitations.id, id),
        eq(invitations.rowVersion, expectedVersion),
        open,
      ),
    )
    .returning()
  return row
}

/** Puts the mail of the invitation, as it stands now, into the outbox. */
export async function insertInvitationMail({ tx, now }: Tenant, id: string): Promise<void> {
  await tx.execute(sql`select mail_invitation(${id}::uuid, ${now}::timestamptz)`)
}
