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
import type { Side } from '../../../contract/access'
import type { SubmissionState } from '../../../contract/moves/submission'
import type { ByHandVerdict } from '../../../contract/by-hand-verdicts'
import type { FileRole } from '../../../contract/submission-content'
import type { SignatureMeaning } from '../../../contract/submissions'
import {
  instant,
  ownerColumn,
  ownerPolicy,
  ownSideOnly,
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
import { decisions } from '../reviews/reviews.table'
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

const ofVisibleSubmission = 'exists (select 1 from submissions s where s.id = submission_id)'

/** Frozen rows are the supplier's to write, and only until the text that closes their revision is written. */
const beforeText = (table: string): string =>
  `${supplierOnly} and not exists (select 1 from submission_texts f where f.submission_id = ${table}.submission_id and f.revision >= ${table}.revision)`

/** A text is written when the submission is signed, or while a challenge waits to be answered by a correction. */
const whileSigning = `${supplierOnly} and exists (select 1 from submissions s where s.id = submission_id and s.state = case when revision = 1 then 'for-signature' else 'challenged' end)`

/**
 * Everything frozen at a signature: canonical JSON (RFC 8785) and its SHA-256, which the signatures name. Written
 * last of what is frozen; nobody may change it or add to the clauses and files it names. A correction adds a revision,
 * the earlier ones stay.
 */
export const submissionTexts = pgTable(
  'submission_texts',
  {
    ...sharedColumns,
    submissionId: uuid().notNull(),
    revision: integer().notNull(),
    /** The revision whose place it takes; null for the first. */
    corrects: integer(),
    text: text().notNull(),
    sha256: text().notNull(),
    frozenAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.relationshipId, t.submissionId, t.revision] }),
    // Without a gap: each follows the one before.
    check('submission_texts_in_order', sql`(revision = 1 and corrects is null) or corrects = revision - 1`),
    foreignKey({
      name: 'submission_texts_corrects_fk',
      columns: [t.relationshipId, t.submissionId, t.corrects],
      foreignColumns: [t.relationshipId, t.submissionId, t.revision],
    }),
    foreignKey({
      name: 'submission_texts_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('submission_texts', t, () => relationships),
    sharedPolicy('submission_texts'),
    restrictPolicy('submission_texts_visible', ofVisibleSubmission),
    restrictPolicy('submission_texts_by_supplier', whileSigning, 'insert'),
  ],
)

/** The verdict of one clause with its evaluation: input and output texts are the original. */
export const submissionClauses = pgTable(
  'submission_clauses',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    revision: integer().notNull(),
    position: integer().notNull(),
    clauseKey: text().notNull(),
    /** Of a clause of house terms, judged for information. */
    advisory: boolean().notNull(),
    verdict: text().notNull(),
    inputText: text().notNull(),
    outputText: text().notNull(),
    outputSha256: text().notNull(),
    engineVersion: text().notNull(),
    engineSha256: text().notNull(),
  },
  (t) => [
    unique('submission_clauses_key').on(t.relationshipId, t.submissionId, t.revision, t.clauseKey),
    foreignKey({
      name: 'submission_clauses_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('submission_clauses', t, () => relationships),
    sharedPolicy('submission_clauses'),
    restrictPolicy('submission_clauses_visible', ofVisibleSubmission),
    restrictPolicy('submission_clauses_frozen', beforeText('submission_clauses'), 'insert'),
  ],
)

/** Files that go with a submission; same bytes in the object store, listed for both sides. */
export const submissionFiles = pgTable(
  'submission_files',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    revision: integer().notNull(),
    role: text().$type<FileRole>().notNull(),
    name: text().notNull(),
    contentType: text().notNull(),
    size: integer().notNull(),
    sha256: text().notNull(),
    storageKey: text().notNull(),
  },
  (t) => [
    index('submission_files_submission').on(t.relationshipId, t.submissionId, t.revision),
    foreignKey({
      name: 'submission_files_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('submission_files', t, () => relationships),
    sharedPolicy('submission_files'),
    restrictPolicy('submission_files_visible', ofVisibleSubmission),
    restrictPolicy('submission_files_frozen', beforeText('submission_files'), 'insert'),
  ],
)

/** Signatures under a submission's frozen bytes: the supplier's approver, and those who decide. */
export const submissionSignatures = pgTable(
  'submission_signatures',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    side: text().$type<Side>().notNull(),
    userId: uuid().notNull(),
    meaning: text().$type<SignatureMeaning>().notNull(),
    /** The revision whose text it stands under, and that text's hash. */
    revision: integer().notNull(),
    sha256: text().notNull(),
    /** The decision it is part of; null under the submission itself. */
    decisionId: uuid(),
    signedAt: instant().notNull(),
    authenticatedAt: instant().notNull(),
  },
  (t) => [
    index('submission_signatures_submission').on(t.relationshipId, t.submissionId),
    foreignKey({
      name: 'submission_signatures_decision_fk',
      columns: [t.relationshipId, t.decisionId],
      foreignColumns: [decisions.relationshipId, decisions.id],
    }),
    foreignKey({
      name: 'submission_signatures_text_fk',
      columns: [t.relationshipId, t.submissionId, t.revision],
      foreignColumns: [
        submissionTexts.relationshipId,
        submissionTexts.submissionId,
        submissionTexts.revision,
      ],
    }),
    relationshipKey('submission_signatures', t, () => relationships),
    sharedPolicy('submission_signatures'),
    restrictPolicy('submission_signatures_visible', ofVisibleSubmission),
    restrictPolicy('submission_signatures_own_side', ownSideOnly('side'), 'insert'),
    // A signature under a decision that waits for its second person is as little the supplier's to see as that is.
    restrictPolicy(
      'submission_signatures_decided',
      'decision_id is null or exists (select 1 from decisions d where d.id = decision_id)',
      'select',
    ),
  ],
)
