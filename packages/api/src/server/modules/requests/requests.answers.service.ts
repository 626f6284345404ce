import { isOwed, requestState, requestTaskState } from '../../../contract/moves/request'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { insertAnswers, selectAnswers, selectAsking, selectTasksOf } from './requests.answers.repository'
import { requestMessages, tellCustomer } from './requests.messages'

/** A request that a submission of the task would answer; a submission freezes id and number. */
export interface OpenRequest {
  id: string
  number: number
  dueOn: string
}

/**
 * The requests that a submission for the task signed now answers: those that ask for it, were not withdrawn, and have
 * no accepted answer yet. The one due first comes first.
 */
export async function openRequestsOf(tenant: Tenant, taskId: string): Promise<OpenRequest[]> {
  const asking = await selectAsking(tenant, taskId)
  const answers = await selectAnswers(
    tenant,
    asking.map(({ id }) => id),
  )
  return asking
    .filter(
      ({ id }) =>
        requestTaskState(
          answers.filter((each) => each.requestId === id && each.taskId === taskId).map(({ state }) => state),
        ) !== 'accepted',
    )
    .map(({ id, number, dueOn }) => ({ id, number, dueOn }))
}

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
  const asking = (await selectAsking(tenant, taskId)).filter(({ id }) => named.some((each) => each.id === id))
  await insertAnswers(
    tenant,
    asking.map(({ id }) => ({
      ...{ relationshipId, supplierOrgId, customerOrgId, taskId },
      requestId: id,
      submissionId: submission.id,
    })),
  )
  const ids = asking.map(({ id }) => id)
  const answers = await selectAnswers(tenant, ids)
  const tasks = await selectTasksOf(tenant, ids)
  for (const request of asking) {
    const states = tasks
      .filter(({ requestId }) => requestId === request.id)
      .map((task) =>
        requestTaskState(
          answers
            .filter((each) => each.requestId === request.id && each.taskId === task.taskId)
            .map(({ state }) => state),
        ),
      )
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
