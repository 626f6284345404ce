import type { BodyOf } from '../../../contract/define'
import type { agreeOneOff, declineOneOff, Moved } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { sha256 } from '../record/record.append'
import { insertSignature } from '../submissions/submissions.frozen.repository'
import { about, tell } from '../submissions/submissions.messages'
import { asMoved, makeMove, openForMove, permittedMove } from '../submissions/submissions.move.service'
import { conclude, proposedOf, seenFacts } from './decisions.conclude.service'
import { endOneOff } from './decisions.repository'
import { reviewFacts } from './reviews.facts.service'
import { reviewMessages } from './reviews.messages'

/** The supplier's approver agrees to an acceptance without agreed criteria; it takes effect. */
export async function agree(tenant: Tenant, id: string, seen: BodyOf<typeof agreeOneOff>): Promise<Moved> {
  const submission = await openForMove(tenant, id, seen.expectedVersion, { alone: true })
  const { revision, facts } = await seenFacts(tenant, submission, seen)
  const move = permittedMove(tenant, 'agree-one-off', submission, facts)
  const proposed = await proposedOf(tenant, submission)
  await endOneOff(tenant, proposed, { state: 'final' })
  await insertSignature(tenant, submission, {
    meaning: 'agrees-one-off',
    ...{ revision, sha256: seen.sha256, decisionId: proposed.id },
  })
  return conclude(tenant, submission, move, proposed, seen.sha256)
}

/** The supplier's approver does not agree: the review goes on. */
export async function decline(
  tenant: Tenant,
  id: string,
  { expectedVersion, reason }: BodyOf<typeof declineOneOff>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const move = permittedMove(tenant, 'decline-one-off', submission, {
    ...(await reviewFacts(tenant, submission)),
    'reason-given': reason !== '',
  })
  const proposed = await proposedOf(tenant, submission)
  await endOneOff(tenant, proposed, { state: 'withdrawn', declinedReason: reason })
  const moved = await makeMove(
    tenant,
    submission,
    move,
    {},
    { decisionId: proposed.id, reasonSha256: sha256(reason) },
  )
  const words = about('supplier', reviewMessages.oneOffDeclined(reason))
  await tell(tenant, moved, 'other side', 'decision', words)
  return asMoved(moved)
}
