import { foreignKey, jsonb, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { instant, ownerColumn, ownerPolicy } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'

/** How an organisation reads its files, known again by their headings; the shape of `mapping` is the reader's. */
export const columnMappings = pgTable(
  'column_mappings',
  {
    ...ownerColumn,
    /** What is read, such as the columns of readings. */
    purpose: text().notNull(),
    /** SHA-256 of the headings. */
    signature: text().notNull(),
    mapping: jsonb().$type<unknown>().notNull(),
    updatedAt: instant().notNull(),
    updatedBy: uuid().notNull(),
  },
  (t) => [
    primaryKey({ name: 'column_mappings_pk', columns: [t.orgId, t.purpose, t.signature] }),
    foreignKey({ name: 'column_mappings_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    ownerPolicy('column_mappings'),
  ],
)
