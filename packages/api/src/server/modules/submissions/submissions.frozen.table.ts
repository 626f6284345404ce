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
  uuid,
} from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { FileRole } from '../../../contract/submission-content'
import type { SignatureMeaning } from '../../../contract/submissions'
import {
  instant,
  ownSideOnly,
  primaryId,
  relationshipKey,
  restrictPolicy,
  sharedColumns,
  sharedPolicy,
  supplierOnly,
} from '../../db/columns'
import { relationships } from '../relationships/relationships.table'
import { decisions } from '../reviews/reviews.table'
import { submissions } from './submissions.table'

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
