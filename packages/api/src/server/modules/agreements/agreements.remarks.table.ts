import { boolean, foreignKey, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { About } from '../../../contract/agreements-rounds'
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
import { agreementRounds } from './agreements.table'

/** Only what was sent can be commented on or accepted, by one's own side. */
const aboutSentRounds = (table: string) => [
  restrictPolicy(`${table}_own_side`, ownSideOnly('side'), 'insert'),
  restrictPolicy(
    `${table}_sent_rounds`,
    `exists (select 1 from agreement_rounds r where r.relationship_id = ${table}.relationship_id and r.id = ${table}.round_id and r.state <> 'draft')`,
    'insert',
  ),
]

const aboutColumns = {
  id: primaryId(),
  ...sharedColumns,
  versionId: uuid().notNull(),
  roundId: uuid().notNull(),
  about: text().$type<About['kind']>().notNull(),
  clauseKey: text(),
  side: text().$type<Side>().notNull(),
  userId: uuid().notNull(),
  at: instant().notNull(),
}

/** What a side said about one thing in a round; appended only. */
export const agreementComments = pgTable(
  'agreement_comments',
  { ...aboutColumns, text: text().notNull() },
  (t) => [
    index('agreement_comments_version').on(t.relationshipId, t.versionId, t.at),
    foreignKey({
      name: 'agreement_comments_round_fk',
      columns: [t.relationshipId, t.roundId],
      foreignColumns: [agreementRounds.relationshipId, agreementRounds.id],
    }),
    relationshipKey('agreement_comments', t, () => relationships),
    sharedPolicy('agreement_comments'),
    ...aboutSentRounds('agreement_comments'),
  ],
)

/** Single things of a round that a side accepted, by the hash of exactly those bytes; the last one about them counts. */
export const agreementMarks = pgTable(
  'agreement_marks',
  { ...aboutColumns, sha256: text().notNull(), accepted: boolean().notNull() },
  (t) => [
    index('agreement_marks_version').on(t.relationshipId, t.versionId, t.at),
    foreignKey({
      name: 'agreement_marks_round_fk',
      columns: [t.relationshipId, t.roundId],
      foreignColumns: [agreementRounds.relationshipId, agreementRounds.id],
    }),
    relationshipKey('agreement_marks', t, () => relationships),
    sharedPolicy('agreement_marks'),
    ...aboutSentRounds('agreement_marks'),
  ],
)
