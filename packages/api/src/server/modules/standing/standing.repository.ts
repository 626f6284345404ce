import { and, asc, eq, gt, inArray, isNotNull, isNull, sql, type AnyColumn } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import { acceptedStates } from '../../../contract/moves/submission'
import { defaultTerms, resolvedTermsSchema } from '../../../contract/terms'
import type { StandingTerms } from '../../../contract/standing'
import type { Tenant } from '../../db/tenant'
import { ownSide } from '../../db/own-side'
import { characteristics, partRevisions } from '../parts/parts.table'
import { conditions, decisions } from '../reviews/reviews.table'
import { relationships } from '../relationships/relationships.table'
import { submissions, submissionTexts } from '../submissions/submissions.table'
import { carryOvers, reinstatements, standingCalibrations, standingEvents } from './standing.table'

/** The limits that were accepted, as frozen in the submission. */
export interface AcceptedLimits {
  nominal: string | null
  lowerLimit: string | null
  upperLimit: string | null
  unit: string
  class: string
}

export interface AcceptedRow {
  submissionId: string
  timeZone: string
  acceptedAt: string
  terms: StandingTerms
  limits: AcceptedLimits
}

/** Accepted submissions of this side with the terms and limits frozen in them. */
export async function selectAccepted(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<AcceptedRow[]> {
  if (submissionIds.length === 0) return []
  const frozen = (part: string) =>
    sql<string | null>`(select (f.text::json -> ${part})::text from ${submissionTexts} f
      where f.relationship_id = ${submissions.relationshipId} and f.submission_id = ${submissions.id}
      order by f.revision desc limit 1)`
  const rows = await tenant.tx
    .select({
      submissionId: submissions.id,
      timeZone: relationships.timeZone,
      acceptedAt: submissions.decidedAt,
      terms: frozen('terms'),
      limits: frozen('characteristic'),
    })
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, submissions.relationshipId))
    .where(
      and(
        ownSide(tenant, submissions),
        inArray(submissions.id, [...submissionIds]),
        inArray(submissions.state, [...acceptedStates]),
        isNotNull(submissions.decidedAt),
      ),
    )
  return rows.flatMap(({ acceptedAt, terms, limits, ...row }) =>
    acceptedAt === null || limits === null
      ? []
      : [
          {
            ...row,
            acceptedAt,
            terms: terms === null ? defaultTerms : resolvedTermsSchema.parse(JSON.parse(terms)),
            limits: JSON.parse(limits) as AcceptedLimits,
          },
        ],
  )
}

const factsOf = (
  tenant: Tenant,
  table: { supplierOrgId: AnyColumn; customerOrgId: AnyColumn; submissionId: AnyColumn },
  submissionIds: readonly string[],
) => and(ownSide(tenant, table), inArray(table.submissionId, [...submissionIds]))

/** Conditions of the final decisions on submissions. */
export async function selectConditions(tenant: Tenant, submissionIds: readonly string[]) {
  const { submissionId, dueOn, confirmedAt } = conditions
  return tenant.tx
    .select({ submissionId, dueOn, confirmedAt })
    .from(conditions)
    .innerJoin(
      decisions,
      and(eq(decisions.relationshipId, conditions.relationshipId), eq(decisions.id, conditions.decisionId)),
    )
    .where(and(factsOf(tenant, conditions, submissionIds), eq(decisions.state, 'final')))
}

/** Every accepted submission of this side. */
export async function selectAcceptedIds(tenant: Tenant): Promise<string[]> {
  const rows = await tenant.tx
    .select({ id: submissions.id })
    .from(submissions)
    .where(and(ownSide(tenant, submissions), inArray(submissions.state, [...acceptedStates])))
  return rows.map(({ id }) => id)
}

export type CalibrationFactRow = typeof standingCalibrations.$inferSelect

/** Calibrations that the submissions rest on, in the order they were entered. */
export async function selectCalibrationFacts(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<CalibrationFactRow[]> {
  return tenant.tx
    .select()
    .from(standingCalibrations)
    .where(factsOf(tenant, standingCalibrations, submissionIds))
    .orderBy(asc(standingCalibrations.enteredAt), asc(standingCalibrations.id))
}

export type EventFactRow = typeof standingEvents.$inferSelect

/** Events of gauges that concern the submissions, in the order they were reported. */
export async function selectEventFacts(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<EventFactRow[]> {
  return tenant.tx
    .select()
    .from(standingEvents)
    .where(factsOf(tenant, standingEvents, submissionIds))
    .orderBy(asc(standingEvents.enteredAt), asc(standingEvents.id))
}

export type ReinstatementRow = typeof reinstatements.$inferSelect

export async function selectReinstatements(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<ReinstatementRow[]> {
  return tenant.tx
    .select()
    .from(reinstatements)
    .where(factsOf(tenant, reinstatements, submissionIds))
    .orderBy(asc(reinstatements.reinstatedAt), asc(reinstatements.id))
}

export type CarryOverRow = typeof carryOvers.$inferSelect

export async function selectCarryOvers(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<CarryOverRow[]> {
  return tenant.tx
    .select()
    .from(carryOvers)
    .where(factsOf(tenant, carryOvers, submissionIds))
    .orderBy(asc(carryOvers.carriedAt), asc(carryOvers.id))
}

/**
 * The revisions of the parts that came after the accepted ones, in order, each with its characteristic of the same
 * number, where it has one.
 */
export async function selectNewerRevisions(tenant: Tenant, submissionIds: readonly string[]) {
  const own = alias(characteristics, 'own')
  const ownRevision = alias(partRevisions, 'own_revision')
  const { id, label, sequence, createdAt, relationshipId, partId } = partRevisions
  return tenant.tx
    .select({
      submissionId: submissions.id,
      revision: { id, label, createdAt },
      characteristic: characteristics,
    })
    .from(submissions)
    .innerJoin(
      own,
      and(eq(own.relationshipId, submissions.relationshipId), eq(own.id, submissions.characteristicId)),
    )
    .innerJoin(
      ownRevision,
      and(eq(ownRevision.relationshipId, own.relationshipId), eq(ownRevision.id, own.revisionId)),
    )
    .innerJoin(
      partRevisions,
      and(eq(relationshipId, own.relationshipId), eq(partId, own.partId), gt(sequence, ownRevision.sequence)),
    )
    .leftJoin(
      characteristics,
      and(
        eq(characteristics.relationshipId, relationshipId),
        eq(characteristics.revisionId, id),
        eq(characteristics.number, own.number),
        isNull(characteristics.archivedAt),
      ),
    )
    .where(and(ownSide(tenant, submissions), inArray(submissions.id, [...submissionIds])))
    .orderBy(asc(sequence))
}
