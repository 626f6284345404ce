import { and, asc, desc, eq, inArray, max, sql } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { measuringTasks } from '../parts/parts.table'
import { studies, studyData, studyEvaluations, studyTasks } from './studies.table'

export type StudyRow = typeof studies.$inferSelect
export type StudyTaskRow = typeof studyTasks.$inferSelect
export type StudyDataRow = typeof studyData.$inferSelect
export type StudyEvaluationRow = typeof studyEvaluations.$inferSelect

const own = (tenant: Tenant) => eq(studies.orgId, tenant.organisationId)
const tasksOfStudy = and(eq(studyTasks.orgId, studies.orgId), eq(studyTasks.studyId, studies.id))

export async function selectStudy(tenant: Tenant, studyId: string): Promise<StudyRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(studies)
    .where(and(own(tenant), eq(studies.id, studyId)))
  return row
}

/** Studies by their codes, abandoned ones too. */
export async function selectStudiesCoded(tenant: Tenant, codes: readonly string[]): Promise<StudyRow[]> {
  if (codes.length === 0) return []
  return tenant.tx
    .select()
    .from(studies)
    .where(and(own(tenant), inArray(studies.code, [...codes])))
}

/** Tasks of a study in a fixed order. */
export async function selectTasksOf(tenant: Tenant, studyId: string): Promise<StudyTaskRow[]> {
  return tenant.tx
    .select()
    .from(studyTasks)
    .where(and(eq(studyTasks.orgId, tenant.organisationId), eq(studyTasks.studyId, studyId)))
    .orderBy(asc(studyTasks.taskId))
}

/** Revisions of a study's readings, the newest first. */
export async function selectRevisions(tenant: Tenant, studyId: string): Promise<StudyDataRow[]> {
  return tenant.tx
    .select()
    .from(studyData)
    .where(and(eq(studyData.orgId, tenant.organisationId), eq(studyData.studyId, studyId)))
    .orderBy(desc(studyData.revision))
}

/** Computed studies of a task, each with its newest complete revision; the newest study first. */
export async function selectResults(tenant: Tenant, taskId: string) {
  return tenant.tx
    .select({ study: studies, task: studyTasks, data: studyData })
    .from(studyTasks)
    .innerJoin(studies, tasksOfStudy)
    .innerJoin(
      studyData,
      and(
        eq(studyData.orgId, studies.orgId),
        eq(studyData.studyId, studies.id),
        sql`${studyData.revision} = (select max(d.revision) from study_data d where d.org_id = ${studies.orgId} and d.study_id = ${studies.id} and d.complete)`,
      ),
    )
    .where(and(own(tenant), eq(studyTasks.taskId, taskId), eq(studies.state, 'computed')))
    .orderBy(desc(studies.registeredAt), desc(studies.id))
}

/** Every study registered on any of the tasks, in the order of registration on each. */
export async function selectAttempts(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<{ study: StudyRow; task: StudyTaskRow }[]> {
  if (taskIds.length === 0) return []
  return tenant.tx
    .select({ study: studies, task: studyTasks })
    .from(studyTasks)
    .innerJoin(studies, tasksOfStudy)
    .where(and(own(tenant), inArray(studyTasks.taskId, [...taskIds])))
    .orderBy(asc(studyTasks.attempt))
}

/**
 * The number of the next attempt on each task. The tasks stay locked until the transaction ends, so that two studies
 * registered at once count one after the other.
 */
export async function nextAttempts(tenant: Tenant, taskIds: readonly string[]): Promise<Map<string, number>> {
  await tenant.tx
    .select({ id: measuringTasks.id })
    .from(measuringTasks)
    .where(
      and(eq(measuringTasks.supplierOrgId, tenant.organisationId), inArray(measuringTasks.id, [...taskIds])),
    )
    .orderBy(asc(measuringTasks.id))
    .for('no key update')
  const rows = await tenant.tx
    .select({ taskId: studyTasks.taskId, last: max(studyTasks.attempt) })
    .from(studyTasks)
    .where(and(eq(studyTasks.orgId, tenant.organisationId), inArray(studyTasks.taskId, [...taskIds])))
    .groupBy(studyTasks.taskId)
  const last = new Map(rows.map((row) => [row.taskId, row.last ?? 0]))
  return new Map(taskIds.map((taskId) => [taskId, (last.get(taskId) ?? 0) + 1]))
}

export async function insertStudy(
  tenant: Tenant,
  row: Omit<typeof studies.$inferInsert, 'orgId'>,
): Promise<StudyRow> {
  const [inserted] = await tenant.tx
    .insert(studies)
    .values({ ...row, orgId: tenant.organisationId })
    .returning()
  if (!inserted) throw new Error('The study was not stored.')
  return inserted
}

export async function insertStudyTasks(
  tenant: Tenant,
  rows: readonly Omit<typeof studyTasks.$inferInsert, 'orgId'>[],
): Promise<void> {
  await tenant.tx.insert(studyTasks).values(rows.map((row) => ({ ...row, orgId: tenant.organisationId })))
}

/** Changes a study that still has the version the sender saw; undefined where it has not. */
export async function updateStudy(
  tenant: Tenant,
  studyId: string,
  expectedVersion: number,
  values: Partial<Pick<StudyRow, 'state' | 'collectedOn' | 'abandonedAt' | 'abandonReason'>>,
): Promise<StudyRow | undefined> {
  const [updated] = await tenant.tx
    .update(studies)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(and(own(tenant), eq(studies.id, studyId), eq(studies.rowVersion, expectedVersion)))
    .returning()
  return updated
}

export async function insertRevision(tenant: Tenant, row: StudyDataRow): Promise<void> {
  await tenant.tx.insert(studyData).values(row)
}

export async function insertEvaluations(
  tenant: Tenant,
  rows: readonly Omit<typeof studyEvaluations.$inferInsert, 'orgId'>[],
): Promise<void> {
  if (rows.length === 0) return
  await tenant.tx
    .insert(studyEvaluations)
    .values(rows.map((row) => ({ ...row, orgId: tenant.organisationId })))
}

/** Evaluations of one revision, by task and clause. */
export async function selectEvaluations(tenant: Tenant, dataId: string): Promise<StudyEvaluationRow[]> {
  return tenant.tx
    .select()
    .from(studyEvaluations)
    .where(and(eq(studyEvaluations.orgId, tenant.organisationId), eq(studyEvaluations.dataId, dataId)))
    .orderBy(asc(studyEvaluations.taskId), asc(studyEvaluations.clauseKey))
}
