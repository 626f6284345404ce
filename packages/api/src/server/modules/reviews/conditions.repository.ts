import { and, asc, eq, inArray } from 'drizzle-orm'
import type { ConditionAsked } from '../../../contract/conditions'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { conditionReports, conditions } from './reviews.table'

export type ConditionRow = typeof conditions.$inferSelect
export type ConditionReportRow = typeof conditionReports.$inferSelect
type Key = Pick<SubmissionRow, 'relationshipId' | 'id'>

/** Conditions of every decision on a submission, in the order of their numbers. */
export async function selectConditions({ tx }: Tenant, { relationshipId, id }: Key): Promise<ConditionRow[]> {
  return tx
    .select()
    .from(conditions)
    .where(and(eq(conditions.relationshipId, relationshipId), eq(conditions.submissionId, id)))
    .orderBy(asc(conditions.number))
}

export async function selectReports(
  { tx }: Tenant,
  { relationshipId }: Pick<Key, 'relationshipId'>,
  conditionIds: readonly string[],
): Promise<ConditionReportRow[]> {
  if (conditionIds.length === 0) return []
  return tx
    .select()
    .from(conditionReports)
    .where(
      and(
        eq(conditionReports.relationshipId, relationshipId),
        inArray(conditionReports.conditionId, [...conditionIds]),
      ),
    )
    .orderBy(asc(conditionReports.createdAt), asc(conditionReports.id))
}

export async function insertConditions(
  { tx }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: SubmissionRow,
  decisionId: string,
  asked: readonly ConditionAsked[],
): Promise<void> {
  if (asked.length === 0) return
  await tx.insert(conditions).values(
    asked.map(({ text, dueOn, owner, followUp }, at) => ({
      ...{ submissionId: id, relationshipId, supplierOrgId, customerOrgId, decisionId },
      ...{ number: at + 1, text, dueOn, owner, followUp, state: 'open' as const },
    })),
  )
}

/** Changes a condition whose submission is locked. */
export async function updateCondition(
  { tx }: Tenant,
  { relationshipId, id, rowVersion }: ConditionRow,
  values: Pick<ConditionRow, 'state' | 'confirmedAt'>,
): Promise<ConditionRow> {
  const [updated] = await tx
    .update(conditions)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(and(eq(conditions.relationshipId, relationshipId), eq(conditions.id, id)))
    .returning()
  if (!updated) throw new Error('The condition was not stored.')
  return updated
}

export async function insertReport(
  { tx, side, userId, now }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: ConditionRow,
  report: Pick<ConditionReportRow, 'move' | 'text'>,
): Promise<ConditionReportRow> {
  const [inserted] = await tx
    .insert(conditionReports)
    .values({
      ...{ conditionId: id, relationshipId, supplierOrgId, customerOrgId },
      ...{ side, userId, createdAt: now },
      ...report,
    })
    .returning()
  if (!inserted) throw new Error('The report was not stored.')
  return inserted
}
