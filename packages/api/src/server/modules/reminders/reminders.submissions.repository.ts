import { and, eq, inArray, sql } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { characteristics, measuringTasks, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { challenges, conditions, decisions } from '../reviews/reviews.table'
import { submissions } from '../submissions/submissions.table'

/** What people call a submission, and in whose calendar its days count. */
const fields = {
  submissionId: submissions.id,
  number: sql<number>`${submissions.number}`,
  gauge: measuringTasks.gaugeCode,
  part: parts.number,
  characteristic: characteristics.name,
  timeZone: relationships.timeZone,
}
export type NamedSubmission = Awaited<ReturnType<typeof selectNamedSubmissions>>[number]

const named = <F extends Record<string, unknown>>(more: F) => ({ ...fields, ...more })

/** Joins of a query that begins at submissions. */
const ofTask = and(
  eq(measuringTasks.relationshipId, submissions.relationshipId),
  eq(measuringTasks.id, submissions.taskId),
)
const ofPart = and(eq(parts.relationshipId, submissions.relationshipId), eq(parts.id, submissions.partId))
const ofCharacteristic = and(
  eq(characteristics.relationshipId, submissions.relationshipId),
  eq(characteristics.id, submissions.characteristicId),
)

/** Submissions of this side by id, as reminders name them. */
export async function selectNamedSubmissions(tenant: Tenant, ids: readonly string[]) {
  if (ids.length === 0) return []
  return tenant.tx
    .select(fields)
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, submissions.relationshipId))
    .innerJoin(measuringTasks, ofTask)
    .innerJoin(parts, ofPart)
    .innerJoin(characteristics, ofCharacteristic)
    .where(and(ownSide(tenant, submissions), inArray(submissions.id, [...ids])))
}

/** Challenges that wait for the supplier's answer. */
export async function selectOpenChallenges(tenant: Tenant) {
  const { id, number, dueOn, openedAt } = challenges
  return tenant.tx
    .select(named({ challenge: { id, number, dueOn, openedAt } }))
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, submissions.relationshipId))
    .innerJoin(measuringTasks, ofTask)
    .innerJoin(parts, ofPart)
    .innerJoin(characteristics, ofCharacteristic)
    .innerJoin(
      challenges,
      and(
        eq(challenges.relationshipId, submissions.relationshipId),
        eq(challenges.submissionId, submissions.id),
      ),
    )
    .where(
      and(ownSide(tenant, submissions), eq(submissions.state, 'challenged'), eq(challenges.state, 'open')),
    )
}

/** Conditions of acceptances that hold, which nobody has confirmed yet. */
export async function selectOpenConditions(tenant: Tenant) {
  const { id, number, dueOn, owner, text, state } = conditions
  return tenant.tx
    .select(named({ condition: { id, number, dueOn, owner, text, state }, decidedAt: decisions.decidedAt }))
    .from(submissions)
    .innerJoin(relationships, eq(relationships.id, submissions.relationshipId))
    .innerJoin(measuringTasks, ofTask)
    .innerJoin(parts, ofPart)
    .innerJoin(characteristics, ofCharacteristic)
    .innerJoin(
      conditions,
      and(
        eq(conditions.relationshipId, submissions.relationshipId),
        eq(conditions.submissionId, submissions.id),
      ),
    )
    .innerJoin(
      decisions,
      and(eq(decisions.relationshipId, conditions.relationshipId), eq(decisions.id, conditions.decisionId)),
    )
    .where(
      and(
        ownSide(tenant, submissions),
        eq(submissions.state, 'accepted-with-conditions'),
        eq(decisions.state, 'final'),
        inArray(state, ['open', 'reported']),
      ),
    )
}

/** "submission 12, BG-14 for 7741-220 bore". */
export const titleOf = ({ number, gauge, part, characteristic }: Omit<NamedSubmission, 'timeZone'>): string =>
  `submission ${number}, ${gauge} for ${part} ${characteristic}`
