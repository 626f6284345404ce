import { and, eq, inArray, isNotNull, sql } from 'drizzle-orm'
import type { SubmissionQuery, SubmissionSort } from '../../../contract/submissions'
import { submissionStates, waitsOn } from '../../../contract/moves/submission'
import { verdictSchema } from '../../../contract/submission-content'
import { ownSide } from '../../db/own-side'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { characteristics, measuringTasks, partRevisions, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { submissions } from './submissions.table'

const place = (values: readonly string[], column: typeof submissions.state | typeof submissions.verdict) =>
  sql`array_position(${sql.param([...values])}::text[], ${column})`

const columns = {
  // The longer it stands where it is, the older: ages rise as instants fall.
  age: sql`-extract(epoch from ${submissions.stateSince})`,
  number: submissions.number,
  submitted: submissions.submittedAt,
  gauge: measuringTasks.gaugeCode,
  part: parts.number,
  other: organisations.name,
  state: place(submissionStates, submissions.state),
  verdict: place(verdictSchema.options, submissions.verdict),
  clauses: sql`${submissions.clausesMet}::float8 / nullif(${submissions.clausesTotal}, 0)`,
} satisfies Record<SubmissionSort, unknown>

export type SubmissionListed = Awaited<ReturnType<typeof selectSubmissions>>[number]

/**
 * One page of submissions in one query; every row carries the total. What waits for somebody comes oldest first,
 * the whole list with what moved last on top, unless another order is asked for.
 */
export async function selectSubmissions(
  tenant: Tenant,
  query: SubmissionQuery,
  /** Only these; without them all. */
  ids?: readonly string[],
) {
  const { relationshipId, taskId, partId } = submissions
  const other = tenant.side === 'supplier' ? submissions.customerOrgId : submissions.supplierOrgId
  const waiting = submissionStates.filter((state) => waitsOn[state] === query.waitsOn)
  return tenant.tx
    .select({
      submission: submissions,
      task: measuringTasks,
      characteristic: characteristics,
      partNumber: parts.number,
      revision: partRevisions.label,
      other: { id: organisations.id, name: organisations.name },
      timeZone: relationships.timeZone,
      total: totalOverPages,
    })
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, relationshipId))
    .innerJoin(organisations, eq(organisations.id, other))
    .innerJoin(
      measuringTasks,
      and(eq(measuringTasks.relationshipId, relationshipId), eq(measuringTasks.id, taskId)),
    )
    .innerJoin(
      characteristics,
      and(
        eq(characteristics.relationshipId, relationshipId),
        eq(characteristics.id, submissions.characteristicId),
      ),
    )
    .innerJoin(parts, and(eq(parts.relationshipId, relationshipId), eq(parts.id, partId)))
    .innerJoin(
      partRevisions,
      and(eq(partRevisions.relationshipId, relationshipId), eq(partRevisions.id, characteristics.revisionId)),
    )
    .where(
      and(
        ownSide(tenant, submissions),
        tenant.side === 'customer' ? isNotNull(submissions.submittedAt) : undefined,
        ids ? inArray(submissions.id, [...ids]) : undefined,
        query.state ? eq(submissions.state, query.state) : undefined,
        query.criteria ? eq(submissions.criteria, query.criteria) : undefined,
        query.waitsOn ? inArray(submissions.state, waiting) : undefined,
        query.verdict ? eq(submissions.verdict, query.verdict) : undefined,
        query.safety ? eq(submissions.safety, query.safety === 'true') : undefined,
        query.taskId ? eq(taskId, query.taskId) : undefined,
        query.partId ? eq(partId, query.partId) : undefined,
        query.relationshipId ? eq(relationshipId, query.relationshipId) : undefined,
        containing(
          query.search,
          sql`${submissions.number}::text`,
          measuringTasks.gaugeCode,
          measuringTasks.gaugeName,
          parts.number,
          parts.supplierNumber,
          characteristics.name,
          organisations.name,
        ),
      ),
    )
    .orderBy(...orderOf(columns, query.sort ?? (query.waitsOn ? '-age' : 'age'), submissions.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}
