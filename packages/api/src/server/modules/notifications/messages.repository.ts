import { and, eq, isNull, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listMessages, MessageKind } from '../../../contract/messages'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { users } from '../sign-in/sign-in.table'
import { messages } from './notifications.table'

export type MessageRow = typeof messages.$inferSelect

/** Row security names organisation and person already; the side is what the app adds. */
const own = ({ organisationId, userId, side }: Tenant) =>
  and(eq(messages.orgId, organisationId), eq(messages.userId, userId), eq(messages.side, side))

/** One page of the person's messages; every row carries the total. */
export async function selectMessages(tenant: Tenant, query: QueryOf<typeof listMessages>) {
  const { createdAt, subject, kind } = messages
  return tenant.tx
    .select({ message: messages, total: totalOverPages })
    .from(messages)
    .where(
      and(
        own(tenant),
        query.show === 'unread' ? isNull(messages.readAt) : undefined,
        query.kind ? eq(kind, query.kind) : undefined,
        containing(query.search, subject, messages.body),
      ),
    )
    .orderBy(...orderOf({ createdAt, subject, kind }, query.sort, messages.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function countUnread(tenant: Tenant): Promise<number> {
  return tenant.tx.$count(messages, and(own(tenant), isNull(messages.readAt)))
}

export async function selectMessage(tenant: Tenant, messageId: string): Promise<MessageRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(messages)
    .where(and(own(tenant), eq(messages.id, messageId)))
  return row
}

/** Marks unread messages, one or all, as read now; returns how many there were. */
export async function setRead(tenant: Tenant, messageId?: string): Promise<number> {
  const marked = await tenant.tx
    .update(messages)
    .set({ readAt: tenant.now })
    .where(and(own(tenant), isNull(messages.readAt), messageId ? eq(messages.id, messageId) : undefined))
    .returning({ id: messages.id })
  return marked.length
}

export async function selectMailChoice({ tx, userId }: Tenant) {
  const [row] = await tx
    .select({ email: users.email, muted: users.mutedMail })
    .from(users)
    .where(eq(users.id, userId))
  if (!row) throw new Error('The person signed in is not visible to themselves.')
  return row
}

export async function setMailChoice({ tx, userId }: Tenant, muted: readonly MessageKind[]): Promise<void> {
  await tx
    .update(users)
    .set({ mutedMail: sql`${JSON.stringify(muted)}::jsonb` })
    .where(eq(users.id, userId))
}
