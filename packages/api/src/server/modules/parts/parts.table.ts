import { boolean, foreignKey, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { instant, primaryId, relationshipKey, sharedColumns, sharedPolicy } from '../../db/columns'
import { gauges } from '../gauges/gauges.table'
import { relationships } from '../relationships/relationships.table'

export const parts = pgTable(
  'parts',
  {
    id: primaryId(),
    ...sharedColumns,
    /** The customer's part number. */
    number: text().notNull(),
    /** The supplier's own number for it. */
    supplierNumber: text(),
    name: text().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    archivedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('parts_relationship_id').on(t.relationshipId, t.id),
    unique('parts_relationship_number').on(t.relationshipId, t.number),
    index('parts_supplier').on(t.supplierOrgId, t.number),
    index('parts_customer').on(t.customerOrgId, t.number),
    relationshipKey('parts', t, () => relationships),
    sharedPolicy('parts'),
  ],
)

/** The revision with the highest sequence is the current one. */
export const partRevisions = pgTable(
  'part_revisions',
  {
    id: primaryId(),
    ...sharedColumns,
    partId: uuid().notNull(),
    label: text().notNull(),
    sequence: integer().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
  },
  (t) => [
    unique('part_revisions_relationship_id').on(t.relationshipId, t.id),
    unique('part_revisions_label').on(t.relationshipId, t.partId, t.label),
    unique('part_revisions_sequence').on(t.relationshipId, t.partId, t.sequence),
    foreignKey({
      name: 'part_revisions_part_fk',
      columns: [t.relationshipId, t.partId],
      foreignColumns: [parts.relationshipId, parts.id],
    }),
    relationshipKey('part_revisions', t, () => relationships),
    sharedPolicy('part_revisions'),
  ],
)

/** Limits are decimal text as entered; the double is derived where it is used. */
export const characteristics = pgTable(
  'characteristics',
  {
    id: primaryId(),
    ...sharedColumns,
    partId: uuid().notNull(),
    revisionId: uuid().notNull(),
    /** The number on the drawing. */
    number: integer().notNull(),
    name: text().notNull(),
    nominal: text(),
    lowerLimit: text(),
    upperLimit: text(),
    unit: text().notNull(),
    class: text().$type<'ordinary' | 'significant' | 'safety'>().notNull(),
    /** Standard deviation of the process that makes it, where both sides know one. */
    processStandardDeviation: text(),
    /** What the supplier entered counts once the customer has confirmed it. */
    confirmedByCustomer: boolean().notNull().default(false),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    archivedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('characteristics_relationship_id').on(t.relationshipId, t.id),
    unique('characteristics_number').on(t.relationshipId, t.revisionId, t.number),
    index('characteristics_part').on(t.relationshipId, t.partId),
    foreignKey({
      name: 'characteristics_part_fk',
      columns: [t.relationshipId, t.partId],
      foreignColumns: [parts.relationshipId, parts.id],
    }),
    foreignKey({
      name: 'characteristics_revision_fk',
      columns: [t.relationshipId, t.revisionId],
      foreignColumns: [partRevisions.relationshipId, partRevisions.id],
    }),
    relationshipKey('characteristics', t, () => relationships),
    sharedPolicy('characteristics'),
  ],
)

/** One characteristic measured by one measuring system at one site and process step: what needs proof. */
export const measuringTasks = pgTable(
  'measuring_tasks',
  {
    id: primaryId(),
    ...sharedColumns,
    partId: uuid().notNull(),
    characteristicId: uuid().notNull(),
    gaugeId: uuid().notNull(),
    /** Copies that the customer may see; the gauge itself stays with the supplier. */
    gaugeCode: text().notNull(),
    gaugeName: text().notNull(),
    site: text(),
    processStep: text(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    archivedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('measuring_tasks_relationship_id').on(t.relationshipId, t.id),
    index('measuring_tasks_characteristic').on(t.relationshipId, t.characteristicId),
    index('measuring_tasks_gauge').on(t.supplierOrgId, t.gaugeId),
    foreignKey({
      name: 'measuring_tasks_characteristic_fk',
      columns: [t.relationshipId, t.characteristicId],
      foreignColumns: [characteristics.relationshipId, characteristics.id],
    }),
    foreignKey({
      name: 'measuring_tasks_part_fk',
      columns: [t.relationshipId, t.partId],
      foreignColumns: [parts.relationshipId, parts.id],
    }),
    foreignKey({
      name: 'measuring_tasks_gauge_fk',
      columns: [t.supplierOrgId, t.gaugeId],
      foreignColumns: [gauges.orgId, gauges.id],
    }),
    relationshipKey('measuring_tasks', t, () => relationships),
    sharedPolicy('measuring_tasks'),
  ],
)
