import { foreignKey, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'

/** Files as uploaded, byte for byte; the bytes lie in the object store under their content's address. */
export const files = pgTable(
  'files',
  {
    ...ownerColumn,
    id: primaryId(),
    name: text().notNull(),
    contentType: text().notNull(),
    size: integer().notNull(),
    sha256: text().notNull(),
    storageKey: text().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
  },
  (t) => [
    unique('files_org_id').on(t.orgId, t.id),
    foreignKey({ name: 'files_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    ownerPolicy('files'),
  ],
)
