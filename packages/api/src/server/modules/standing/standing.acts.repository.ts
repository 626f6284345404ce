import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { keyOf } from './standing.share.repository'
import { carryOvers, reinstatements } from './standing.table'

/** The signature of the customer's approver under a reinstatement. */
export async function insertReinstatement(
  { tx, now, userId, authenticatedAt }: Tenant,
  submission: SubmissionRow,
  words: string,
): Promise<void> {
  await tx.insert(reinstatements).values({
    ...keyOf(submission),
    ...{ words, reinstatedBy: userId, reinstatedAt: now, authenticatedAt },
  })
}

/** The signature of the customer's approver under a carry-over. */
export async function insertCarryOver(
  { tx, now, userId, authenticatedAt }: Tenant,
  submission: SubmissionRow,
  to: { revisionId: string; characteristicId: string },
): Promise<void> {
  await tx.insert(carryOvers).values({
    ...keyOf(submission),
    ...to,
    ...{ carriedBy: userId, carriedAt: now, authenticatedAt },
  })
}
