import { eq, sql } from 'drizzle-orm'
import type { Role } from '../../../contract/access'
import { newId } from '../../db/columns'
import type { Database, Transaction } from '../../db/database'
import { withPerson } from '../../db/tenant'
import type { Identified } from '../../integrations/oidc'
import { securityEvents, users } from './sign-in.table'

export type SecurityEventKind =
  'sign-in' | 'sign-out' | 'sign-out-everywhere' | 'sign-in-refused' | 'invitation-refused'

/** Finds or makes the person of a verified sign-in, keyed by issuer and subject; returns their id. */
export async function personOf(database: Database, identified: Identified, at: string): Promise<string> {
  const { issuer, subject, email, emailVerified, name } = identified
  const { rows } = await database.execute<{ id: string }>(
    sql`select sign_in_person(${issuer}, ${subject}, ${email}, ${emailVerified}, ${name}, ${at}::timestamptz) as id`,
  )
  const id = rows[0]?.id
  if (!id) throw new Error('The database returned no person for a sign-in.')
  return id
}

export interface MembershipRow extends Record<string, unknown> {
  org_id: string
  org_name: string
  time_zone: string
  roles: Role[]
  supplies: boolean
  buys: boolean
}

/** The organisations of a person whose membership has not ended by now, by each organisation's own calendar. */
export async function membershipsOf(
  database: Database,
  userId: string,
  now: string,
): Promise<MembershipRow[]> {
  return withPerson(database, userId, async (tx) => {
    const { rows } = await tx.execute<MembershipRow>(
      sql`select * from memberships_of_person(${userId}::uuid, ${now}::timestamptz)`,
    )
    return rows
  })
}

/** Where a person was a member until a day that is over, by each organisation's own calendar. */
export async function endedMembershipsOf(
  database: Database,
  userId: string,
  now: string,
): Promise<{ name: string; endsOn: string }[]> {
  return withPerson(database, userId, async (tx) => {
    const { rows } = await tx.execute<{ name: string; endsOn: string }>(
      sql`select org_name as name, ends_on as "endsOn" from ended_memberships_of_person(${userId}::uuid, ${now}::timestamptz)`,
    )
    return rows
  })
}

/** The address of the person who acts, and whether their provider has verified it. */
export async function selectOwnAddress(
  tx: Transaction,
  userId: string,
): Promise<{ email: string; verified: boolean }> {
  const [row] = await tx
    .select({ email: users.email, verified: users.emailVerified })
    .from(users)
    .where(eq(users.id, userId))
  if (!row) throw new Error('The person signed in is not visible to themselves.')
  return row
}

/** Appends to the log of sign-ins, sign-outs and refusals; never with tokens. */
export async function logSecurityEvent(
  database: Database,
  event: { kind: SecurityEventKind; at: string; userId?: string; detail: Record<string, string> },
): Promise<void> {
  await database.insert(securityEvents).values({
    id: newId(),
    at: event.at,
    kind: event.kind,
    userId: event.userId ?? null,
    orgId: null,
    detail: event.detail,
  })
}
