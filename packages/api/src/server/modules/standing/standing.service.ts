import { standingOf, type Standing, type StandingState } from '../../../contract/standing'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectAcceptedIds } from './standing.repository'
import { standingFactsOf } from './standing.facts'

/**
 * How accepted submissions stand today, each in its relationship's calendar. Submissions that are not accepted, and
 * those of others, are not in the answer.
 */
export async function standingsOf(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<Map<string, Standing>> {
  const found = await standingFactsOf(tenant, submissionIds)
  return new Map(
    found.map(({ submissionId, timeZone, facts }) => [
      submissionId,
      standingOf(facts, dayIn(timeZone, tenant.now)),
    ]),
  )
}

/** The accepted submissions of this side that stand in this way today, for filters. */
export async function submissionsThat(tenant: Tenant, state: StandingState): Promise<string[]> {
  const standings = await standingsOf(tenant, await selectAcceptedIds(tenant))
  return [...standings].filter(([, standing]) => standing.state === state).map(([id]) => id)
}
