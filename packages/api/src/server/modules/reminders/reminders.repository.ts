import { sql } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { Database } from '../../db/database'
import type { Tenant } from '../../db/tenant'
import { reminders } from './reminders.table'
import type { Reminder } from './reminders.types'

/** Every organisation on every side it stands on. */
export async function selectSides(database: Database): Promise<{ organisationId: string; side: Side }[]> {
  const { rows } = await database.execute<{ organisationId: string; side: Side }>(
    sql`select org_id as "organisationId", side from organisations_with_sides()`,
  )
  return rows
}

/** Notes that these are told now; returns those that were not before, whoever looks at the same time. */
export async function claim(tenant: Tenant, due: readonly Reminder[]): Promise<Reminder[]> {
  const fresh: Reminder[] = []
  // In one order, so that two workers on the same organisation wait for each other instead of locking each other out.
  const keyOf = ({ kind, subjectId, day }: Reminder) => `${kind} ${subjectId} ${day}`
  for (const reminder of [...due].sort((a, b) => (keyOf(a) < keyOf(b) ? -1 : 1))) {
    const { kind, subjectId, day } = reminder
    const noted = await tenant.tx
      .insert(reminders)
      .values({ orgId: tenant.organisationId, kind, subjectId, day, toldAt: tenant.now })
      .onConflictDoNothing()
      .returning({ kind: reminders.kind })
    if (noted.length > 0) fresh.push(reminder)
  }
  return fresh
}
