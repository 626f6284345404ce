import { sql } from 'drizzle-orm'
import type { Role, Side } from '../../../contract/access'
import type { MessageKind } from '../../../contract/messages'
import type { Tenant } from '../../db/tenant'

/** A message to the members of one organisation who hold one of the roles. */
export interface Notice {
  organisationId: string
  /** The side they act on, which names the app the link leads into. */
  side: Side
  roles: readonly Role[]
  /** What it is about, so that a person can keep it out of their mail. */
  kind: MessageKind
  subject: string
  body: string
  /** Path in that side's app below the organisation, such as `submissions/<id>`. */
  path: string
}

/** The working roles of each side, who hear of what waits for their side. */
export const workingRoles: Record<Side, readonly Role[]> = {
  supplier: ['gauge-engineer', 'supplier-approver'],
  customer: ['quality-representative', 'customer-approver'],
}

/** Writes messages and their mail through the database function that alone may reach the other side's members. */
export async function sendNotices(tenant: Tenant, notices: readonly Notice[]): Promise<void> {
  for (const notice of notices) {
    const link = `/organisations/${notice.organisationId}/${notice.path}`
    await tenant.tx.execute(
      sql`select notify_party(${notice.organisationId}::uuid, ${notice.side}, ${sql.param([...notice.roles])}::text[], ${tenant.userId}::uuid, ${notice.kind}, ${notice.subject}, ${notice.body}, ${link}, ${tenant.now}::timestamptz)`,
    )
  }
}
