import { areCompatible } from '@evenrule/metrology'
import { standingOn } from '../../../contract/calibrations'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import type { changeGauge, createGauge, listGauges, listSites, readGauge } from '../../../contract/gauges'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { changedMeanwhile, invalidInput, notFound } from '../../errors'
import { todayOf } from '../organisations/organisations.lookup.service'
import { isArchived, isNotArchived } from '../parts/parts.errors'
import { recordTask } from '../parts/tasks.service'
import { stillServes } from './gauges.errors'
import { gaugeById } from './gauges.lookup.service'
import {
  insertGauge,
  renameInTasks,
  selectGauges,
  selectListedGauge,
  selectTasksOfGauge,
  updateGauge,
  type GaugeListed,
  type GaugeRow,
} from './gauges.repository'
import { selectSites, siteNamed } from './sites.repository'

type GaugeAnswer = AnswerInputOf<typeof readGauge>

const taken = {
  gauges_org_code: {
    path: 'body.code',
    message: 'Another gauge has this code. Look among the archived ones too, or enter another code.',
  },
}

/** One page of gauges with the calibration that counts today. */
export async function listOfGauges(tenant: Tenant, query: QueryOf<typeof listGauges>) {
  const day = await todayOf(tenant)
  return paged(
    query,
    (page) => selectGauges(tenant, page, day),
    (rows) => rows.map((row) => asAnswer(row, day)),
  )
}

/** One gauge with the calibration that counts today; 404 for those of others. */
export async function readGaugeOf(tenant: Tenant, gaugeId: string): Promise<GaugeAnswer> {
  const day = await todayOf(tenant)
  const row = await selectListedGauge(tenant, gaugeId, day)
  if (!row) throw notFound('gauge')
  return asAnswer(row, day)
}

export async function registerGauge(tenant: Tenant, body: BodyOf<typeof createGauge>): Promise<GaugeAnswer> {
  const { site, ...entered } = body
  const siteId = site === null ? null : await siteNamed(tenant, site)
  const row = await uniqueOr409(taken, () => insertGauge(tenant, { ...entered, siteId }))
  recordGauge(tenant, row, 'gauge.created', body)
  return readGaugeOf(tenant, row.id)
}

/** Changes a gauge. Its tasks keep their meaning: the unit stays one of the same quantity. */
export async function changeGaugeOf(
  tenant: Tenant,
  gaugeId: string,
  { expectedVersion, site, ...entered }: BodyOf<typeof changeGauge>,
): Promise<GaugeAnswer> {
  const before = await gaugeById(tenant, gaugeId)
  await refuseGaugeChange(tenant, before, entered)
  const siteId = site === null ? null : await siteNamed(tenant, site)
  const updated = await uniqueOr409(taken, () =>
    updateGauge(tenant, gaugeId, expectedVersion, { ...entered, siteId }),
  )
  if (!updated) throw changedMeanwhile('gauge')
  recordGauge(tenant, updated, 'gauge.changed', { ...entered, site })
  if (updated.code !== before.code || updated.name !== before.name)
    for (const task of await renameInTasks(tenant, updated))
      recordTask(tenant, task, 'measuring-task.changed')
  return readGaugeOf(tenant, gaugeId)
}

/** Refuses a change that a gauge does not allow as it stands. */
export async function refuseGaugeChange(
  tenant: Tenant,
  before: GaugeRow,
  { unit }: Pick<GaugeRow, 'unit'>,
): Promise<void> {
  if (before.archivedAt) throw isArchived('gauge')
  if (!areCompatible(before.unit, unit) && (await selectTasksOfGauge(tenant, before.id)).length > 0)
    throw invalidInput([
      {
        path: 'body.unit',
        message: `This gauge measures characteristics in ${before.unit} or a unit of the same quantity; ${unit} is of another. Archive its measuring tasks first.`,
      },
    ])
}

export async function archiveGaugeOf(
  tenant: Tenant,
  gaugeId: string,
  expectedVersion: number,
): Promise<GaugeAnswer> {
  const gauge = await gaugeById(tenant, gaugeId)
  if (gauge.archivedAt) throw isArchived('gauge')
  const tasks = await selectTasksOfGauge(tenant, gaugeId)
  if (tasks.length > 0) throw stillServes(tasks.length)
  return setArchived(tenant, gauge, expectedVersion, tenant.now)
}

export async function restoreGaugeOf(
  tenant: Tenant,
  gaugeId: string,
  expectedVersion: number,
): Promise<GaugeAnswer> {
  const gauge = await gaugeById(tenant, gaugeId)
  if (!gauge.archivedAt) throw isNotArchived('gauge')
  return setArchived(tenant, gauge, expectedVersion, null)
}

/** One page of this organisation's sites. */
export async function listOfSites(tenant: Tenant, query: QueryOf<typeof listSites>) {
  return paged(
    query,
    (page) => selectSites(tenant, page),
    (rows) => rows,
  )
}

async function setArchived(
  tenant: Tenant,
  gauge: GaugeRow,
  expectedVersion: number,
  archivedAt: string | null,
): Promise<GaugeAnswer> {
  if (!(await updateGauge(tenant, gauge.id, expectedVersion, { archivedAt }))) throw changedMeanwhile('gauge')
  recordGauge(tenant, gauge, archivedAt ? 'gauge.archived' : 'gauge.restored', { code: gauge.code })
  return readGaugeOf(tenant, gauge.id)
}

function recordGauge(tenant: Tenant, gauge: GaugeRow, type: string, data: Record<string, unknown>): void {
  tenant.record({ type, subject: { type: 'gauge', id: gauge.id }, data })
}

function asAnswer({ gauge, site, tasks, calibratedOn, dueOn, foundWithinLimits }: GaugeListed, day: string) {
  const standing = standingOn(dueOn, day)
  return { ...gauge, site, tasks, calibration: { standing, calibratedOn, dueOn, foundWithinLimits } }
}
