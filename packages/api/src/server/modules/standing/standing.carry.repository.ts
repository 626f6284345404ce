import { and, asc, eq, inArray, lt } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import { acceptedStates } from '../../../contract/moves/submission'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import type { PartRow } from '../parts/parts.repository'
import { characteristics, measuringTasks, partRevisions } from '../parts/parts.table'
import type { RevisionRow } from '../parts/revisions.repository'
import { submissions } from '../submissions/submissions.table'
import { carryOvers } from './standing.table'

const own = alias(characteristics, 'own')

export type EarlierAcceptance = Awaited<ReturnType<typeof selectEarlierAcceptances>>[number]

/** Accepted submissions of the revisions before one, by number on the drawing; a part has a few dozen at most. */
export async function selectEarlierAcceptances(tenant: Tenant, part: PartRow, current: RevisionRow) {
  return tenant.tx
    .select({
      submission: submissions,
      task: measuringTasks,
      characteristic: own,
      revision: partRevisions,
    })
    .from(submissions)
    .innerJoin(
      own,
      and(eq(own.relationshipId, submissions.relationshipId), eq(own.id, submissions.characteristicId)),
    )
    .innerJoin(
      partRevisions,
      and(eq(partRevisions.relationshipId, own.relationshipId), eq(partRevisions.id, own.revisionId)),
    )
    .innerJoin(
      measuringTasks,
      and(
        eq(measuringTasks.relationshipId, submissions.relationshipId),
        eq(measuringTasks.id, submissions.taskId),
      ),
    )
    .where(
      and(
        ownSide(tenant, submissions),
        eq(submissions.relationshipId, part.relationshipId),
        eq(submissions.partId, part.id),
        inArray(submissions.state, [...acceptedStates]),
        lt(partRevisions.sequence, current.sequence),
      ),
    )
    .orderBy(asc(own.number), asc(submissions.number))
}

/** The frozen task of an acceptance that was carried over to a characteristic, to be matched with the new task. */
export async function selectCarriedTo(tenant: Tenant, characteristicIds: readonly string[]) {
  if (characteristicIds.length === 0) return []
  return tenant.tx
    .select({
      characteristicId: carryOvers.characteristicId,
      submissionId: submissions.id,
      state: submissions.state,
      gaugeId: measuringTasks.gaugeId,
      site: measuringTasks.site,
      processStep: measuringTasks.processStep,
    })
    .from(carryOvers)
    .innerJoin(
      submissions,
      and(
        eq(submissions.relationshipId, carryOvers.relationshipId),
        eq(submissions.id, carryOvers.submissionId),
      ),
    )
    .innerJoin(
      measuringTasks,
      and(
        eq(measuringTasks.relationshipId, submissions.relationshipId),
        eq(measuringTasks.id, submissions.taskId),
      ),
    )
    .where(and(ownSide(tenant, carryOvers), inArray(carryOvers.characteristicId, [...characteristicIds])))
}

/** Every accepted submission of a part. */
export async function selectAcceptedOfPart(tenant: Tenant, part: PartRow): Promise<string[]> {
  const rows = await tenant.tx
    .select({ id: submissions.id })
    .from(submissions)
    .where(
      and(
        ownSide(tenant, submissions),
        eq(submissions.relationshipId, part.relationshipId),
        eq(submissions.partId, part.id),
        inArray(submissions.state, [...acceptedStates]),
      ),
    )
  return rows.map(({ id }) => id)
}
