import { and, asc, desc, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { submissions } from '../submissions/submissions.table'
import { requestAnswers, requests, requestTasks } from './requests.table'

export type RequestRow = typeof requests.$inferSelect

/** Requests that ask for one of the tasks and were not withdrawn, the one due first on top. */
export async function selectAsking(tenant: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  return tenant.tx
    .select({ request: requests, taskId: requestTasks.taskId })
    .from(requestTasks)
    .innerJoin(
      requests,
      and(eq(requests.relationshipId, requestTasks.relationshipId), eq(requests.id, requestTasks.requestId)),
    )
    .where(
      and(
        ownSide(tenant, requests),
        inArray(requestTasks.taskId, [...taskIds]),
        isNull(requests.withdrawnAt),
      ),
    )
    .orderBy(asc(requests.dueOn), asc(requests.number))
}

/** The signed submissions that name the requests, the newest first. */
export async function selectAnswers({ tx }: Tenant, requestIds: readonly string[]) {
  if (requestIds.length === 0) return []
  const { id, number, state, submittedAt } = submissions
  const rows = await tx
    .select({
      requestId: requestAnswers.requestId,
      taskId: requestAnswers.taskId,
      ...{ id, number, state, submittedAt },
    })
    .from(requestAnswers)
    .innerJoin(
      submissions,
      and(
        eq(submissions.relationshipId, requestAnswers.relationshipId),
        eq(submissions.id, requestAnswers.submissionId),
      ),
    )
    .where(and(inArray(requestAnswers.requestId, [...requestIds]), isNotNull(submittedAt)))
    .orderBy(desc(submittedAt), desc(id))
  return rows.flatMap((row) =>
    row.number === null || row.submittedAt === null
      ? []
      : [{ ...row, number: row.number, submittedAt: row.submittedAt }],
  )
}
export type Answer = Awaited<ReturnType<typeof selectAnswers>>[number]

/** The measuring tasks of the requests, in the order they were chosen. */
export async function selectTasksOf({ tx }: Tenant, requestIds: readonly string[]) {
  if (requestIds.length === 0) return []
  return tx
    .select({ requestId: requestTasks.requestId, taskId: requestTasks.taskId })
    .from(requestTasks)
    .where(inArray(requestTasks.requestId, [...requestIds]))
    .orderBy(asc(requestTasks.position))
}

export async function insertAnswers(
  { tx }: Tenant,
  rows: (typeof requestAnswers.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(requestAnswers).values(rows)
}
