import { sql } from 'drizzle-orm'
import type { Role, Side } from '../../../contract/access'
import type { InvitationKind } from '../../../contract/moves/invitation'
import type { Transaction } from '../../db/database'
import type { Tenant } from '../../db/tenant'

/** An invitation as the holder of its link finds it, whosesoever it is. */
export interface FoundInvitation extends Record<string, unknown> {
  orgId: string
  id: string
  kind: InvitationKind
  side: Side
  email: string
  supplierName: string | null
  supplierNumber: string | null
  roles: Role[]
  endsOn: string | null
  message: string
  nonce: string
  expiresOn: string
  acceptedAt: string | null
  acceptedBy: string | null
  acceptedFor: string | null
  revokedAt: string | null
  organisation: string
  timeZone: string
  inviter: string | null
  /** Of the person's own organisations those that supply the one that invites. */
  supplying: string[]
}

/** Finds an invitation by the hash of its token; `lock` makes all who accept one of that organisation wait. */
export async function selectByToken(
  tx: Transaction,
  hash: string,
  lock: boolean,
): Promise<FoundInvitation | undefined> {
  const { rows } = await tx.execute<FoundInvitation>(
    sql`select org_id as "orgId", id, kind, side, email, supplier_name as "supplierName",
      supplier_number as "supplierNumber", roles, ends_on as "endsOn", message, nonce, expires_on as "expiresOn",
      accepted_at as "acceptedAt", accepted_by as "acceptedBy", accepted_for as "acceptedFor",
      revoked_at as "revokedAt", org_name as organisation, time_zone as "timeZone", inviter, supplying
      from invitation_by_token(${hash}, ${lock})`,
  )
  return rows[0]
}

/** Uses an invitation up: a membership of the person, or the relationship of this organisation with the inviter. */
export async function useInvitation({ tx, now }: Tenant, hash: string, relationshipId: string | null) {
  await tx.execute(sql`select accept_invitation(${hash}, ${relationshipId}::uuid, ${now}::timestamptz)`)
}

/** Makes this organisation, which does not exist yet, with the person as its admin. */
export async function insertFounded(
  { tx, now }: Tenant,
  hash: string,
  { name, timeZone }: { name: string; timeZone: string },
): Promise<void> {
  await tx.execute(sql`select found_organisation(${hash}, ${name}, ${timeZone}, ${now}::timestamptz)`)
}
