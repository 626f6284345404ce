import { areCompatible } from '@evenrule/metrology'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import type { ProofState } from '../../../contract/proof'
import type { changeTask, createTask, listTasks, readTask } from '../../../contract/tasks'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { alreadyTaken } from '../../db/unique'
import { changedMeanwhile, invalidInput, notFound, type ProblemError } from '../../errors'
import { selectGauge } from '../gauges/gauges.repository'
import { selectCharacteristic } from './characteristics.repository'
import { isArchived, isNotArchived } from './parts.errors'
import { proofOfTasks } from './proof.service'
import {
  insertTask,
  selectListedTask,
  selectSameTask,
  selectTasks,
  updateTask,
  type TaskListed,
  type TaskRow,
} from './tasks.repository'

type TaskAnswer = AnswerInputOf<typeof readTask>

const sameTask = (path: string): ProblemError =>
  alreadyTaken({
    path,
    message: 'This gauge already measures this characteristic at that site and process step.',
  })

/** One page of measuring tasks with the proof they have. */
export async function listOfTasks(tenant: Tenant, query: QueryOf<typeof listTasks>) {
  return paged(
    query,
    (page) => selectTasks(tenant, page),
    async (rows) => {
      const ids = rows.map(({ task }) => task.id)
      const proofs = await proofOfTasks(tenant, ids)
      return rows.map((row) => asAnswer(tenant, row, proofs.get(row.task.id)))
    },
  )
}

/** One measuring task; 404 where this organisation does not have it on this side. */
export async function readTaskOf(tenant: Tenant, taskId: string): Promise<TaskAnswer> {
  const row = await loaded(tenant, taskId)
  return asAnswer(tenant, row, (await proofOfTasks(tenant, [taskId])).get(taskId))
}

/** Says which gauge measures a characteristic; the customer sees copies of the gauge's code and name. */
export async function enterTask(tenant: Tenant, body: BodyOf<typeof createTask>): Promise<TaskAnswer> {
  const [found, gauge] = [
    await selectCharacteristic(tenant, body.characteristicId),
    await selectGauge(tenant, body.gaugeId),
  ]
  if (!found || found.characteristic.archivedAt || found.part.archivedAt)
    throw invalidInput([
      { path: 'body.characteristicId', message: 'Choose an active characteristic from the list.' },
    ])
  if (!gauge || gauge.archivedAt)
    throw invalidInput([{ path: 'body.gaugeId', message: 'Choose an active gauge from the list.' }])
  const { characteristic, part } = found
  if (!areCompatible(gauge.unit, characteristic.unit))
    throw invalidInput([
      {
        path: 'body.gaugeId',
        message: `${gauge.code} reads in ${gauge.unit}, but the characteristic is in ${characteristic.unit}. Choose a gauge of the same quantity.`,
      },
    ])
  const row = {
    relationshipId: part.relationshipId,
    supplierOrgId: part.supplierOrgId,
    customerOrgId: part.customerOrgId,
    partId: part.id,
    characteristicId: characteristic.id,
    gaugeId: gauge.id,
    gaugeCode: gauge.code,
    gaugeName: gauge.name,
    site: body.site,
    processStep: body.processStep,
  }
  if (await selectSameTask(tenant, row)) throw sameTask('body.gaugeId')
  const task = await insertTask(tenant, { ...row, createdAt: tenant.now, createdBy: tenant.userId })
  recordTask(tenant, task, 'measuring-task.created')
  return readTaskOf(tenant, task.id)
}

export async function changeTaskOf(
  tenant: Tenant,
  taskId: string,
  { expectedVersion, ...place }: BodyOf<typeof changeTask>,
): Promise<TaskAnswer> {
  const { task } = await loaded(tenant, taskId)
  if (task.archivedAt) throw isArchived('measuring task')
  if (await selectSameTask(tenant, { ...task, ...place }, taskId)) throw sameTask('body.processStep')
  return move(tenant, taskId, expectedVersion, 'measuring-task.changed', place)
}

/** Ends a task; what was proved for it stays. */
export async function archiveTaskOf(
  tenant: Tenant,
  taskId: string,
  expectedVersion: number,
): Promise<TaskAnswer> {
  const { task } = await loaded(tenant, taskId)
  if (task.archivedAt) throw isArchived('measuring task')
  return move(tenant, taskId, expectedVersion, 'measuring-task.archived', { archivedAt: tenant.now })
}

/** Takes an ended task up again; its gauge and characteristic must be in use. */
export async function restoreTaskOf(
  tenant: Tenant,
  taskId: string,
  expectedVersion: number,
): Promise<TaskAnswer> {
  const { task, characteristic, part } = await loaded(tenant, taskId)
  if (!task.archivedAt) throw isNotArchived('measuring task')
  const gauge = await selectGauge(tenant, task.gaugeId)
  if (gauge?.archivedAt) throw isArchived('gauge')
  if (characteristic.archivedAt) throw isArchived('characteristic')
  if (part.archivedAt) throw isArchived('part')
  if (await selectSameTask(tenant, task)) throw sameTask('body')
  return move(tenant, taskId, expectedVersion, 'measuring-task.restored', { archivedAt: null })
}

async function loaded(tenant: Tenant, taskId: string): Promise<TaskListed> {
  const row = await selectListedTask(tenant, taskId)
  if (!row) throw notFound('measuring task')
  return row
}

async function move(
  tenant: Tenant,
  taskId: string,
  expectedVersion: number,
  type: string,
  values: Parameters<typeof updateTask>[3],
): Promise<TaskAnswer> {
  const updated = await updateTask(tenant, taskId, expectedVersion, values)
  if (!updated) throw changedMeanwhile('measuring task')
  recordTask(tenant, updated, type)
  return readTaskOf(tenant, taskId)
}

/** The task's events stand in the chain of the relationship, so they name the gauge as the customer sees it. */
export function recordTask(tenant: Tenant, task: TaskRow, type: string): void {
  const { relationshipId: id, supplierOrgId, customerOrgId } = task
  const { characteristicId, gaugeCode, gaugeName, site, processStep } = task
  tenant.record({
    type,
    relationship: { id, supplierOrgId, customerOrgId },
    subject: { type: 'measuring-task', id: task.id },
    taskId: task.id,
    data: { characteristicId, gaugeCode, gaugeName, site, processStep },
  })
}

function asAnswer(
  tenant: Tenant,
  { task, characteristic, part, revision, isCurrent, supplierName, customerName }: TaskListed,
  proof: ProofState = 'missing',
): TaskAnswer {
  return {
    ...task,
    supplierName,
    customerName,
    partNumber: part.number,
    partName: part.name,
    revision: revision.label,
    currentRevision: isCurrent,
    characteristic,
    gaugeId: tenant.side === 'supplier' ? task.gaugeId : null,
    proof,
  }
}
