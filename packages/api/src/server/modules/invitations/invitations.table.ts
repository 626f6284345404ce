import { sql } from 'drizzle-orm'
import {
  check,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Role, Side } from '../../../contract/access'
import type { InvitationKind } from '../../../contract/moves/invitation'
import { instant, ownerColumn, ownerPolicy, primaryId, restrictPolicy } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'
import { relationships } from '../relationships/relationships.table'

/**
 * Whom an organisation has asked in. The token of the link is nowhere: it is derived from the id, the nonce and a
 * secret of the environment, and only its hash is kept. Accepting is written by a function of the database.
 */
export const invitations = pgTable(
  'invitations',
  {
    ...ownerColumn,
    id: primaryId(),
    kind: text().$type<InvitationKind>().notNull(),
    /** The app the link leads to. */
    side: text().$type<Side>().notNull(),
    /** As it was entered; compared without regard to case. */
    email: text().notNull(),
    supplierName: text(),
    supplierNumber: text(),
    roles: text().array().$type<Role[]>().notNull().default([]),
    /** Last day of the membership offered. */
    endsOn: date({ mode: 'string' }),
    message: text().notNull(),
    invitedBy: uuid().notNull(),
    createdAt: instant().notNull(),
    /** Changes with every sending, and the token with it. */
    nonce: text().notNull(),
    tokenHash: text().notNull(),
    sentAt: instant().notNull(),
    expiresOn: date({ mode: 'string' }).notNull(),
    acceptedAt: instant(),
    acceptedBy: uuid(),
    /** The relationship that a supplier's acceptance began. */
    relationshipId: uuid(),
    supplierOrgId: uuid(),
    revokedAt: instant(),
    revokedBy: uuid(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('invitations_org_id').on(t.orgId, t.id),
    // One that is open for each address and kind; an expired one is sent again rather than doubled.
    uniqueIndex('invitations_open')
      .on(t.orgId, t.kind, sql`lower(${t.email})`)
      .where(sql`accepted_at is null and revoked_at is null`),
    index('invitations_newest').on(t.orgId, t.kind, t.createdAt),
    // Not unique: a refusal would tell of other organisations, and two tokens never share a hash.
    index('invitations_token').on(t.tokenHash),
    check('invitations_one_end', sql`accepted_at is null or revoked_at is null`),
    check(
      'invitations_kind',
      sql`case kind when 'member' then cardinality(roles) > 0 and supplier_name is null when 'supplier' then supplier_name is not null and cardinality(roles) = 0 else false end`,
    ),
    foreignKey({ name: 'invitations_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({
      name: 'invitations_relationship_fk',
      columns: [t.relationshipId, t.supplierOrgId, t.orgId],
      foreignColumns: [relationships.id, relationships.supplierOrgId, relationships.customerOrgId],
    }),
    ownerPolicy('invitations'),
    // Nobody writes down that an invitation was used or revoked before it was sent.
    restrictPolicy('invitations_begin_open', 'accepted_at is null and revoked_at is null', 'insert'),
  ],
)
