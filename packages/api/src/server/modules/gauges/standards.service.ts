import { standingOn } from '../../../contract/calibrations'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import type { changeStandard, createStandard, listStandards, readStandard } from '../../../contract/standards'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { changedMeanwhile, notFound } from '../../errors'
import { isArchived, isNotArchived } from '../parts/parts.errors'
import { standardById } from './gauges.lookup.service'
import { todayOf } from '../organisations/organisations.lookup.service'
import {
  insertStandard,
  selectListedStandard,
  selectStandards,
  updateStandard,
  type StandardListed,
  type StandardRow,
} from './standards.repository'

type StandardAnswer = AnswerInputOf<typeof readStandard>

const taken = {
  reference_standards_org_code: {
    path: 'body.code',
    message: 'Another reference standard has this code. Look among the archived ones too, or enter another.',
  },
}

/** One page of reference standards with the calibration that counts today. */
export async function listOfStandards(tenant: Tenant, query: QueryOf<typeof listStandards>) {
  const day = await todayOf(tenant)
  return paged(
    query,
    (page) => selectStandards(tenant, page, day),
    (rows) => rows.map((row) => asAnswer(row, day)),
  )
}

/** One reference standard with the calibration that counts today; 404 for those of others. */
export async function readStandardOf(tenant: Tenant, standardId: string): Promise<StandardAnswer> {
  const day = await todayOf(tenant)
  const row = await selectListedStandard(tenant, standardId, day)
  if (!row) throw notFound('reference standard')
  return asAnswer(row, day)
}

export async function registerStandard(
  tenant: Tenant,
  body: BodyOf<typeof createStandard>,
): Promise<StandardAnswer> {
  const row = await uniqueOr409(taken, () => insertStandard(tenant, stored(body)))
  recordStandard(tenant, row, 'reference-standard.created', body)
  return readStandardOf(tenant, row.id)
}

export async function changeStandardOf(
  tenant: Tenant,
  standardId: string,
  { expectedVersion, ...entered }: BodyOf<typeof changeStandard>,
): Promise<StandardAnswer> {
  const before = await standardById(tenant, standardId)
  if (before.archivedAt) throw isArchived('reference standard')
  const updated = await uniqueOr409(taken, () =>
    updateStandard(tenant, standardId, expectedVersion, stored(entered)),
  )
  if (!updated) throw changedMeanwhile('reference standard')
  recordStandard(tenant, updated, 'reference-standard.changed', entered)
  return readStandardOf(tenant, standardId)
}

export async function archiveStandardOf(
  tenant: Tenant,
  standardId: string,
  expectedVersion: number,
): Promise<StandardAnswer> {
  const standard = await standardById(tenant, standardId)
  if (standard.archivedAt) throw isArchived('reference standard')
  return setArchived(tenant, standard, expectedVersion, tenant.now)
}

export async function restoreStandardOf(
  tenant: Tenant,
  standardId: string,
  expectedVersion: number,
): Promise<StandardAnswer> {
  const standard = await standardById(tenant, standardId)
  if (!standard.archivedAt) throw isNotArchived('reference standard')
  return setArchived(tenant, standard, expectedVersion, null)
}

/** Without an uncertainty the factor has no meaning; the column then keeps its default, which nothing reads. */
const stored = ({
  coverageFactor,
  ...entered
}: Omit<BodyOf<typeof changeStandard>, 'expectedVersion'>): Parameters<typeof insertStandard>[1] =>
  coverageFactor === null ? entered : { ...entered, coverageFactor }

async function setArchived(
  tenant: Tenant,
  standard: StandardRow,
  expectedVersion: number,
  archivedAt: string | null,
): Promise<StandardAnswer> {
  if (!(await updateStandard(tenant, standard.id, expectedVersion, { archivedAt })))
    throw changedMeanwhile('reference standard')
  const type = archivedAt ? 'reference-standard.archived' : 'reference-standard.restored'
  recordStandard(tenant, standard, type, { code: standard.code })
  return readStandardOf(tenant, standard.id)
}

function recordStandard(
  tenant: Tenant,
  standard: StandardRow,
  type: string,
  data: Record<string, unknown>,
): void {
  tenant.record({ type, subject: { type: 'reference-standard', id: standard.id }, data })
}

function asAnswer({ standard, ...latest }: StandardListed, day: string): StandardAnswer {
  const { calibratedOn, dueOn, foundWithinLimits } = latest
  return {
    ...standard,
    coverageFactor: standard.expandedUncertainty === null ? null : standard.coverageFactor,
    calibration: { standing: standingOn(dueOn, day), calibratedOn, dueOn, foundWithinLimits },
  }
}
