import { sql } from 'drizzle-orm'
import {
  check,
  date,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { ChallengeState } from '../../../contract/moves/challenge'
import type {
  AnswerKind,
  ChallengeReason,
  ChallengeTarget,
  DecisionKind,
  DecisionState,
  MessageMove,
} from '../../../contract/reviews'
import {
  customerOnly,
  instant,
  ownSideOnly,
  primaryId,
  relationshipKey,
  restrictPolicy,
  sharedColumns,
  sharedPolicy,
} from '../../db/columns'
import { relationships } from '../relationships/relationships.table'
import { submissions } from '../submissions/submissions.table'
import { conditionReports } from './conditions.table'

const decided = "state in ('final', 'awaiting-other-side')"

/**
 * The customer's decision on a submission. On safety-class characteristics it is final with a second person, without
 * agreed criteria with the supplier's approver.
 */
export const decisions = pgTable(
  'decisions',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    kind: text().$type<DecisionKind>().notNull(),
    state: text().$type<DecisionState>().notNull(),
    reason: text().notNull().default(''),
    /** The revision of the submission that was decided on. */
    revision: integer().notNull(),
    decidedBy: uuid().notNull(),
    decidedAt: instant().notNull(),
    secondBy: uuid(),
    secondAt: instant(),
    /** Why it was sent back to review instead of being confirmed; the customer's own business. */
    sentBackReason: text(),
    /** Without agreed criteria: the supplier's approver who agreed, or did not and why. */
    otherSideBy: uuid(),
    otherSideAt: instant(),
    declinedReason: text(),
  },
  (t) => [
    unique('decisions_relationship_id').on(t.relationshipId, t.id),
    index('decisions_submission').on(t.relationshipId, t.submissionId),
    uniqueIndex('decisions_one_final')
      .on(t.relationshipId, t.submissionId)
      .where(sql`state = 'final'`),
    uniqueIndex('decisions_one_proposed')
      .on(t.relationshipId, t.submissionId)
      .where(sql`state in ('awaiting-second-person', 'awaiting-other-side')`),
    foreignKey({
      name: 'decisions_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('decisions', t, () => relationships),
    sharedPolicy('decisions'),
    restrictPolicy('decisions_by_customer', customerOnly, 'insert'),
    // The supplier answers what was proposed to it, once.
    restrictPolicy(
      'decisions_changed',
      `${customerOnly} or state = 'awaiting-other-side'`,
      'update',
      `${customerOnly} or (other_side_by is not null and state in ('final', 'withdrawn'))`,
    ),
    // What waits for its second person is the customer's own business; what was declined both sides know.
    restrictPolicy(
      'decisions_visible',
      `${decided} or other_side_by is not null or ${customerOnly}`,
      'select',
    ),
  ],
)

/** An objection of the customer to one named thing in a submission. */
export const challenges = pgTable(
  'challenges',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    number: integer().notNull(),
    target: jsonb().$type<ChallengeTarget>().notNull(),
    reasonKind: text().$type<ChallengeReason>().notNull(),
    /** The revision of the submission in which the target is named. */
    revision: integer().notNull(),
    /** The day until which an answer is asked for. */
    dueOn: date({ mode: 'string' }).notNull(),
    /** The laboratory that is to find out, where both sides leave it unresolved. */
    laboratory: text(),
    state: text().$type<ChallengeState>().notNull(),
    openedBy: uuid().notNull(),
    openedAt: instant().notNull(),
    /** When the supplier answered it last. */
    answeredAt: instant(),
    closedBy: uuid(),
    closedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('challenges_relationship_id').on(t.relationshipId, t.id),
    unique('challenges_number').on(t.relationshipId, t.submissionId, t.number),
    foreignKey({
      name: 'challenges_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('challenges', t, () => relationships),
    sharedPolicy('challenges'),
    restrictPolicy('challenges_by_customer', customerOnly, 'insert'),
  ],
)

/** What both sides say under a challenge, in order; never changed. */
export const challengeMessages = pgTable(
  'challenge_messages',
  {
    id: primaryId(),
    ...sharedColumns,
    challengeId: uuid().notNull(),
    side: text().$type<Side>().notNull(),
    userId: uuid().notNull(),
    /** What it did to the challenge. */
    move: text().$type<MessageMove>().notNull(),
    /** Of an answer. */
    answerKind: text().$type<AnswerKind>(),
    text: text().notNull(),
    /** The revision that an answer by correction points to. */
    revision: integer(),
    /** The proposal that an answer by "change the criterion" points to. */
    agreementId: uuid(),
    versionId: uuid(),
    /** A what-if that is quoted, as canonical JSON: an argument, never a verdict. */
    whatIf: text(),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('challenge_messages_relationship_id').on(t.relationshipId, t.id),
    index('challenge_messages_challenge').on(t.relationshipId, t.challengeId, t.createdAt),
    foreignKey({
      name: 'challenge_messages_challenge_fk',
      columns: [t.relationshipId, t.challengeId],
      foreignColumns: [challenges.relationshipId, challenges.id],
    }),
    relationshipKey('challenge_messages', t, () => relationships),
    sharedPolicy('challenge_messages'),
    restrictPolicy('challenge_messages_own_side', ownSideOnly('side'), 'insert'),
  ],
)

/** Files that go with what was said under a challenge, or with a report of a condition; never changed. */
export const reviewFiles = pgTable(
  'review_files',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    messageId: uuid(),
    reportId: uuid(),
    side: text().$type<Side>().notNull(),
    name: text().notNull(),
    contentType: text().notNull(),
    size: integer().notNull(),
    sha256: text().notNull(),
    storageKey: text().notNull(),
  },
  (t) => [
    index('review_files_submission').on(t.relationshipId, t.submissionId),
    check('review_files_of_one', sql`num_nonnulls(message_id, report_id) = 1`),
    foreignKey({
      name: 'review_files_message_fk',
      columns: [t.relationshipId, t.messageId],
      foreignColumns: [challengeMessages.relationshipId, challengeMessages.id],
    }),
    foreignKey({
      name: 'review_files_report_fk',
      columns: [t.relationshipId, t.reportId],
      foreignColumns: [conditionReports.relationshipId, conditionReports.id],
    }),
    foreignKey({
      name: 'review_files_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('review_files', t, () => relationships),
    sharedPolicy('review_files'),
    restrictPolicy('review_files_own_side', ownSideOnly('side'), 'insert'),
  ],
)

export * from './conditions.table'
