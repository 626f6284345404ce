import { date, foreignKey, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { instant, ownerColumn, ownerPolicy } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'

/**
 * What an organisation's people were reminded of. The key is what makes each reminder come once, however many workers
 * look for it and however often; a day that was moved is another day, and is told anew.
 */
export const reminders = pgTable(
  'reminders',
  {
    ...ownerColumn,
    /** Which reminder, such as `request-due-7`. */
    kind: text().notNull(),
    /** Id of the request, submission, gauge or agreement version it is about. */
    subjectId: uuid().notNull(),
    /** The day it speaks of. */
    day: date({ mode: 'string' }).notNull(),
    toldAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.orgId, t.kind, t.subjectId, t.day] }),
    foreignKey({ name: 'reminders_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    ownerPolicy('reminders'),
  ],
)
