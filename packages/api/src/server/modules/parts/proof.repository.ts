import { and, desc, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { submissions } from '../submissions/submissions.table'
import { measuringTasks } from './parts.table'

/** States of the submissions that were ever put before the customer, the newest first, by task. */
export async function selectSubmissionStates({ tx }: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  return tx
    .select({ taskId: submissions.taskId, state: submissions.state })
    .from(submissions)
    .where(and(inArray(submissions.taskId, [...taskIds]), isNotNull(submissions.submittedAt)))
    .orderBy(desc(submissions.submittedAt), desc(submissions.id))
}

/** The active measuring tasks of characteristics. */
export async function selectActiveTasks(
  tenant: Tenant,
  characteristicIds: readonly string[],
): Promise<{ id: string; characteristicId: string }[]> {
  if (characteristicIds.length === 0) return []
  const side = tenant.side === 'supplier' ? measuringTasks.supplierOrgId : measuringTasks.customerOrgId
  return tenant.tx
    .select({ id: measuringTasks.id, characteristicId: measuringTasks.characteristicId })
    .from(measuringTasks)
    .where(
      and(
        eq(side, tenant.organisationId),
        inArray(measuringTasks.characteristicId, [...characteristicIds]),
        isNull(measuringTasks.archivedAt),
      ),
    )
}
