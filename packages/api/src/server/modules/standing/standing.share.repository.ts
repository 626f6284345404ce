import { and, asc, eq, inArray, isNotNull, sql } from 'drizzle-orm'
import { acceptedStates, underReview } from '../../../contract/moves/submission'
import type { Tenant } from '../../db/tenant'
import type { CalibratedThing } from '../gauges/calibrations.repository'
import { gauges, referenceStandards } from '../gauges/gauges.table'
import { organisations } from '../organisations/organisations.table'
import { characteristics, measuringTasks, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { studies, studyData } from '../studies/studies.table'
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

/** A gauge or reference standard by the code that both sides know. */
export interface NamedThing {
  thing: CalibratedThing
  code: string
}

/** The gauge of a submission's task and the standards of its studies, and the first day of its readings. */
export async function selectEquipment(
  { tx, organisationId }: Tenant,
  { id, relationshipId, taskId }: Pick<typeof submissions.$inferSelect, 'id' | 'relationshipId' | 'taskId'>,
): Promise<{ things: NamedThing[]; readingsSince: string | null }> {
  const ofTask = await tx
    .select({ id: gauges.id, code: gauges.code })
    .from(measuringTasks)
    .innerJoin(
      gauges,
      and(eq(gauges.orgId, measuringTasks.supplierOrgId), eq(gauges.id, measuringTasks.gaugeId)),
    )
    .where(and(eq(measuringTasks.relationshipId, relationshipId), eq(measuringTasks.id, taskId)))
  const ofStudies = await tx
    .select({ id: referenceStandards.id, code: referenceStandards.code, collectedOn: studyData.collectedOn })
    .from(submissionStudies)
    .innerJoin(
      studies,
      and(eq(studies.orgId, submissionStudies.orgId), eq(studies.id, submissionStudies.studyId)),
    )
    .innerJoin(
      studyData,
      and(eq(studyData.orgId, submissionStudies.orgId), eq(studyData.id, submissionStudies.dataId)),
    )
    .innerJoin(
      referenceStandards,
      and(eq(referenceStandards.orgId, studies.orgId), eq(referenceStandards.id, studies.standardId)),
    )
    .where(and(eq(submissionStudies.orgId, organisationId), eq(submissionStudies.submissionId, id)))
  const standards = new Map(ofStudies.map((each) => [each.id, each]))
  return {
    things: [
      ...ofTask.map((gauge) => ({ thing: { gaugeId: gauge.id }, code: gauge.code })),
      ...[...standards.values()].map((each) => ({ thing: { standardId: each.id }, code: each.code })),
    ],
    readingsSince: ofStudies.map(({ collectedOn }) => collectedOn).sort()[0] ?? null,
  }
}
