import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectFinalConditions } from './conditions.repository'

/** What the standing of an acceptance follows from, as far as its conditions go; days of the relationship's calendar. */
export interface ConditionDay {
  dueOn: string
  confirmedOn: string | null
}

/** The conditions of final acceptances, by submission. */
export async function conditionDaysOf(
  tenant: Tenant,
  submissions: readonly { submissionId: string; timeZone: string }[],
): Promise<Map<string, ConditionDay[]>> {
  const zones = new Map(submissions.map(({ submissionId, timeZone }) => [submissionId, timeZone]))
  const days = new Map<string, ConditionDay[]>()
  for (const { submissionId, dueOn, confirmedAt } of await selectFinalConditions(tenant, [...zones.keys()])) {
    const zone = zones.get(submissionId)
    if (zone === undefined) continue
    const confirmedOn = confirmedAt && dayIn(zone, confirmedAt)
    days.set(submissionId, [...(days.get(submissionId) ?? []), { dueOn, confirmedOn }])
  }
  return days
}
