import type { Clause } from '@evenrule/metrology'
import { sql } from 'drizzle-orm'
import {
  date,
  foreignKey,
  index,
  integer,
  jsonb,
  pgPolicy,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Side } from '../../../contract/access'
import type { RoundState } from '../../../contract/agreements-rounds'
import type { StoredVersionState } from '../../../contract/moves/agreement-version'
import type { Terms } from '../../../contract/terms'
import {
  instant,
  ownSideOnly,
  primaryId,
  relationshipKey,
  restrictPolicy,
  sharedColumns,
  sharedPolicy,
} from '../../db/columns'
import { houseTerms } from '../house-terms/house-terms.table'
import { characteristics, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { challenges } from '../reviews/reviews.table'
import { submissions } from '../submissions/submissions.table'

/** Only what was never sent can be deleted: of what the other side has seen, nothing disappears. */
const unsentOnly = (name: string, unsent: string) => restrictPolicy(name, unsent, 'delete')

const nobody = `'00000000-0000-0000-0000-000000000000'::uuid`
const partOrNone = sql.raw(`coalesce(part_id, ${nobody})`)
const characteristicOrNone = sql.raw(`coalesce(characteristic_id, ${nobody})`)

/**
 * The thread of criteria for one scope: the whole relationship, one part number, or one characteristic. It gets
 * its number when the first proposal is sent; until then it is the draft of one side and the other side must not
 * learn of it, not even through a number left out or a scope that is taken.
 */
export const agreements = pgTable(
  'agreements',
  {
    id: primaryId(),
    ...sharedColumns,
    partId: uuid(),
    characteristicId: uuid(),
    /** Counts the agreements of this relationship, so that people can name them; null until one is sent. */
    number: integer(),
    begunBy: text().$type<Side>().notNull(),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('agreements_relationship_id').on(t.relationshipId, t.id),
    unique('agreements_number').on(t.relationshipId, t.number),
    uniqueIndex('agreements_scope')
      .on(t.relationshipId, partOrNone, characteristicOrNone)
      .where(sql`number is not null`),
    uniqueIndex('agreements_draft_scope')
      .on(t.relationshipId, t.begunBy, partOrNone, characteristicOrNone)
      .where(sql`number is null`),
    index('agreements_supplier').on(t.supplierOrgId, t.number),
    index('agreements_customer').on(t.customerOrgId, t.number),
    foreignKey({
      name: 'agreements_part_fk',
      columns: [t.relationshipId, t.partId],
      foreignColumns: [parts.relationshipId, parts.id],
    }),
    foreignKey({
      name: 'agreements_characteristic_fk',
      columns: [t.relationshipId, t.characteristicId],
      foreignColumns: [characteristics.relationshipId, characteristics.id],
    }),
    relationshipKey('agreements', t, () => relationships),
    sharedPolicy('agreements'),
    restrictPolicy('agreements_drafts', `number is not null or ${ownSideOnly('begun_by')}`),
    unsentOnly('agreements_sent_stay', 'number is null'),
  ],
)

export const agreementVersions = pgTable(
  'agreement_versions',
  {
    id: primaryId(),
    ...sharedColumns,
    agreementId: uuid().notNull(),
    /** Counts the versions of the agreement that were sent; null for a draft. */
    number: integer(),
    state: text().$type<StoredVersionState>().notNull(),
    /** The side that began it; a draft is seen by that side alone. */
    begunBy: text().$type<Side>().notNull(),
    /** From agreement on: first day in force, the canonical text both sides sign, and its SHA-256. */
    effectiveOn: date({ mode: 'string' }),
    text: text(),
    sha256: text(),
    agreedAt: instant(),
    signedAt: instant(),
    /** Set when it is withdrawn: when, by which side, and why. */
    withdrawnAt: instant(),
    withdrawnBy: text().$type<Side>(),
    withdrawnReason: text(),
    createdAt: instant().notNull(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('agreement_versions_relationship_id').on(t.relationshipId, t.id),
    unique('agreement_versions_number').on(t.relationshipId, t.agreementId, t.number),
    // Only one version of a scope can be under negotiation at a time, beside one unsent draft of each side.
    // An agreed one that was not signed in time lapses by the calendar, so the service judges that case.
    uniqueIndex('agreement_versions_one_open')
      .on(t.relationshipId, t.agreementId)
      .where(sql`state in ('proposed', 'countered')`),
    uniqueIndex('agreement_versions_one_draft')
      .on(t.relationshipId, t.agreementId, t.begunBy)
      .where(sql`state = 'draft'`),
    index('agreement_versions_supplier').on(t.supplierOrgId, t.state),
    index('agreement_versions_customer').on(t.customerOrgId, t.state),
    foreignKey({
      name: 'agreement_versions_agreement_fk',
      columns: [t.relationshipId, t.agreementId],
      foreignColumns: [agreements.relationshipId, agreements.id],
    }),
    relationshipKey('agreement_versions', t, () => relationships),
    sharedPolicy('agreement_versions'),
    restrictPolicy('agreement_versions_drafts', `state <> 'draft' or ${ownSideOnly('begun_by')}`),
    unsentOnly('agreement_versions_sent_stay', "state = 'draft'"),
    // What both sides have signed never changes; the move to it may be made once.
    pgPolicy('agreement_versions_signed_stay', {
      as: 'restrictive',
      for: 'update',
      to: 'evenrule_app',
      using: sql`state <> 'signed'`,
      withCheck: sql`true`,
    }),
  ],
)

/** One side's complete proposal. Its draft is never seen by the other side. */
export const agreementRounds = pgTable(
  'agreement_rounds',
  {
    id: primaryId(),
    ...sharedColumns,
    versionId: uuid().notNull(),
    /** Counts the rounds that were sent; a draft gets its own when it is sent, because others may come before it. */
    number: integer().notNull(),
    side: text().$type<Side>().notNull(),
    state: text().$type<RoundState>().notNull(),
    clauses: jsonb().$type<Clause[]>().notNull(),
    terms: jsonb().$type<Terms>().notNull(),
    effectiveOn: date({ mode: 'string' }).notNull(),
    comment: text().notNull().default(''),
    /** The round it answers; of a draft the one its writer saw. */
    answersRound: integer(),
    /** Clauses that its own side took out of the round before. */
    withdrawnClauses: text().array().notNull().default([]),
    /** The published house terms from which it was begun. */
    houseTermsId: uuid(),
    houseTermsNumber: integer(),
    /** The challenge that asked for the change. */
    caseSubmissionId: uuid(),
    caseChallengeId: uuid(),
    createdAt: instant().notNull(),
    /** Who wrote it last. */
    createdBy: uuid().notNull(),
    savedAt: instant().notNull(),
    sentAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('agreement_rounds_relationship_id').on(t.relationshipId, t.id),
    uniqueIndex('agreement_rounds_number')
      .on(t.relationshipId, t.versionId, t.number)
      .where(sql`state <> 'draft'`),
    uniqueIndex('agreement_rounds_one_draft')
      .on(t.relationshipId, t.versionId, t.side)
      .where(sql`state = 'draft'`),
    foreignKey({
      name: 'agreement_rounds_version_fk',
      columns: [t.relationshipId, t.versionId],
      foreignColumns: [agreementVersions.relationshipId, agreementVersions.id],
    }),
    foreignKey({
      name: 'agreement_rounds_house_terms_fk',
      columns: [t.customerOrgId, t.houseTermsId],
      foreignColumns: [houseTerms.orgId, houseTerms.id],
    }),
    foreignKey({
      name: 'agreement_rounds_case_submission_fk',
      columns: [t.relationshipId, t.caseSubmissionId],
      foreignColumns: [submissions.relationshipId, submissions.id],
    }),
    foreignKey({
      name: 'agreement_rounds_case_challenge_fk',
      columns: [t.relationshipId, t.caseChallengeId],
      foreignColumns: [challenges.relationshipId, challenges.id],
    }),
    relationshipKey('agreement_rounds', t, () => relationships),
    sharedPolicy('agreement_rounds'),
    restrictPolicy('agreement_rounds_drafts', `state <> 'draft' or ${ownSideOnly('side')}`),
    unsentOnly('agreement_rounds_sent_stay', "state = 'draft'"),
  ],
)

/** Both sides sign the same bytes: each signature names the hash it was given for. */
export const agreementSignatures = pgTable(
  'agreement_signatures',
  {
    id: primaryId(),
    ...sharedColumns,
    versionId: uuid().notNull(),
    side: text().$type<Side>().notNull(),
    userId: uuid().notNull(),
    sha256: text().notNull(),
    signedAt: instant().notNull(),
    /** When the signer had signed in afresh. */
    authenticatedAt: instant().notNull(),
  },
  (t) => [
    unique('agreement_signatures_side').on(t.relationshipId, t.versionId, t.side),
    foreignKey({
      name: 'agreement_signatures_version_fk',
      columns: [t.relationshipId, t.versionId],
      foreignColumns: [agreementVersions.relationshipId, agreementVersions.id],
    }),
    relationshipKey('agreement_signatures', t, () => relationships),
    sharedPolicy('agreement_signatures'),
    restrictPolicy('agreement_signatures_own_side', ownSideOnly('side'), 'insert'),
  ],
)
