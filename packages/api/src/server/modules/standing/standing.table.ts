import { date, foreignKey, index, pgTable, text, unique, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core'
import type { EquipmentKind, GaugeEventKind } from '../../../contract/standing'
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
import { characteristics, partRevisions } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { submissions } from '../submissions/submissions.table'

/** What every fact of a standing is about: one signed submission, seen by those who see that. */
const ofSubmission = { ...sharedColumns, submissionId: uuid().notNull() }

interface FactTable {
  relationshipId: AnyPgColumn
  supplierOrgId: AnyPgColumn
  customerOrgId: AnyPgColumn
  submissionId: AnyPgColumn
}

const factRules = (name: string, t: FactTable, writer: string) => [
  index(`${name}_submission`).on(t.relationshipId, t.submissionId),
  foreignKey({
    name: `${name}_submission_fk`,
    columns: [t.relationshipId, t.submissionId],
    foreignColumns: [submissions.relationshipId, submissions.id],
  }),
  relationshipKey(name, t, () => relationships),
  sharedPolicy(name),
  restrictPolicy(`${name}_visible`, 'exists (select 1 from submissions s where s.id = submission_id)'),
  restrictPolicy(`${name}_writer`, writer, 'insert'),
]

/** The equipment in the words both sides know; the id only tells two pieces apart. */
const equipment = {
  of: text().$type<EquipmentKind>().notNull(),
  thingId: uuid().notNull(),
  code: text().notNull(),
}

/**
 * What the customer may know of the calibrations that a submission rests on: those that found the equipment within
 * limits. The calibration itself, and the gauge, stay with the supplier.
 */
export const standingCalibrations = pgTable(
  'standing_calibrations',
  {
    id: primaryId(),
    ...ofSubmission,
    ...equipment,
    calibrationId: uuid().notNull(),
    calibratedOn: date({ mode: 'string' }).notNull(),
    dueOn: date({ mode: 'string' }).notNull(),
    enteredAt: instant().notNull(),
  },
  (t) => [
    unique('standing_calibrations_once').on(t.relationshipId, t.submissionId, t.calibrationId),
    ...factRules('standing_calibrations', t, supplierOnly),
  ],
)

/** An event of a gauge as it concerns one submission. */
export const standingEvents = pgTable(
  'standing_events',
  {
    id: primaryId(),
    ...ofSubmission,
    ...equipment,
    eventId: uuid().notNull(),
    kind: text().$type<GaugeEventKind>().notNull(),
    happenedOn: date({ mode: 'string' }).notNull(),
    /** Day of the last good calibration, where the event reaches back to it. */
    inDoubtSince: date({ mode: 'string' }),
    words: text().notNull(),
    enteredAt: instant().notNull(),
  },
  (t) => [
    unique('standing_events_once').on(t.relationshipId, t.submissionId, t.eventId),
    ...factRules('standing_events', t, supplierOnly),
  ],
)

/** The customer's approver lets a suspended acceptance stand again. */
export const reinstatements = pgTable(
  'reinstatements',
  {
    id: primaryId(),
    ...ofSubmission,
    words: text().notNull(),
    reinstatedBy: uuid().notNull(),
    reinstatedAt: instant().notNull(),
    authenticatedAt: instant().notNull(),
  },
  (t) => factRules('reinstatements', t, customerOnly),
)

/** The customer's approver carries an acceptance over to a newer revision that left its limits as they were. */
export const carryOvers = pgTable(
  'carry_overs',
  {
    id: primaryId(),
    ...ofSubmission,
    revisionId: uuid().notNull(),
    /** Of the newer revision. */
    characteristicId: uuid().notNull(),
    carriedBy: uuid().notNull(),
    carriedAt: instant().notNull(),
    authenticatedAt: instant().notNull(),
  },
  (t) => [
    unique('carry_overs_once').on(t.relationshipId, t.submissionId, t.revisionId),
    index('carry_overs_characteristic').on(t.relationshipId, t.characteristicId),
    foreignKey({
      name: 'carry_overs_revision_fk',
      columns: [t.relationshipId, t.revisionId],
      foreignColumns: [partRevisions.relationshipId, partRevisions.id],
    }),
    foreignKey({
      name: 'carry_overs_characteristic_fk',
      columns: [t.relationshipId, t.characteristicId],
      foreignColumns: [characteristics.relationshipId, characteristics.id],
    }),
    ...factRules('carry_overs', t, customerOnly),
  ],
)
