import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgPolicy, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { MessageKind } from '../../../contract/messages'
import { currentOrg, currentUser, instant, ownerColumn, primaryId } from '../../db/columns'
import { invitations } from '../invitations/invitations.table'
import { organisations } from '../organisations/organisations.table'
import { users } from '../sign-in/sign-in.table'

const own = `org_id = ${currentOrg} and user_id = ${currentUser}`

/** Every message, readable in the app by the one person it is for. Written through a function of the database. */
export const messages = pgTable(
  'messages',
  {
    ...ownerColumn,
    id: primaryId(),
    userId: uuid().notNull(),
    side: text().$type<'supplier' | 'customer'>().notNull(),
    kind: text().$type<MessageKind>().notNull(),
    subject: text().notNull(),
    body: text().notNull(),
    /** Path in the app of that side, such as `/organisations/…/submissions/…`. */
    link: text().notNull(),
    createdAt: instant().notNull(),
    readAt: instant(),
  },
  (t) => [
    unique('messages_org_id').on(t.orgId, t.id),
    index('messages_person').on(t.orgId, t.userId, t.createdAt),
    foreignKey({ name: 'messages_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({ name: 'messages_user_fk', columns: [t.userId], foreignColumns: [users.id] }),
    pgPolicy('messages_own', { as: 'permissive', for: 'select', to: 'evenrule_app', using: sql.raw(own) }),
    pgPolicy('messages_read', {
      as: 'permissive',
      for: 'update',
      to: 'evenrule_app',
      using: sql.raw(own),
      withCheck: sql.raw(own),
    }),
    pgPolicy('messages_system', {
      as: 'permissive',
      for: 'select',
      to: 'evenrule_system',
      using: sql.raw('true'),
    }),
  ],
)

/**
 * Mail waiting to be sent, once each; the worker's alone. It is the mail of a message, or of an invitation, whose
 * address is no user's yet.
 */
export const outbox = pgTable(
  'outbox',
  {
    ...ownerColumn,
    id: primaryId(),
    messageId: uuid(),
    invitationId: uuid(),
    /** Which sending of the invitation it is: once that was sent again, this mail is not wanted any more. */
    invitationNonce: text(),
    attempts: integer().notNull().default(0),
    nextAttemptAt: instant().notNull(),
    sentAt: instant(),
    lastError: text(),
  },
  (t) => [
    unique('outbox_message').on(t.orgId, t.messageId),
    index('outbox_due')
      .on(t.nextAttemptAt)
      .where(sql`sent_at is null`),
    foreignKey({
      name: 'outbox_message_fk',
      columns: [t.orgId, t.messageId],
      foreignColumns: [messages.orgId, messages.id],
    }),
    foreignKey({
      name: 'outbox_invitation_fk',
      columns: [t.orgId, t.invitationId],
      foreignColumns: [invitations.orgId, invitations.id],
    }),
    check(
      'outbox_one_thing',
      sql`(message_id is null) <> (invitation_id is null) and (invitation_id is null) = (invitation_nonce is null)`,
    ),
    pgPolicy('outbox_system', {
      as: 'permissive',
      for: 'all',
      to: 'evenrule_system',
      using: sql.raw('true'),
      withCheck: sql.raw('true'),
    }),
  ],
)
