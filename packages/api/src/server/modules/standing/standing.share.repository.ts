import { and, asc, eq, inArray, isNotNull, sql } from 'drizzle-orm'
import { acceptedStates, underReview } from '../../../contract/moves/submission'
import type { Tenant } from '../../db/tenant'
import type { CalibratedThing } from '../gauges/calibrations.repository'
import { organisations } from '../organisations/organisations.table'
import { characteristics, measuringTasks, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { studies } from '../studies/studies.table'
import { submissions, submissionStudies } from '../submissions/submissions.table'
import { standingCalibrations, standingEvents } from './standing.table'

export type ConcernedSubmission = Awaited<ReturnType<typeof selectConcerned>>[number]

/**
 * Signed submissions of the supplier that rest on a gauge or a reference standard and still count for something:
 * under review or accepted.
 */
export async function selectConcerned({ tx, organisationId }: Tenant, thing: CalibratedThing) {
  const rests =
    'gaugeId' in thing
      ? eq(measuringTasks.gaugeId, thing.gaugeId)
      : sql`exists (select 1 from ${submissionStudies} k join ${studies} s on s.org_id = k.org_id and s.id = k.study_id
          where k.org_id = ${organisationId} and k.submission_id = ${submissions.id} and s.standard_id = ${thing.standardId})`
  return tx
    .select({
      submission: submissions,
      timeZone: relationships.timeZone,
      customer: organisations.name,
      gaugeCode: measuringTasks.gaugeCode,
      partNumber: parts.number,
      characteristicNumber: characteristics.number,
      characteristicName: characteristics.name,
    })
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, submissions.relationshipId))
    .innerJoin(organisations, eq(organisations.id, submissions.customerOrgId))
    .innerJoin(
      measuringTasks,
      and(
        eq(measuringTasks.relationshipId, submissions.relationshipId),
        eq(measuringTasks.id, submissions.taskId),
      ),
    )
    .innerJoin(
      parts,
      and(eq(parts.relationshipId, submissions.relationshipId), eq(parts.id, submissions.partId)),
    )
    .innerJoin(
      characteristics,
      and(
        eq(characteristics.relationshipId, submissions.relationshipId),
        eq(characteristics.id, submissions.characteristicId),
      ),
    )
    .where(
      and(
        eq(submissions.supplierOrgId, organisationId),
        isNotNull(submissions.submittedAt),
        inArray(submissions.state, [...acceptedStates, ...underReview]),
        rests,
      ),
    )
    .orderBy(asc(organisations.name), asc(submissions.number), asc(submissions.id))
}

type Shared = 'relationshipId' | 'supplierOrgId' | 'customerOrgId'

/** What of a submission a row about it carries. */
export const keyOf = ({
  id: submissionId,
  relationshipId,
  supplierOrgId,
  customerOrgId,
}: Pick<typeof submissions.$inferSelect, 'id' | Shared>) => ({
  submissionId,
  relationshipId,
  supplierOrgId,
  customerOrgId,
})

/** Tells submissions of calibrations that found their equipment within limits; each once. */
export async function insertCalibrationFacts(
  { tx }: Tenant,
  rows: (typeof standingCalibrations.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(standingCalibrations).values(rows).onConflictDoNothing()
}

/** Tells submissions of events of their gauge; each once. */
export async function insertEventFacts(
  { tx }: Tenant,
  rows: (typeof standingEvents.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(standingEvents).values(rows).onConflictDoNothing()
}
