import { and, desc, inArray, isNotNull, isNull } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { submissions } from '../submissions/submissions.table'
import { measuringTasks } from './parts.table'

/** The submissions that were ever put before the customer, the newest first, by task. */
export async function selectSubmissionStates({ tx }: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  return tx
    .select({ id: submissions.id, taskId: submissions.taskId, state: submissions.state })
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
  return tenant.tx
    .select({ id: measuringTasks.id, characteristicId: measuringTasks.characteristicId })
    .from(measuringTasks)
    .where(
      and(
        ownSide(tenant, measuringTasks),
        inArray(measuringTasks.characteristicId, [...characteristicIds]),
        isNull(measuringTasks.archivedAt),
      ),
    )
}

/** What tells whether a measuring task of a newer revision is the one that was proved for the revision before. */
export async function selectPlacesOfTasks(tenant: Tenant, taskIds: readonly string[]) {
  if (taskIds.length === 0) return []
  const { id, characteristicId, gaugeId, site, processStep } = measuringTasks
  return tenant.tx
    .select({ id, characteristicId, gaugeId, site, processStep })
    .from(measuringTasks)
    .where(and(ownSide(tenant, measuringTasks), inArray(id, [...taskIds])))
}
