import { sql } from 'drizzle-orm'
import {
  check,
  foreignKey,
  index,
  integer,
  pgPolicy,
  pgTable,
  primaryKey,
  text,
  uuid,
  type AnyPgColumn,
} from 'drizzle-orm/pg-core'
import { currentOrg, instant } from '../../db/columns'
import { relationships } from '../relationships/relationships.table'

const owner = `org_id = ${currentOrg}`
const party = `supplier_org_id = ${currentOrg} or customer_org_id = ${currentOrg}`

/** Either an organisation's journal (`org_id`) or a relationship's chain (both parties). */
const chainColumns = {
  chainId: uuid().notNull(),
  orgId: uuid(),
  supplierOrgId: uuid(),
  customerOrgId: uuid(),
}

type ChainTable = Record<'chainId' | 'supplierOrgId' | 'customerOrgId', AnyPgColumn>

/**
 * A journal bears its organisation's id, a shared chain that of the relationship of the very parties named: nobody
 * can put a row into the chain of others by naming themselves as a party.
 */
const chainBelongs = (name: string, t: ChainTable) => [
  check(
    `${name}_kind`,
    sql`(org_id is not null) <> (supplier_org_id is not null and customer_org_id is not null) and (org_id is null or org_id = chain_id)`,
  ),
  foreignKey({
    name: `${name}_relationship_fk`,
    columns: [t.chainId, t.supplierOrgId, t.customerOrgId],
    foreignColumns: [relationships.id, relationships.supplierOrgId, relationships.customerOrgId],
  }),
]

/** The last link of every chain; locked last and in id order when events are appended. */
export const recordHeads = pgTable(
  'record_heads',
  { ...chainColumns, sequence: integer().notNull(), hash: text().notNull() },
  (t) => [
    primaryKey({ columns: [t.chainId] }),
    ...chainBelongs('record_heads', t),
    pgPolicy('record_heads_visible', {
      as: 'permissive',
      for: 'all',
      to: 'evenrule_app',
      using: sql.raw(`${owner} or ${party}`),
      withCheck: sql.raw(`${owner} or ${party}`),
    }),
  ],
)

/** Events, each holding the hash of the one before. The runtime role may insert and read, nothing else. */
export const recordEvents = pgTable(
  'record_events',
  {
    ...chainColumns,
    sequence: integer().notNull(),
    at: instant().notNull(),
    type: text().notNull(),
    actorUserId: uuid(),
    actorOrgId: uuid(),
    /** What it is about, for filters: `submission`, `agreement-version`, … and its id. */
    subjectType: text().notNull(),
    subjectId: uuid().notNull(),
    taskId: uuid(),
    /** The event as canonical JSON (RFC 8785); `hash` is the SHA-256 of this text, which contains `previousHash`. */
    text: text().notNull(),
    previousHash: text().notNull(),
    hash: text().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.chainId, t.sequence] }),
    index('record_events_subject').on(t.chainId, t.subjectType, t.subjectId),
    ...chainBelongs('record_events', t),
    pgPolicy('record_events_visible', {
      as: 'permissive',
      for: 'all',
      to: 'evenrule_app',
      using: sql.raw(`${owner} or ${party}`),
      withCheck: sql.raw(`${owner} or ${party}`),
    }),
  ],
)
