import { isUnsettled, waitsOnSupplier } from '../../../contract/moves/challenge'
import type { Tenant } from '../../db/tenant'
import type { SubmissionFacts } from '../submissions/submissions.move.service'
import { selectAccepted, type SubmissionRow } from '../submissions/submissions.repository'
import { selectChallenges, type ChallengeRow } from './challenges.repository'
import { selectProposed, type DecisionRow } from './decisions.repository'

/** What challenges say about the moves of their submission. */
export const challengeFacts = (challenges: readonly ChallengeRow[]): SubmissionFacts => {
  const open = challenges.some(({ state }) => waitsOnSupplier(state))
  return {
    'a-challenge-is-open': open,
    'no-challenge-open': !open,
    'no-challenge-was-answered': !challenges.some(({ answeredAt }) => answeredAt !== null),
    'challenges-settled': !challenges.some(({ state }) => isUnsettled(state)),
  }
}

/** What a proposed acceptance says about its confirmation by the person who acts. */
const proposalFacts = (proposed: DecisionRow | undefined, userId: string): SubmissionFacts =>
  proposed
    ? {
        'another-person': proposed.decidedBy !== userId,
        'with-conditions': proposed.kind === 'accepted-with-conditions',
        'without-conditions': proposed.kind === 'accepted',
      }
    : {}

/** Everything that moves under review of a submission depend on, but for what the request itself brings. */
export async function reviewFacts(tenant: Tenant, submission: SubmissionRow): Promise<SubmissionFacts> {
  const accepted = await selectAccepted(tenant, submission)
  const isNewer = ({ number }: SubmissionRow) => (number ?? 0) > (submission.number ?? 0)
  return {
    ...challengeFacts(await selectChallenges(tenant, submission)),
    ...proposalFacts(await selectProposed(tenant, submission), tenant.userId),
    'no-newer-accepted': !accepted.some(isNewer),
    'criteria-agreed': submission.criteria === 'agreed',
    'no-criteria-agreed': submission.criteria === 'none',
    'safety-class': submission.safety,
    'not-safety-class': !submission.safety,
  }
}
