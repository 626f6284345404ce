import { allows } from '../../../contract/access'
import { chooseMove, type Facts } from '../../../contract/moves/define'
import {
  movesNamed,
  type SubmissionMove,
  type SubmissionMoveName,
  type SubmissionPrecondition,
} from '../../../contract/moves/submission'
import type { Moved } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, notFound } from '../../errors'
import { refusals, wrongSubmissionState } from './submissions.errors'
import {
  lockRelationship,
  lockSubmission,
  selectSubmission,
  updateSubmission,
  type SubmissionRow,
} from './submissions.repository'

export type SubmissionFacts = Facts<SubmissionPrecondition>

/** One submission of this organisation on its side; 404 otherwise, for a customer also while it is unsigned. */
export async function submissionById(tenant: Tenant, id: string): Promise<SubmissionRow> {
  const row = await selectSubmission(tenant, id)
  if (!row || (tenant.side === 'customer' && row.submittedAt === null)) throw notFound('submission')
  return row
}

/** The same, locked for a move until the transaction ends. */
export async function lockedSubmission(tenant: Tenant, id: string): Promise<SubmissionRow> {
  await submissionById(tenant, id)
  const row = await lockSubmission(tenant, id)
  if (!row) throw notFound('submission')
  return row
}

/**
 * Locks a submission for a move by somebody who saw the version. `alone` for moves that look at other submissions of
 * the relationship: they pass one at a time.
 */
export async function openForMove(
  tenant: Tenant,
  id: string,
  expectedVersion: number,
  { alone = false } = {},
): Promise<SubmissionRow> {
  if (alone) await lockRelationship(tenant, (await submissionById(tenant, id)).relationshipId)
  const row = await lockedSubmission(tenant, id)
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('submission')
  return row
}

/** The row of the table of moves that may be made here and now; refuses with the condition that does not hold. */
export function permittedMove(
  tenant: Tenant,
  name: SubmissionMoveName,
  submission: SubmissionRow | null,
  facts: SubmissionFacts,
): SubmissionMove {
  const from = submission?.state ?? null
  const candidates = movesNamed(name, from).filter(
    ({ side, permission }) => side === tenant.side && allows(permission, side, tenant.roles),
  )
  const { move, lacking } = chooseMove<SubmissionPrecondition, SubmissionMove>(candidates, facts)
  if (move) return move
  const said = lacking.map((each) => refusals[each]).find((each) => each !== null)
  throw said?.() ?? wrongSubmissionState(from ?? 'draft')
}

/** Makes a permitted move: the new state, and its event in the record. */
export async function makeMove(
  tenant: Tenant,
  submission: SubmissionRow,
  move: SubmissionMove,
  values: Parameters<typeof updateSubmission>[2] = {},
  data: Record<string, unknown> = {},
): Promise<SubmissionRow> {
  // A second challenge does not make what waits any younger.
  const since = move.to === submission.state ? submission.stateSince : tenant.now
  const updated = await updateSubmission(tenant, submission, {
    ...values,
    state: move.to,
    stateSince: since,
  })
  if (!updated) throw changedMeanwhile('submission')
  recordSubmission(tenant, updated, move.event, data)
  return updated
}

/** Signed submissions stand in the chain that both sides share, others in the supplier's own journal. */
export function recordSubmission(
  tenant: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId, taskId, number }: SubmissionRow,
  type: string,
  data: Record<string, unknown> = {},
): void {
  tenant.record({
    type,
    ...(number === null ? {} : { relationship: { id: relationshipId, supplierOrgId, customerOrgId } }),
    subject: { type: 'submission', id },
    taskId,
    data: number === null ? data : { number, ...data },
  })
}

export const asMoved = ({ id, state, rowVersion }: SubmissionRow): Moved => ({ id, state, rowVersion })
