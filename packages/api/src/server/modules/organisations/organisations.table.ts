import { sql } from 'drizzle-orm'
import {
  date,
  foreignKey,
  integer,
  pgPolicy,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Role } from '../../../contract/access'
import { currentOrg, instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { users } from '../sign-in/sign-in.table'

/** An organisation sees itself, and those it has a relationship with. */
export const organisations = pgTable(
  'organisations',
  {
    id: primaryId(),
    name: text().notNull(),
    timeZone: text().notNull(),
    createdAt: instant().notNull(),
    rowVersion: integer().notNull().default(1),
  },
  () => [
    pgPolicy('organisations_self', {
      as: 'permissive',
      for: 'all',
      to: ['evenrule_app', 'evenrule_system'],
      using: sql.raw(`id = ${currentOrg}`),
      withCheck: sql.raw(`id = ${currentOrg}`),
    }),
    pgPolicy('organisations_partners', {
      as: 'permissive',
      for: 'select',
      to: ['evenrule_app', 'evenrule_system'],
      using: sql.raw(
        `exists (select 1 from relationships r where r.supplier_org_id = organisations.id or r.customer_org_id = organisations.id)`,
      ),
    }),
  ],
)

export const memberships = pgTable(
  'memberships',
  {
    ...ownerColumn,
    userId: uuid().notNull(),
    roles: text().array().$type<Role[]>().notNull(),
    createdAt: instant().notNull(),
    /** Last day of the membership, for outside auditors; null for no end. */
    endsOn: date({ mode: 'string' }),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.orgId, t.userId] }),
    foreignKey({ name: 'memberships_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({ name: 'memberships_user_fk', columns: [t.userId], foreignColumns: [users.id] }),
    ownerPolicy('memberships'),
  ],
)

export const sites = pgTable('sites', { ...ownerColumn, id: primaryId(), name: text().notNull() }, (t) => [
  unique('sites_org_id').on(t.orgId, t.id),
  unique('sites_org_name').on(t.orgId, t.name),
  foreignKey({ name: 'sites_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
  ownerPolicy('sites'),
])
