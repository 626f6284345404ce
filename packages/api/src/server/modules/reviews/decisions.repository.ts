import { and, asc, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { decisions } from './reviews.table'

export type DecisionRow = typeof decisions.$inferSelect
type Shared = Pick<SubmissionRow, 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'id'>

const ofSubmission = ({ relationshipId, id }: Pick<SubmissionRow, 'relationshipId' | 'id'>) =>
  and(eq(decisions.relationshipId, relationshipId), eq(decisions.submissionId, id))

/** Decisions on a submission, the oldest first; a supplier gets the final one alone. */
export async function selectDecisions(
  { tx }: Tenant,
  submission: Pick<SubmissionRow, 'relationshipId' | 'id'>,
): Promise<DecisionRow[]> {
  return tx
    .select()
    .from(decisions)
    .where(ofSubmission(submission))
    .orderBy(asc(decisions.decidedAt), asc(decisions.id))
}

/** The decision that waits for its second person. */
export async function selectProposed(
  { tx }: Tenant,
  submission: Pick<SubmissionRow, 'relationshipId' | 'id'>,
): Promise<DecisionRow | undefined> {
  const [row] = await tx
    .select()
    .from(decisions)
    .where(and(ofSubmission(submission), eq(decisions.state, 'awaiting-second-person')))
  return row
}

export async function insertDecision(
  { tx, userId, now }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: Shared,
  decision: Pick<DecisionRow, 'kind' | 'state' | 'conditions' | 'conditionsDueOn' | 'reason'>,
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

/** Ends the wait for the second person, who is the one that acts. */
export async function endProposal(
  { tx, userId, now }: Tenant,
  { relationshipId, id }: DecisionRow,
  values: { state: 'final' } | { state: 'withdrawn'; sentBackReason: string },
): Promise<void> {
  await tx
    .update(decisions)
    .set({ ...values, secondBy: userId, secondAt: now })
    .where(and(eq(decisions.relationshipId, relationshipId), eq(decisions.id, id)))
}
