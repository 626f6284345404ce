import {
  isOwed,
  requestState,
  requestTaskState,
  type RequestTaskState,
} from '../../../contract/moves/request'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import {
  insertAnswers,
  selectAnswers,
  selectAsking,
  selectTasksOf,
  type Answer,
} from './requests.answers.repository'
import { requestMessages, tellCustomer } from './requests.messages'

/** A request that a submission of the task would answer; a submission freezes id and number. */
export interface OpenRequest {
  id: string
  number: number
  dueOn: string
}

/** The state of one task of a request, from the signed submissions that name requests, the newest first. */
export const taskStateIn = (
  answers: readonly Answer[],
  { requestId, taskId }: { requestId: string; taskId: string },
): RequestTaskState =>
  requestTaskState(
    answers
      .filter((each) => each.requestId === requestId && each.taskId === taskId)
      .map(({ state }) => state),
  )

/** Requests that ask for tasks, were not withdrawn, and have no accepted answer for them yet; by task. */
export async function openRequestsOfTasks(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<Map<string, OpenRequest[]>> {
  const asking = await selectAsking(tenant, taskIds)
  const answers = await selectAnswers(
    tenant,
    asking.map(({ request }) => request.id),
  )
  const open = asking.filter(
    ({ request, taskId }) => taskStateIn(answers, { requestId: request.id, taskId }) !== 'accepted',
  )
  return new Map(
    taskIds.map((taskId) => [
      taskId,
      open
        .filter((each) => each.taskId === taskId)
        .map(({ request: { id, number, dueOn } }) => ({ id, number, dueOn })),
    ]),
  )
}

/** The requests that a submission for the task signed now answers, the one due first on top. */
export const openRequestsOf = async (tenant: Tenant, taskId: string): Promise<OpenRequest[]> =>
  (await openRequestsOfTasks(tenant, [taskId])).get(taskId) ?? []

/**
 * Notes that a submission just signed answers requests, each in the record. `named` are those its frozen text names;
 * the customer is told once a request is answered in whole.
 */
export async function answerRequests(
  tenant: Tenant,
  submission: SubmissionRow,
  named: readonly Pick<OpenRequest, 'id'>[],
): Promise<void> {
  const { relationshipId, supplierOrgId, customerOrgId, taskId } = submission
  const asking = (await selectAsking(tenant, [taskId]))
    .map(({ request }) => request)
    .filter(({ id }) => named.some((each) => each.id === id))
  await insertAnswers(
    tenant,
    asking.map(({ id }) => ({
      ...{ relationshipId, supplierOrgId, customerOrgId, taskId },
      requestId: id,
      submissionId: submission.id,
    })),
  )
  const ids = asking.map(({ id }) => id)
  const [answers, tasks] = [await selectAnswers(tenant, ids), await selectTasksOf(tenant, ids)]
  for (const request of asking) {
    const states = tasks
      .filter(({ requestId }) => requestId === request.id)
      .map((task) => taskStateIn(answers, task))
    tenant.record({
      type: 'request.answered',
      relationship: { id: relationshipId, supplierOrgId, customerOrgId },
      subject: { type: 'request', id: request.id },
      taskId,
      data: { submission: submission.id, state: requestState(false, states) },
    })
    // Each submission tells of itself; the request does when nothing is owed any more.
    if (!states.some(isOwed)) await tellCustomer(tenant, request, requestMessages.answered(submission.number))
  }
}
