import { sql } from 'drizzle-orm'
import {
  boolean,
  check,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { SubmissionState } from '../../../contract/moves/submission'
import type { ByHandVerdict } from '../../../contract/by-hand-verdicts'
import {
  instant,
  ownerColumn,
  ownerPolicy,
  primaryId,
  relationshipKey,
  restrictPolicy,
  sharedColumns,
  sharedPolicy,
  supplierOnly,
} from '../../db/columns'
import { files } from '../files/files.table'
import { measuringTasks } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { studies, studyData } from '../studies/studies.table'

/** What a supplier puts before one customer for one measuring task. The customer sees it once it is submitted. */
export const submissions = pgTable(
  'submissions',
  {
    id: primaryId(),
    ...sharedColumns,
    /**
     * Counts the signed submissions of the relationship, so that people can name them; null before, so that a
     * gap in the numbers tells the customer nothing of what was prepared and not signed.
     */
    number: integer(),
    taskId: uuid().notNull(),
    partId: uuid().notNull(),
    characteristicId: uuid().notNull(),
    state: text().$type<SubmissionState>().notNull(),
    /** When it came into this state: what waits, waits since then. */
    stateSince: instant().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    sentForSignatureAt: instant(),
    submittedAt: instant(),
    decidedAt: instant(),
    /** Why the supplier took it back after signing; both sides read it. */
    withdrawalReason: text(),
    /** Whether signed criteria judged it; null before it is signed. */
    criteria: text().$type<'agreed' | 'none'>(),
    /** Overall verdict and counts, for lists; derived from the clauses when frozen. */
    verdict: text(),
    clausesMet: integer(),
    clausesTotal: integer(),
    safety: boolean().notNull(),
    supersededBy: uuid(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('submissions_relationship_id').on(t.relationshipId, t.id),
    unique('submissions_number').on(t.relationshipId, t.number),
    // One unsigned submission per measuring task at a time.
    uniqueIndex('submissions_one_draft')
      .on(t.relationshipId, t.taskId)
      .where(sql`state in ('draft', 'for-signature')`),
    check('submissions_signed_number', sql`(submitted_at is null) = (number is null)`),
    check('submissions_signed_criteria', sql`(submitted_at is null) = (criteria is null)`),
    index('submissions_supplier_state').on(t.supplierOrgId, t.state, t.stateSince),
    index('submissions_customer_state').on(t.customerOrgId, t.state, t.stateSince),
    index('submissions_task').on(t.relationshipId, t.taskId),
    foreignKey({
      name: 'submissions_task_fk',
      columns: [t.relationshipId, t.taskId],
      foreignColumns: [measuringTasks.relationshipId, measuringTasks.id],
    }),
    relationshipKey('submissions', t, () => relationships),
    sharedPolicy('submissions'),
    restrictPolicy('submissions_by_supplier', supplierOnly, 'insert'),
    restrictPolicy('submissions_drafts', `submitted_at is not null or ${supplierOnly}`),
  ],
)

/** The studies and data revisions a draft draws on: the supplier's alone. */
export const submissionStudies = pgTable(
  'submission_studies',
  {
    ...ownerColumn,
    relationshipId: uuid().notNull(),
    submissionId: uuid().notNull(),
    studyId: uuid().notNull(),
    dataId: uuid().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.orgId, t.submissionId, t.studyId] }),
    foreignKey({
      name: 'submission_studies_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    foreignKey({
      name: 'submission_studies_study_fk',
      columns: [t.orgId, t.studyId],
      foreignColumns: [studies.orgId, studies.id],
    }),
    foreignKey({
      name: 'submission_studies_data_fk',
      columns: [t.orgId, t.dataId],
      foreignColumns: [studyData.orgId, studyData.id],
    }),
    ownerPolicy('submission_studies'),
  ],
)

/** What engineers and approvers say to each other before signing: never seen by the customer. */
export const submissionNotes = pgTable(
  'submission_notes',
  {
    ...ownerColumn,
    id: primaryId(),
    relationshipId: uuid().notNull(),
    submissionId: uuid().notNull(),
    userId: uuid().notNull(),
    text: text().notNull(),
    createdAt: instant().notNull(),
  },
  (t) => [
    index('submission_notes_submission').on(t.orgId, t.submissionId, t.createdAt),
    foreignKey({
      name: 'submission_notes_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    ownerPolicy('submission_notes'),
  ],
)

/** What a person judged by hand for a draft, on a document: the supplier's alone until it is frozen. */
export const submissionByHand = pgTable(
  'submission_by_hand',
  {
    ...ownerColumn,
    relationshipId: uuid().notNull(),
    submissionId: uuid().notNull(),
    clauseKey: text().notNull(),
    verdict: text().$type<ByHandVerdict>().notNull(),
    reason: text().notNull(),
    fileId: uuid().notNull(),
    enteredBy: uuid().notNull(),
    enteredAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.orgId, t.submissionId, t.clauseKey] }),
    foreignKey({
      name: 'submission_by_hand_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    foreignKey({
      name: 'submission_by_hand_file_fk',
      columns: [t.orgId, t.fileId],
      foreignColumns: [files.orgId, files.id],
    }),
    ownerPolicy('submission_by_hand'),
  ],
)

export * from './submissions.frozen.table'
