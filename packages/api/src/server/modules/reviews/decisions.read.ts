import type { Condition, Decision } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import type { DecisionRow } from './decisions.repository'

/** Decisions as the reader's side gets them. */
export const decisionAnswers = (
  { side }: Pick<Tenant, 'side'>,
  submission: Pick<SubmissionRow, 'state'>,
  rows: readonly DecisionRow[],
  conditionsOf: (decisionId: string) => Condition[],
  nameOf: (userId: string | null) => string | null,
): Decision[] =>
  rows.map(({ id, kind, state, reason, revision, ...row }) => ({
    ...{ id, kind, reason, revision, conditions: conditionsOf(id) },
    // Where the supplier took the submission back meanwhile, nobody waits for the other signature any more.
    state: state.startsWith('awaiting') && submission.state !== state ? 'withdrawn' : state,
    decidedBy: nameOf(row.decidedBy),
    decidedAt: row.decidedAt,
    secondBy: nameOf(row.secondBy),
    secondAt: row.secondAt,
    sentBackReason: side === 'customer' ? row.sentBackReason : null,
    otherSideBy: nameOf(row.otherSideBy),
    otherSideAt: row.otherSideAt,
    declinedReason: row.declinedReason,
  }))
