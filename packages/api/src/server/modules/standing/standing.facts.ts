import { compareDecimals } from '../../../contract/decimal'
import type { LimitsComparison, StandingFacts } from '../../../contract/standing'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import {
  selectAccepted,
  selectCalibrationFacts,
  selectCarryOvers,
  selectConditions,
  selectEventFacts,
  selectNewerRevisions,
  selectReinstatements,
  type AcceptedLimits,
} from './standing.repository'

export interface FactsOfSubmission {
  submissionId: string
  timeZone: string
  facts: StandingFacts
}

/** Everything the standing of accepted submissions follows from; those that are not accepted are left out. */
export async function standingFactsOf(
  tenant: Tenant,
  submissionIds: readonly string[],
): Promise<FactsOfSubmission[]> {
  const accepted = await selectAccepted(tenant, submissionIds)
  if (accepted.length === 0) return []
  const ids = accepted.map(({ submissionId }) => submissionId)
  const conditions = groupOf(await selectConditions(tenant, ids))
  const calibrations = groupOf(await selectCalibrationFacts(tenant, ids))
  const events = groupOf(await selectEventFacts(tenant, ids))
  const reinstatements = groupOf(await selectReinstatements(tenant, ids))
  const carried = groupOf(await selectCarryOvers(tenant, ids))
  const revisions = groupOf(await selectNewerRevisions(tenant, ids))
  return accepted.map(({ submissionId, timeZone, acceptedAt, terms, limits }) => {
    const day = (instant: string) => dayIn(timeZone, instant)
    const facts: StandingFacts = {
      acceptedAt,
      acceptedOn: day(acceptedAt),
      terms,
      conditions: conditions(submissionId).map(({ dueOn, confirmedAt }) => ({
        dueOn,
        confirmedOn: confirmedAt === null ? null : day(confirmedAt),
      })),
      calibrations: calibrations(submissionId),
      events: events(submissionId),
      reinstatements: reinstatements(submissionId).map(({ reinstatedAt }) => ({
        at: reinstatedAt,
        on: day(reinstatedAt),
      })),
      revisions: revisions(submissionId).map(({ revision, characteristic }) => {
        const carry = carried(submissionId).find(({ revisionId }) => revisionId === revision.id)
        return {
          label: revision.label,
          addedOn: day(revision.createdAt),
          limits: compareLimits(limits, characteristic),
          carriedOverOn: carry ? day(carry.carriedAt) : null,
        }
      }),
    }
    return { submissionId, timeZone, facts }
  })
}

/** Whether a characteristic still has the limits that were accepted; 24.0 and 24.000 are the same limit. */
export function compareLimits(accepted: AcceptedLimits, now: AcceptedLimits | null): LimitsComparison {
  if (!now) return 'missing'
  const sameNumbers = (['nominal', 'lowerLimit', 'upperLimit'] as const).every((field) => {
    const [a, b] = [accepted[field], now[field]]
    return a === null || b === null ? a === b : compareDecimals(a, b) === 0
  })
  return sameNumbers && accepted.unit === now.unit && accepted.class === now.class ? 'same' : 'differ'
}

/** The rows of each submission, by its id. */
function groupOf<R extends { submissionId: string }>(rows: readonly R[]): (submissionId: string) => R[] {
  const groups = new Map<string, R[]>()
  for (const row of rows) groups.set(row.submissionId, [...(groups.get(row.submissionId) ?? []), row])
  return (submissionId) => groups.get(submissionId) ?? []
}
