import { and, desc, eq, inArray, ne } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { studies, studyTasks } from '../studies/studies.table'
import { submissions } from '../submissions/submissions.table'

/** The supplier's studies of the tasks that were not abandoned, the newest first. */
export async function selectStudiesOf({ tx, organisationId }: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  const { id, code, state, registeredAt } = studies
  return tx
    .select({ taskId: studyTasks.taskId, id, code, state, registeredAt })
    .from(studyTasks)
    .innerJoin(studies, and(eq(studies.orgId, studyTasks.orgId), eq(studies.id, studyTasks.studyId)))
    .where(
      and(
        eq(studyTasks.orgId, organisationId),
        inArray(studyTasks.taskId, [...taskIds]),
        ne(state, 'abandoned'),
      ),
    )
    .orderBy(desc(registeredAt), desc(id))
}

/** The supplier's submissions of the tasks that are being prepared. */
export async function selectDraftsOf({ tx, organisationId }: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  const { id, taskId, state, supplierOrgId } = submissions
  return tx
    .select({ taskId, id, state })
    .from(submissions)
    .where(
      and(
        eq(supplierOrgId, organisationId),
        inArray(taskId, [...taskIds]),
        inArray(state, ['draft', 'for-signature']),
      ),
    )
}
