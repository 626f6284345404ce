import { and, eq, inArray, isNull, not, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import { acceptedStates } from '../../../contract/moves/submission'
import type { listRequestChoices } from '../../../contract/requests'
import { containing, orderOf, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { characteristics, measuringTasks, parts } from '../parts/parts.table'
import { fromTasks, ownTasks } from '../parts/tasks.repository'
import { submissions } from '../submissions/submissions.table'

/** Whether an accepted submission of the task stands; `fallen` are the accepted ones that do not. */
const hasProof = (fallen: readonly string[]) => sql<boolean>`exists (select 1 from ${submissions} s
  where s.relationship_id = ${measuringTasks.relationshipId} and s.task_id = ${measuringTasks.id}
    and ${inArray(sql`s.state`, [...acceptedStates])}
    and s.id <> all (${sql.param([...fallen])}::uuid[]))`

/** One page of a supplier's active tasks; those without proof that stands first, unless asked otherwise. */
export async function selectChoices(
  tenant: Tenant,
  query: QueryOf<typeof listRequestChoices>,
  fallen: readonly string[],
) {
  const hasAccepted = hasProof(fallen)
  const { gaugeCode, gaugeName, site, processStep } = measuringTasks
  const sorts = {
    proof: hasAccepted,
    part: parts.number,
    characteristic: characteristics.number,
    gauge: gaugeCode,
  }
  return fromTasks(tenant)
    .where(
      and(
        ownTasks(tenant),
        eq(measuringTasks.relationshipId, query.relationshipId),
        isNull(measuringTasks.archivedAt),
        query.partId ? eq(measuringTasks.partId, query.partId) : undefined,
        query.class ? eq(characteristics.class, query.class) : undefined,
        query.proof === 'accepted' ? hasAccepted : undefined,
        query.proof === 'missing' ? not(hasAccepted) : undefined,
        containing(query.search, parts.number, characteristics.name, gaugeCode, gaugeName, site, processStep),
      ),
    )
    .orderBy(...orderOf(sorts, query.sort, parts.number), characteristics.number, measuringTasks.id)
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}
