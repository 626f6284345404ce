import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import { unmet, type Facts } from '../../../contract/moves/define'
import {
  requestMovesNamed,
  type RequestMove,
  type RequestPrecondition,
  type RequestState,
} from '../../../contract/moves/request'
import type { askForProof, moveRequestDate, readRequest, withdrawRequest } from '../../../contract/requests'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, type FieldError } from '../../errors'
import { selectListedTasks } from '../parts/tasks.repository'
import { sha256 } from '../record/record.append'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import { lockRelationship } from '../submissions/submissions.repository'
import type { RequestRow } from './requests.answers.repository'
import { dayOver, refusals, wrongRequestState } from './requests.errors'
import { selectListedRequest } from './requests.list.repository'
import { requestMessages, tellSupplier } from './requests.messages'
import { readRequestOf } from './requests.read.service'
import { insertRequest, nextRequestNumber, updateRequest } from './requests.repository'

type RequestAnswer = AnswerInputOf<typeof readRequest>

/** Asks a supplier for proof of measuring tasks by a day. */
export async function ask(tenant: Tenant, body: BodyOf<typeof askForProof>): Promise<RequestAnswer> {
  const relationship = await relationshipById(tenant, body.relationshipId)
  const { id: relationshipId, supplierOrgId, customerOrgId } = relationship
  const faults = await tasksToMend(tenant, body)
  if (body.dueOn < todayIn(relationship, tenant)) faults.push(dayOver)
  if (faults.length > 0) throw invalidInput(faults)
  await lockRelationship(tenant, relationshipId)
  const { dueOn, occasion, words, taskIds } = body
  const request = await insertRequest(
    tenant,
    {
      ...{ relationshipId, supplierOrgId, customerOrgId, dueOn, occasion, words },
      number: await nextRequestNumber(tenant, relationshipId),
      askedBy: tenant.userId,
      askedAt: tenant.now,
    },
    taskIds,
  )
  const [move] = requestMovesNamed('ask', null)
  if (!move) throw new Error('The table of moves does not let a request begin.')
  recordMove(tenant, request, move, { number: request.number, dueOn, occasion, tasks: taskIds })
  await tellSupplier(tenant, request, requestMessages.asked(taskIds.length, dueOn, words))
  return readRequestOf(tenant, request.id)
}

/** Moves the day of a request that is still open. */
export async function moveDate(
  tenant: Tenant,
  requestId: string,
  { expectedVersion, dueOn, reason }: BodyOf<typeof moveRequestDate>,
): Promise<RequestAnswer> {
  const { request, state, today } = await opened(tenant, requestId, expectedVersion)
  const move = permitted('move-date', state, {
    'day-to-come': dueOn >= today,
    'reason-given': reason !== '',
  })
  const moved = await change(tenant, request, { dueOn })
  recordMove(tenant, moved, move, { from: request.dueOn, dueOn, reasonSha256: sha256(reason) })
  await tellSupplier(tenant, moved, requestMessages.dateMoved(request.dueOn, dueOn, reason))
  return readRequestOf(tenant, requestId)
}

/** Withdraws a request; both sides keep it and its reason. */
export async function withdraw(
  tenant: Tenant,
  requestId: string,
  { expectedVersion, reason }: BodyOf<typeof withdrawRequest>,
): Promise<RequestAnswer> {
  const { request, state } = await opened(tenant, requestId, expectedVersion)
  const move = permitted('withdraw', state, { 'reason-given': reason !== '' })
  const moved = await change(tenant, request, {
    withdrawnAt: tenant.now,
    withdrawnBy: tenant.userId,
    withdrawalReason: reason,
  })
  recordMove(tenant, moved, move, { reasonSha256: sha256(reason) })
  await tellSupplier(tenant, moved, requestMessages.withdrawn(reason))
  return readRequestOf(tenant, requestId)
}

/** What is wrong with the tasks named: each must be an active one of the relationship, and stand there once. */
async function tasksToMend(
  tenant: Tenant,
  { relationshipId, taskIds }: Pick<BodyOf<typeof askForProof>, 'relationshipId' | 'taskIds'>,
): Promise<FieldError[]> {
  const rows = await selectListedTasks(tenant, taskIds)
  return taskIds.flatMap((taskId, index) => {
    const task = rows.find(
      (row) => row.task.id === taskId && row.task.relationshipId === relationshipId,
    )?.task
    const fault =
      !task || task.archivedAt
        ? 'Choose an active measuring task of this supplier from the list.'
        : taskIds.indexOf(taskId) < index
          ? 'This measuring task is chosen twice; leave one out.'
          : null
    return fault === null ? [] : [{ path: `body.taskIds[${index}]`, message: fault }]
  })
}

/** A request for a change by somebody who saw the version; of two changes at once the second sees the first. */
async function opened(tenant: Tenant, requestId: string, expectedVersion: number) {
  const found = await selectListedRequest(tenant, requestId)
  if (!found) throw notFound('request')
  const relationship = await relationshipById(tenant, found.request.relationshipId)
  // Signing takes the same lock, so what it answers cannot be withdrawn under its hands.
  await lockRelationship(tenant, relationship.id)
  const row = await selectListedRequest(tenant, requestId)
  if (!row) throw notFound('request')
  if (row.request.rowVersion !== expectedVersion) throw changedMeanwhile('request')
  return { request: row.request, state: row.state, today: todayIn(relationship, tenant) }
}

function permitted(
  name: 'move-date' | 'withdraw',
  state: RequestState,
  facts: Facts<RequestPrecondition>,
): RequestMove {
  const [move] = requestMovesNamed(name, state)
  if (!move) throw wrongRequestState(state)
  const [lacking] = unmet<RequestPrecondition>(move, facts)
  if (lacking !== undefined) throw refusals[lacking === 'day-to-come' ? 'day-to-come' : 'reason-given']()
  return move
}

async function change(
  tenant: Tenant,
  request: RequestRow,
  values: Parameters<typeof updateRequest>[3],
): Promise<RequestRow> {
  const changed = await updateRequest(tenant, request, request.rowVersion, values)
  if (!changed) throw changedMeanwhile('request')
  return changed
}

function recordMove(
  tenant: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: RequestRow,
  { event }: RequestMove,
  data: Record<string, unknown>,
): void {
  tenant.record({
    type: event,
    relationship: { id: relationshipId, supplierOrgId, customerOrgId },
    subject: { type: 'request', id },
    data,
  })
}
