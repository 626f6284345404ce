import { sql } from 'drizzle-orm'
import {
  check,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import type { RequestOccasion } from '../../../contract/requests'
import {
  customerOnly,
  instant,
  primaryId,
  relationshipKey,
  restrictPolicy,
  sharedColumns,
  sharedPolicy,
  supplierOnly,
} from '../../db/columns'
import { measuringTasks } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { submissions } from '../submissions/submissions.table'

/** A customer's call for proof of named measuring tasks by a day. Whether it is answered follows from submissions. */
export const requests = pgTable(
  'requests',
  {
    id: primaryId(),
    ...sharedColumns,
    /** Counts the requests of the relationship, so that people can name them. */
    number: integer().notNull(),
    occasion: text().$type<RequestOccasion>().notNull(),
    words: text().notNull(),
    /** A day of the relationship's calendar. */
    dueOn: date({ mode: 'string' }).notNull(),
    askedBy: uuid().notNull(),
    askedAt: instant().notNull(),
    withdrawnBy: uuid(),
    withdrawnAt: instant(),
    withdrawalReason: text(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('requests_relationship_id').on(t.relationshipId, t.id),
    unique('requests_number').on(t.relationshipId, t.number),
    check(
      'requests_withdrawn_whole',
      sql`(withdrawn_at is null) = (withdrawn_by is null) and (withdrawn_at is null) = (withdrawal_reason is null)`,
    ),
    index('requests_supplier_due').on(t.supplierOrgId, t.dueOn),
    index('requests_customer_due').on(t.customerOrgId, t.dueOn),
    relationshipKey('requests', t, () => relationships),
    sharedPolicy('requests'),
    restrictPolicy('requests_by_customer', customerOnly, 'insert'),
    restrictPolicy('requests_changed_by_customer', customerOnly, 'update'),
  ],
)

/** The measuring tasks a request asks for; never changed. */
export const requestTasks = pgTable(
  'request_tasks',
  {
    ...sharedColumns,
    requestId: uuid().notNull(),
    taskId: uuid().notNull(),
    position: integer().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.relationshipId, t.requestId, t.taskId] }),
    index('request_tasks_task').on(t.relationshipId, t.taskId),
    foreignKey({
      name: 'request_tasks_request_fk',
      columns: [t.relationshipId, t.requestId],
      foreignColumns: [requests.relationshipId, requests.id],
    }),
    foreignKey({
      name: 'request_tasks_task_fk',
      columns: [t.relationshipId, t.taskId],
      foreignColumns: [measuringTasks.relationshipId, measuringTasks.id],
    }),
    relationshipKey('request_tasks', t, () => relationships),
    sharedPolicy('request_tasks'),
    restrictPolicy('request_tasks_by_customer', customerOnly, 'insert'),
  ],
)

/** Which signed submissions name which request; written with the signature, never changed. */
export const requestAnswers = pgTable(
  'request_answers',
  {
    ...sharedColumns,
    requestId: uuid().notNull(),
    taskId: uuid().notNull(),
    submissionId: uuid().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.relationshipId, t.requestId, t.submissionId] }),
    index('request_answers_submission').on(t.relationshipId, t.submissionId),
    foreignKey({
      name: 'request_answers_task_fk',
      columns: [t.relationshipId, t.requestId, t.taskId],
      foreignColumns: [requestTasks.relationshipId, requestTasks.requestId, requestTasks.taskId],
    }),
    foreignKey({
      name: 'request_answers_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('request_answers', t, () => relationships),
    sharedPolicy('request_answers'),
    restrictPolicy('request_answers_by_supplier', supplierOnly, 'insert'),
  ],
)
