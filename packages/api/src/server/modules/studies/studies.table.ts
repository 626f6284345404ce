import type { Verdict } from '@evenrule/metrology'
import {
  boolean,
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import type { Criterion } from '../../../contract/agreements-applies'
import type { FrozenCharacteristic } from '../../../contract/frozen'
import type { StudyState } from '../../../contract/moves/study'
import type { ReadAs } from '../../../contract/readings'
import { instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { files } from '../files/files.table'
import { gauges, referenceStandards } from '../gauges/gauges.table'
import { organisations } from '../organisations/organisations.table'
import { measuringTasks } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import type { ReadAsOfFirstRelease } from './readings/stored'

/** A clause as it was in force when the study was registered, with where it came from. */
export type FrozenClause = Criterion
export type { FrozenCharacteristic }

/** The gauge as it stood at registration; decimal text as entered. */
export interface FrozenGauge {
  code: string
  name: string
  resolution: string
  unit: string
}

/** The reference standard as it stood when readings were stored; decimal text as entered. */
export interface FrozenStandard {
  code: string
  name: string
  certifiedValue: string
  unit: string
  expandedUncertainty: string | null
  coverageFactor: string
}

/** A row of a file that held no number where a reading was expected, left out by the person who stored it. */
export interface LeftOutRow {
  row: number
  column: string
  text: string
}

/** Working rows of a study: the supplier's alone. Customers see the frozen copy in a submission. */
export const studies = pgTable(
  'studies',
  {
    ...ownerColumn,
    id: primaryId(),
    /** A short name that people use, unique within the organisation. */
    code: text().notNull(),
    kind: text().$type<'bias'>().notNull(),
    gaugeId: uuid().notNull(),
    gauge: jsonb().$type<FrozenGauge>().notNull(),
    standardId: uuid().notNull(),
    state: text().$type<StudyState>().notNull(),
    registeredAt: instant().notNull(),
    registeredBy: uuid().notNull(),
    /** False for history taken over from elsewhere, which the other side is told. */
    registeredBeforehand: boolean().notNull(),
    plannedReadings: integer().notNull(),
    /** What the plan assumed: true bias and spread (unit of the readings) and the wanted chance. */
    plan: jsonb().$type<{ bias: string; standardDeviation: string; chance: number } | null>(),
    runSheetSeed: integer().notNull(),
    /** Positions or times of day among which the run sheet deals the readings in random order. */
    slots: text().array().notNull().default([]),
    unit: text().notNull(),
    /** Readings are values, or deviations from the standard's certified value. */
    measuredAs: text().$type<'value' | 'deviation'>().notNull(),
    collectedOn: date({ mode: 'string' }),
    abandonedAt: instant(),
    abandonReason: text(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('studies_org_id').on(t.orgId, t.id),
    unique('studies_org_code').on(t.orgId, t.code),
    index('studies_org_state').on(t.orgId, t.state, t.registeredAt),
    foreignKey({ name: 'studies_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({
      name: 'studies_gauge_fk',
      columns: [t.orgId, t.gaugeId],
      foreignColumns: [gauges.orgId, gauges.id],
    }),
    foreignKey({
      name: 'studies_standard_fk',
      columns: [t.orgId, t.standardId],
      foreignColumns: [referenceStandards.orgId, referenceStandards.id],
    }),
    ownerPolicy('studies'),
  ],
)

/** The tasks a study serves, each with the criteria and limits in force at registration. */
export const studyTasks = pgTable(
  'study_tasks',
  {
    ...ownerColumn,
    studyId: uuid().notNull(),
    taskId: uuid().notNull(),
    relationshipId: uuid().notNull(),
    customerOrgId: uuid().notNull(),
    /** Which attempt on this task it is, counted from the first registered. */
    attempt: integer().notNull(),
    criteria: jsonb().$type<FrozenClause[]>().notNull(),
    characteristic: jsonb().$type<FrozenCharacteristic>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.orgId, t.studyId, t.taskId] }),
    unique('study_tasks_attempt').on(t.orgId, t.taskId, t.attempt),
    foreignKey({
      name: 'study_tasks_study_fk',
      columns: [t.orgId, t.studyId],
      foreignColumns: [studies.orgId, studies.id],
    }),
    foreignKey({
      name: 'study_tasks_task_fk',
      columns: [t.relationshipId, t.taskId],
      foreignColumns: [measuringTasks.relationshipId, measuringTasks.id],
    }),
    foreignKey({
      name: 'study_tasks_relationship_fk',
      columns: [t.relationshipId, t.orgId, t.customerOrgId],
      foreignColumns: [relationships.id, relationships.supplierOrgId, relationships.customerOrgId],
    }),
    ownerPolicy('study_tasks'),
  ],
)

/** A revision of a study's readings, in the study's unit and as measured; earlier revisions stay. */
export const studyData = pgTable(
  'study_data',
  {
    ...ownerColumn,
    id: primaryId(),
    studyId: uuid().notNull(),
    revision: integer().notNull(),
    source: text().$type<'typed' | 'pasted' | 'uploaded'>().notNull(),
    /** False while more readings are to follow; such a revision is kept but not judged. */
    complete: boolean().notNull(),
    /** Why readings that were judged before were replaced. */
    reason: text(),
    fileId: uuid(),
    /** How it was read: sheet or encoding and separator, decimal mark, layout, columns. */
    readAs: jsonb().$type<ReadAs | ReadAsOfFirstRelease>().notNull(),
    /** The standard in use, with its values of the day of storing. */
    standard: jsonb().$type<FrozenStandard>().notNull(),
    values: doublePrecision().array().notNull(),
    /** Each reading as it was entered. */
    texts: text().array().notNull(),
    leftOut: jsonb().$type<LeftOutRow[]>().notNull().default([]),
    /** Code of the person who took the readings, as the other side sees it. */
    appraiser: text().notNull(),
    /** People of this organisation who took the readings; they may not sign the submission. */
    takenBy: uuid().array().notNull(),
    collectedOn: date({ mode: 'string' }).notNull(),
    /** SHA-256 of the canonical JSON of `texts`. */
    sha256: text().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
  },
  (t) => [
    unique('study_data_org_id').on(t.orgId, t.id),
    unique('study_data_revision').on(t.orgId, t.studyId, t.revision),
    foreignKey({
      name: 'study_data_study_fk',
      columns: [t.orgId, t.studyId],
      foreignColumns: [studies.orgId, studies.id],
    }),
    foreignKey({
      name: 'study_data_file_fk',
      columns: [t.orgId, t.fileId],
      foreignColumns: [files.orgId, files.id],
    }),
    ownerPolicy('study_data'),
  ],
)

/** One evaluation per data revision, task and clause: the canonical texts are the original. */
export const studyEvaluations = pgTable(
  'study_evaluations',
  {
    ...ownerColumn,
    id: primaryId(),
    studyId: uuid().notNull(),
    dataId: uuid().notNull(),
    taskId: uuid().notNull(),
    clauseKey: text().notNull(),
    inputText: text().notNull(),
    outputText: text().notNull(),
    outputSha256: text().notNull(),
    verdict: text().$type<Verdict>().notNull(),
    engineVersion: text().notNull(),
    engineSha256: text().notNull(),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('study_evaluations_one').on(t.orgId, t.dataId, t.taskId, t.clauseKey),
    index('study_evaluations_study').on(t.orgId, t.studyId),
    foreignKey({
      name: 'study_evaluations_study_fk',
      columns: [t.orgId, t.studyId],
      foreignColumns: [studies.orgId, studies.id],
    }),
    foreignKey({
      name: 'study_evaluations_data_fk',
      columns: [t.orgId, t.dataId],
      foreignColumns: [studyData.orgId, studyData.id],
    }),
    ownerPolicy('study_evaluations'),
  ],
)
