import { and, asc, eq, inArray, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listStudies } from '../../../contract/studies'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { referenceStandards } from '../gauges/gauges.table'
import { organisations } from '../organisations/organisations.table'
import { studies, studyData, studyEvaluations, studyTasks } from './studies.table'

const ofNewest = (condition: string) =>
  sql.raw(
    `(select max(d.revision) from study_data d where d.org_id = studies.org_id and d.study_id = studies.id${condition})`,
  )

/** One page of studies with gauge, standard and size; every row carries the total. */
export async function selectStudies(tenant: Tenant, query: QueryOf<typeof listStudies>) {
  const gaugeCode = sql<string>`${studies.gauge}->>'code'`
  const gaugeName = sql<string>`${studies.gauge}->>'name'`
  const { code, state, registeredAt, collectedOn } = studies
  const served = sql<string>`(select string_agg(concat_ws(' ', t.characteristic->>'partNumber', t.characteristic->>'name'), ' ') from study_tasks t where t.org_id = ${studies.orgId} and t.study_id = ${studies.id})`
  return tenant.tx
    .select({
      study: studies,
      standardCode: referenceStandards.code,
      readings: sql<number>`coalesce((select cardinality(d.values) from study_data d where d.org_id = ${studies.orgId} and d.study_id = ${studies.id} and d.revision = ${ofNewest('')}), 0)`,
      total: totalOverPages,
    })
    .from(studies)
    .innerJoin(
      referenceStandards,
      and(eq(referenceStandards.orgId, studies.orgId), eq(referenceStandards.id, studies.standardId)),
    )
    .where(
      and(
        eq(studies.orgId, tenant.organisationId),
        query.state ? eq(state, query.state) : undefined,
        query.gaugeId ? eq(studies.gaugeId, query.gaugeId) : undefined,
        query.taskId
          ? sql`exists (select 1 from study_tasks t where t.org_id = ${studies.orgId} and t.study_id = ${studies.id} and t.task_id = ${query.taskId})`
          : undefined,
        containing(query.search, code, gaugeCode, gaugeName, served),
      ),
    )
    .orderBy(...orderOf({ registeredAt, code, state, gauge: gaugeCode, collectedOn }, query.sort, studies.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** The tasks of the studies on a page, each with the customer's name. */
export async function selectTasksOfStudies({ tx, organisationId }: Tenant, studyIds: readonly string[]) {
  if (studyIds.length === 0) return []
  return tx
    .select({
      studyId: studyTasks.studyId,
      taskId: studyTasks.taskId,
      attempt: studyTasks.attempt,
      characteristic: studyTasks.characteristic,
      customerName: organisations.name,
    })
    .from(studyTasks)
    .innerJoin(organisations, eq(organisations.id, studyTasks.customerOrgId))
    .where(and(eq(studyTasks.orgId, organisationId), inArray(studyTasks.studyId, [...studyIds])))
    .orderBy(asc(studyTasks.taskId))
}

/** How many clauses of the newest complete readings have which verdict, by study. */
export async function selectVerdicts({ tx, organisationId }: Tenant, studyIds: readonly string[]) {
  if (studyIds.length === 0) return []
  return tx
    .select({
      studyId: studies.id,
      verdict: studyEvaluations.verdict,
      count: sql<number>`count(*)::integer`,
    })
    .from(studies)
    .innerJoin(
      studyData,
      and(
        eq(studyData.orgId, studies.orgId),
        eq(studyData.studyId, studies.id),
        sql`${studyData.revision} = ${ofNewest(' and d.complete')}`,
      ),
    )
    .innerJoin(
      studyEvaluations,
      and(eq(studyEvaluations.orgId, studies.orgId), eq(studyEvaluations.dataId, studyData.id)),
    )
    .where(and(eq(studies.orgId, organisationId), inArray(studies.id, [...studyIds])))
    .groupBy(studies.id, studyEvaluations.verdict)
}
