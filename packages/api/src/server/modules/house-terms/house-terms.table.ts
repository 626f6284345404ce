import type { Clause } from '@evenrule/metrology'
import { sql } from 'drizzle-orm'
import {
  foreignKey,
  integer,
  jsonb,
  pgPolicy,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { HouseTermsState } from '../../../contract/moves/house-terms'
import type { Terms } from '../../../contract/terms'
import { currentOrg, instant, ownerColumn, ownerPolicy, primaryId, restrictPolicy } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'

/**
 * What a customer offers by default: one draft at a time, and published versions that never change. The published ones
 * are read by the suppliers it has a relationship with, and by nobody else.
 */
export const houseTerms = pgTable(
  'house_terms',
  {
    ...ownerColumn,
    id: primaryId(),
    /** Counts the published versions; null for a draft. */
    number: integer(),
    state: text().$type<HouseTermsState>().notNull(),
    clauses: jsonb().$type<Clause[]>().notNull(),
    terms: jsonb().$type<Terms>().notNull(),
    words: text().notNull().default(''),
    /** From publishing on: the canonical text and its SHA-256. */
    text: text(),
    sha256: text(),
    createdAt: instant().notNull(),
    savedAt: instant().notNull(),
    savedBy: uuid().notNull(),
    publishedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('house_terms_org_id').on(t.orgId, t.id),
    unique('house_terms_number').on(t.orgId, t.number),
    uniqueIndex('house_terms_one_draft')
      .on(t.orgId)
      .where(sql`state = 'draft'`),
    foreignKey({ name: 'house_terms_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    ownerPolicy('house_terms'),
    pgPolicy('house_terms_suppliers', {
      as: 'permissive',
      for: 'select',
      to: 'evenrule_app',
      using: sql.raw(
        `state = 'published' and exists (select 1 from relationships r where r.customer_org_id = house_terms.org_id and r.supplier_org_id = ${currentOrg})`,
      ),
    }),
    restrictPolicy('house_terms_published_stay', `state = 'draft'`, 'delete'),
    pgPolicy('house_terms_published_unchanged', {
      as: 'restrictive',
      for: 'update',
      to: 'evenrule_app',
      using: sql`state = 'draft'`,
      withCheck: sql`true`,
    }),
  ],
)
