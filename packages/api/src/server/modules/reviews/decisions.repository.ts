import { and, asc, eq, inArray } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { decisions } from './reviews.table'

export type DecisionRow = typeof decisions.$inferSelect
type Shared = Pick<SubmissionRow, 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'id'>
type Key = Pick<SubmissionRow, 'relationshipId' | 'id'>

const ofSubmission = ({ relationshipId, id }: Key) =>
  and(eq(decisions.relationshipId, relationshipId), eq(decisions.submissionId, id))

/** Decisions on a submission, the oldest first; a supplier gets those that concern it alone. */
export async function selectDecisions({ tx }: Tenant, submission: Key): Promise<DecisionRow[]> {
  return tx
    .select()
    .from(decisions)
    .where(ofSubmission(submission))
    .orderBy(asc(decisions.decidedAt), asc(decisions.id))
}

/** The decision that waits for its second person, or for the other side. */
export async function selectProposed({ tx }: Tenant, submission: Key): Promise<DecisionRow | undefined> {
  const [row] = await tx
    .select()
    .from(decisions)
    .where(
      and(
        ofSubmission(submission),
        inArray(decisions.state, ['awaiting-second-person', 'awaiting-other-side']),
      ),
    )
  return row
}

export async function insertDecision(
  { tx, userId, now }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: Shared,
  decision: Pick<DecisionRow, 'kind' | 'state' | 'reason' | 'revision'>,
): Promise<DecisionRow> {
  const [inserted] = await tx
    .insert(decisions)
    .values({
      ...{ submissionId: id, relationshipId, supplierOrgId, customerOrgId },
      ...decision,
      decidedBy: userId,
      decidedAt: now,
    })
    .returning()
  if (!inserted) throw new Error('The decision was not stored.')
  return inserted
}

const change = async ({ tx }: Tenant, { relationshipId, id }: DecisionRow, values: Partial<DecisionRow>) => {
  await tx
    .update(decisions)
    .set(values)
    .where(and(eq(decisions.relationshipId, relationshipId), eq(decisions.id, id)))
}

/** Ends the wait for the second person, who is the one that acts. */
export const endProposal = (
  tenant: Tenant,
  decision: DecisionRow,
  values: { state: 'final' | 'awaiting-other-side' } | { state: 'withdrawn'; sentBackReason: string },
): Promise<void> => change(tenant, decision, { ...values, secondBy: tenant.userId, secondAt: tenant.now })

/** Ends the wait for the supplier's approver, who is the one that acts. */
export const endOneOff = (
  tenant: Tenant,
  decision: DecisionRow,
  values: { state: 'final' } | { state: 'withdrawn'; declinedReason: string },
): Promise<void> =>
  change(tenant, decision, { ...values, otherSideBy: tenant.userId, otherSideAt: tenant.now })
