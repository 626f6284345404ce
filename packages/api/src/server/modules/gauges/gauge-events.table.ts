import { sql } from 'drizzle-orm'
import { check, date, foreignKey, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { GaugeEventKind } from '../../../contract/standing'
import { instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { files } from '../files/files.table'
import { calibrations, gauges, referenceStandards } from './gauges.table'

/**
 * What happened to a gauge (or a reference standard) that puts its acceptances in doubt: the supplier's own row. Each
 * customer has what concerns them in `standing_events`.
 */
export const gaugeEvents = pgTable(
  'gauge_events',
  {
    ...ownerColumn,
    id: primaryId(),
    gaugeId: uuid(),
    standardId: uuid(),
    kind: text().$type<GaugeEventKind>().notNull(),
    happenedOn: date({ mode: 'string' }).notNull(),
    words: text().notNull(),
    lastGoodOn: date({ mode: 'string' }),
    /** The calibration that found it out of limits; null where it was reported otherwise. */
    calibrationId: uuid(),
    fileId: uuid(),
    /** Acceptances it suspended when it was reported, and those that stay as agreed. */
    suspended: integer().notNull(),
    stays: integer().notNull(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
  },
  (t) => [
    unique('gauge_events_org_id').on(t.orgId, t.id),
    index('gauge_events_gauge').on(t.orgId, t.gaugeId, t.happenedOn),
    index('gauge_events_standard').on(t.orgId, t.standardId, t.happenedOn),
    check('gauge_events_of_one_thing', sql`(gauge_id is null) <> (standard_id is null)`),
    foreignKey({
      name: 'gauge_events_gauge_fk',
      columns: [t.orgId, t.gaugeId],
      foreignColumns: [gauges.orgId, gauges.id],
    }),
    foreignKey({
      name: 'gauge_events_standard_fk',
      columns: [t.orgId, t.standardId],
      foreignColumns: [referenceStandards.orgId, referenceStandards.id],
    }),
    foreignKey({
      name: 'gauge_events_calibration_fk',
      columns: [t.orgId, t.calibrationId],
      foreignColumns: [calibrations.orgId, calibrations.id],
    }),
    foreignKey({
      name: 'gauge_events_file_fk',
      columns: [t.orgId, t.fileId],
      foreignColumns: [files.orgId, files.id],
    }),
    ownerPolicy('gauge_events'),
  ],
)
