import { sql } from 'drizzle-orm'
import {
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { ChallengeState } from '../../../contract/moves/challenge'
import type { ChallengeReason } from '../../../contract/reviews'
import {
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

/** The customer's decision on a submission. On safety-class characteristics it is final with a second person. */
export const decisions = pgTable(
  'decisions',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    kind: text().$type<'accepted' | 'accepted-with-conditions' | 'refused'>().notNull(),
    state: text().$type<'awaiting-second-person' | 'final' | 'withdrawn'>().notNull(),
    /** For a conditional acceptance: what must follow, by when. */
    conditions: text(),
    conditionsDueOn: date({ mode: 'string' }),
    reason: text().notNull().default(''),
    decidedBy: uuid().notNull(),
    decidedAt: instant().notNull(),
    secondBy: uuid(),
    secondAt: instant(),
    /** Why it was sent back to review instead of being confirmed; the customer's own business. */
    sentBackReason: text(),
  },
  (t) => [
    unique('decisions_relationship_id').on(t.relationshipId, t.id),
    index('decisions_submission').on(t.relationshipId, t.submissionId),
    uniqueIndex('decisions_one_final')
      .on(t.relationshipId, t.submissionId)
      .where(sql`state = 'final'`),
    uniqueIndex('decisions_one_proposed')
      .on(t.relationshipId, t.submissionId)
      .where(sql`state = 'awaiting-second-person'`),
    foreignKey({
      name: 'decisions_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('decisions', t, () => relationships),
    sharedPolicy('decisions'),
    restrictPolicy(
      'decisions_by_customer',
      `customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid`,
      'insert',
    ),
    restrictPolicy(
      'decisions_changed_by_customer',
      `customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid`,
      'update',
    ),
    // A decision that waits for its second person is the customer's own business until it is final.
    restrictPolicy(
      'decisions_final',
      `state = 'final' or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid`,
      'select',
    ),
  ],
)

/** An objection of the customer to one named clause result. */
export const challenges = pgTable(
  'challenges',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    number: integer().notNull(),
    clauseKey: text().notNull(),
    reasonKind: text().$type<ChallengeReason>().notNull(),
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
    restrictPolicy(
      'challenges_by_customer',
      `customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid`,
      'insert',
    ),
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
    text: text().notNull(),
    createdAt: instant().notNull(),
  },
  (t) => [
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
