import { and, asc, eq, inArray } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { agreementVersions } from '../agreements/agreements.table'
import type { SubmissionRow } from './submissions.repository'
import { submissionNotes, submissionStudies } from './submissions.table'

type Key = Pick<SubmissionRow, 'relationshipId' | 'id'>

export type ChosenStudy = Pick<typeof submissionStudies.$inferSelect, 'studyId' | 'dataId'>

/** The studies a submission rests on. */
export async function selectChosen(tenant: Tenant, submissionId: string): Promise<ChosenStudy[]> {
  return tenant.tx
    .select({ studyId: submissionStudies.studyId, dataId: submissionStudies.dataId })
    .from(submissionStudies)
    .where(
      and(
        eq(submissionStudies.orgId, tenant.organisationId),
        eq(submissionStudies.submissionId, submissionId),
      ),
    )
}

/** Puts another choice in the place of the studies a submission rests on. */
export async function replaceChosen(
  tenant: Tenant,
  { relationshipId, id }: Key,
  chosen: readonly ChosenStudy[],
): Promise<void> {
  const { tx, organisationId: orgId } = tenant
  await tx
    .delete(submissionStudies)
    .where(and(eq(submissionStudies.orgId, orgId), eq(submissionStudies.submissionId, id)))
  if (chosen.length > 0)
    await tx
      .insert(submissionStudies)
      .values(chosen.map((each) => ({ ...each, orgId, relationshipId, submissionId: id })))
}

/** What this organisation's people said to each other before signing, the oldest first. */
export async function selectNotes(tenant: Tenant, submissionId: string) {
  return tenant.tx
    .select()
    .from(submissionNotes)
    .where(
      and(eq(submissionNotes.orgId, tenant.organisationId), eq(submissionNotes.submissionId, submissionId)),
    )
    .orderBy(asc(submissionNotes.createdAt), asc(submissionNotes.id))
}

export async function insertNote(tenant: Tenant, { relationshipId, id }: Key, text: string): Promise<void> {
  const { organisationId: orgId, userId, now: createdAt } = tenant
  await tenant.tx
    .insert(submissionNotes)
    .values({ orgId, relationshipId, submissionId: id, userId, text, createdAt })
}

/** The first day in force of each version. */
export async function selectEffectiveDays(
  { tx }: Tenant,
  relationshipId: string,
  versionIds: readonly string[],
): Promise<Map<string, string>> {
  if (versionIds.length === 0) return new Map()
  const rows = await tx
    .select({ id: agreementVersions.id, effectiveOn: agreementVersions.effectiveOn })
    .from(agreementVersions)
    .where(
      and(
        eq(agreementVersions.relationshipId, relationshipId),
        inArray(agreementVersions.id, [...versionIds]),
      ),
    )
  return new Map(rows.flatMap(({ id, effectiveOn }) => (effectiveOn ? [[id, effectiveOn] as const] : [])))
}
