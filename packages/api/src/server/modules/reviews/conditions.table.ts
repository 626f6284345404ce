import { sql } from 'drizzle-orm'
import { check, date, foreignKey, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { ConditionState } from '../../../contract/moves/condition'
import type { FollowUp } from '../../../contract/conditions'
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
import { decisions } from './reviews.table'

const ofVisibleDecision = 'exists (select 1 from decisions d where d.id = decision_id)'

/** What must follow a conditional acceptance: each with its day, who owes it, and what shows that it is done. */
export const conditions = pgTable(
  'conditions',
  {
    id: primaryId(),
    ...sharedColumns,
    submissionId: uuid().notNull(),
    decisionId: uuid().notNull(),
    /** Counts the conditions of the decision, from one. */
    number: integer().notNull(),
    text: text().notNull(),
    dueOn: date({ mode: 'string' }).notNull(),
    owner: text().$type<Side>().notNull(),
    followUp: text().$type<FollowUp>().notNull(),
    state: text().$type<ConditionState>().notNull(),
    confirmedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('conditions_relationship_id').on(t.relationshipId, t.id),
    unique('conditions_number').on(t.relationshipId, t.decisionId, t.number),
    index('conditions_submission').on(t.relationshipId, t.submissionId),
    check('conditions_confirmed', sql`(state = 'confirmed') = (confirmed_at is not null)`),
    foreignKey({
      name: 'conditions_decision_fk',
      columns: [t.relationshipId, t.decisionId],
      foreignColumns: [decisions.relationshipId, decisions.id],
    }),
    foreignKey({
      name: 'conditions_submission_fk',
      columns: [t.relationshipId, t.submissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    relationshipKey('conditions', t, () => relationships),
    sharedPolicy('conditions'),
    restrictPolicy('conditions_visible', ofVisibleDecision),
    restrictPolicy('conditions_by_customer', customerOnly, 'insert'),
    // The supplier reports what it owes; only the customer confirms.
    restrictPolicy(
      'conditions_changed',
      `${customerOnly} or (owner = 'supplier' and state = 'open')`,
      'update',
      `${customerOnly} or (owner = 'supplier' and state = 'reported')`,
    ),
  ],
)

/** What was reported, confirmed or returned of a condition, in order; never changed. */
export const conditionReports = pgTable(
  'condition_reports',
  {
    id: primaryId(),
    ...sharedColumns,
    conditionId: uuid().notNull(),
    move: text().$type<'report' | 'confirm' | 'return'>().notNull(),
    side: text().$type<Side>().notNull(),
    userId: uuid().notNull(),
    text: text().notNull(),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('condition_reports_relationship_id').on(t.relationshipId, t.id),
    index('condition_reports_condition').on(t.relationshipId, t.conditionId, t.createdAt),
    foreignKey({
      name: 'condition_reports_condition_fk',
      columns: [t.relationshipId, t.conditionId],
      foreignColumns: [conditions.relationshipId, conditions.id],
    }),
    relationshipKey('condition_reports', t, () => relationships),
    sharedPolicy('condition_reports'),
    restrictPolicy(
      'condition_reports_visible',
      'exists (select 1 from conditions c where c.id = condition_id)',
    ),
    restrictPolicy('condition_reports_own_side', ownSideOnly('side'), 'insert'),
  ],
)
