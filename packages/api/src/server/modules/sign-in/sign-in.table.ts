import { boolean, jsonb, pgPolicy, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { sql } from 'drizzle-orm'
import { currentUser, instant, primaryId } from '../../db/columns'

/** People, keyed by issuer and subject, never by e-mail. A person sees and changes only their own row here. */
export const users = pgTable(
  'users',
  {
    id: primaryId(),
    issuer: text().notNull(),
    subject: text().notNull(),
    email: text().notNull(),
    emailVerified: boolean().notNull().default(false),
    name: text().notNull(),
    /** Kinds of message that this person does not want by e-mail. */
    mutedMail: jsonb().$type<string[]>().notNull().default([]),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('users_issuer_subject').on(t.issuer, t.subject),
    pgPolicy('users_self', {
      as: 'permissive',
      for: 'all',
      to: 'evenrule_app',
      using: sql.raw(`id = ${currentUser}`),
      withCheck: sql.raw(`id = ${currentUser}`),
    }),
    // The worker addresses mail.
    pgPolicy('users_system', {
      as: 'permissive',
      for: 'select',
      to: 'evenrule_system',
      using: sql.raw('true'),
    }),
  ],
)

/** Sign-ins, sign-outs and refusals: append-only, without tokens. Read by the owner of the database alone. */
export const securityEvents = pgTable(
  'security_events',
  {
    id: primaryId(),
    at: instant().notNull(),
    kind: text().notNull(),
    userId: uuid(),
    orgId: uuid(),
    detail: jsonb().$type<Record<string, string>>().notNull().default({}),
  },
  () => [
    pgPolicy('security_events_append', {
      as: 'permissive',
      for: 'insert',
      to: 'evenrule_app',
      withCheck: sql.raw('true'),
    }),
  ],
)
