import { sql } from 'drizzle-orm'
import {
  boolean,
  check,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import { instant, ownerColumn, ownerPolicy, primaryId } from '../../db/columns'
import { files } from '../files/files.table'
import { organisations, sites } from '../organisations/organisations.table'

export const gauges = pgTable(
  'gauges',
  {
    ...ownerColumn,
    id: primaryId(),
    code: text().notNull(),
    name: text().notNull(),
    /** Smallest difference it shows, decimal text in `unit`. */
    resolution: text().notNull(),
    unit: text().notNull(),
    siteId: uuid(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    archivedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('gauges_org_id').on(t.orgId, t.id),
    unique('gauges_org_code').on(t.orgId, t.code),
    foreignKey({ name: 'gauges_org_fk', columns: [t.orgId], foreignColumns: [organisations.id] }),
    foreignKey({
      name: 'gauges_site_fk',
      columns: [t.orgId, t.siteId],
      foreignColumns: [sites.orgId, sites.id],
    }),
    ownerPolicy('gauges'),
  ],
)

export const referenceStandards = pgTable(
  'reference_standards',
  {
    ...ownerColumn,
    id: primaryId(),
    code: text().notNull(),
    name: text().notNull(),
    certifiedValue: text().notNull(),
    unit: text().notNull(),
    /** Expanded uncertainty of the certified value, same unit, and its coverage factor; null where not stated. */
    expandedUncertainty: text(),
    coverageFactor: text().notNull().default('2'),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
    archivedAt: instant(),
    rowVersion: integer().notNull().default(1),
  },
  (t) => [
    unique('reference_standards_org_id').on(t.orgId, t.id),
    unique('reference_standards_org_code').on(t.orgId, t.code),
    foreignKey({
      name: 'reference_standards_org_fk',
      columns: [t.orgId],
      foreignColumns: [organisations.id],
    }),
    ownerPolicy('reference_standards'),
  ],
)

/** A calibration of one gauge or of one reference standard, with its certificate. */
export const calibrations = pgTable(
  'calibrations',
  {
    ...ownerColumn,
    id: primaryId(),
    gaugeId: uuid(),
    standardId: uuid(),
    certificateNumber: text().notNull(),
    laboratory: text(),
    calibratedOn: date({ mode: 'string' }).notNull(),
    dueOn: date({ mode: 'string' }).notNull(),
    foundWithinLimits: boolean().notNull().default(true),
    fileId: uuid(),
    createdAt: instant().notNull(),
    createdBy: uuid().notNull(),
  },
  (t) => [
    unique('calibrations_org_id').on(t.orgId, t.id),
    index('calibrations_gauge').on(t.orgId, t.gaugeId, t.calibratedOn),
    index('calibrations_standard').on(t.orgId, t.standardId, t.calibratedOn),
    check('calibrations_of_one_thing', sql`(gauge_id is null) <> (standard_id is null)`),
    check('calibrations_due_after', sql`due_on >= calibrated_on`),
    foreignKey({
      name: 'calibrations_gauge_fk',
      columns: [t.orgId, t.gaugeId],
      foreignColumns: [gauges.orgId, gauges.id],
    }),
    foreignKey({
      name: 'calibrations_standard_fk',
      columns: [t.orgId, t.standardId],
      foreignColumns: [referenceStandards.orgId, referenceStandards.id],
    }),
    foreignKey({
      name: 'calibrations_file_fk',
      columns: [t.orgId, t.fileId],
      foreignColumns: [files.orgId, files.id],
    }),
    ownerPolicy('calibrations'),
  ],
)
