import type { Decision } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import type { DecisionRow } from './decisions.repository'

/** Decisions as the reader's side gets them. */
export const decisionAnswers = (
  { side }: Pick<Tenant, 'side'>,
  submission: Pick<SubmissionRow, 'state'>,
  rows: readonly DecisionRow[],
  nameOf: (userId: string | null) => string | null,
): Decision[] =>
  rows.map(({ id, kind, state, conditions, conditionsDueOn, reason, ...row }) => ({
    ...{ id, kind, conditions, conditionsDueOn, reason },
    // Where the supplier took the submission back meanwhile, nobody waits for a second person any more.
    state:
      state === 'awaiting-second-person' && submission.state !== 'awaiting-second-person'
        ? 'withdrawn'
        : state,
    decidedBy: nameOf(row.decidedBy),
    decidedAt: row.decidedAt,
    secondBy: nameOf(row.secondBy),
    secondAt: row.secondAt,
    sentBackReason: side === 'customer' ? row.sentBackReason : null,
  }))
