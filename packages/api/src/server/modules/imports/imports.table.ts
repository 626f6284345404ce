import {
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { BadRow, Import, ImportCounts, ImportInput, ImportKind } from '../../../contract/imports'
import type { StoredImportState } from '../../../contract/moves/import'
import { instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { files } from '../files/files.table'
import { organisations } from '../organisations/organisations.table'

/** Files that were imported, with what became of them; what they brought in is one transaction with `applied`. */
export const imports = pgTable(
  'imports',
  {
    ...ownerColumn,
    id: primaryId(),
    /** The side on which it was made; the other side of the same organisation does not list it. */
    side: text().$type<Side>().notNull(),
    kind: text().$type<ImportKind>().notNull(),
    mode: text().$type<Import['mode']>().notNull(),
    state: text().$type<StoredImportState>().notNull(),
    fileId: uuid().notNull(),
    sha256: text().notNull(),
    /** How the file was read, columns included, so that it is read the same way once more. */
    input: jsonb().$type<ImportInput>().notNull(),
    /** What the preview rested on. */
    basis: text().notNull(),
    counts: jsonb().$type<ImportCounts>().notNull(),
    leftOut: jsonb().$type<BadRow[]>().notNull().default([]),
    done: integer().notNull().default(0),
    total: integer().notNull(),
    failure: jsonb().$type<Import['failure']>(),
    /** Last sign of life while it runs, by the clock of the database. */
    aliveAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    finishedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('imports_org_id').on(t.orgId, t.id),
    index('imports_org_created').on(t.orgId, t.side, t.createdAt),
    foreignKey({ name: 'imports_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({
      name: 'imports_file_fk',
      columns: [t.orgId, t.fileId],
      foreignColumns: [files.orgId, files.id],
    }),
    ownerPolicy('imports'),
  ],
)
