import type { SubmissionMove } from '../../../contract/moves/submission'
import type { BodyOf } from '../../../contract/define'
import type { confirm, Moved } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { canonicalText, sha256 } from '../record/record.append'
import { selectText } from '../submissions/submissions.frozen.repository'
import { about, tell } from '../submissions/submissions.messages'
import {
  asMoved,
  makeMove,
  permittedMove,
  type SubmissionFacts,
} from '../submissions/submissions.move.service'
import { selectAccepted, type SubmissionRow } from '../submissions/submissions.repository'
import { leaveUnresolved } from './challenges.service'
import { selectConditions, type ConditionRow } from './conditions.repository'
import { selectProposed, type DecisionRow } from './decisions.repository'
import { reviewFacts } from './reviews.facts.service'
import { reviewMessages } from './reviews.messages'

/** The facts of a decision on the text that the person had before them, and the revision that this is. */
export async function seenFacts(
  tenant: Tenant,
  submission: SubmissionRow,
  seen: BodyOf<typeof confirm>,
): Promise<{ revision: number; facts: SubmissionFacts }> {
  const frozen = await selectText(tenant, submission)
  return {
    revision: frozen?.revision ?? 0,
    facts: {
      ...(await reviewFacts(tenant, submission)),
      'as-seen': frozen !== undefined && frozen.sha256 === seen.sha256,
    },
  }
}

/** The decision that waits for one more signature. */
export async function proposedOf(tenant: Tenant, submission: SubmissionRow): Promise<DecisionRow> {
  const proposed = await selectProposed(tenant, submission)
  if (!proposed) throw new Error(`The submission ${submission.id} waits for nothing that was proposed.`)
  return proposed
}

/** The conditions of one decision as they were asked for. */
export const conditionsOf = (rows: readonly ConditionRow[], { id }: DecisionRow) =>
  rows
    .filter(({ decisionId }) => decisionId === id)
    .map(({ text, dueOn, owner, followUp }) => ({ text, dueOn, owner, followUp }))

/** The decision takes effect: the new state, its event, and what it ends. */
export async function conclude(
  tenant: Tenant,
  submission: SubmissionRow,
  move: SubmissionMove,
  decision: DecisionRow,
  signed: string,
): Promise<Moved> {
  const { kind, reason } = decision
  const conditions = conditionsOf(await selectConditions(tenant, submission), decision)
  const moved = await makeMove(
    tenant,
    submission,
    move,
    { decidedAt: tenant.now },
    {
      ...{ decisionId: decision.id, kind, sha256: signed },
      // Words of people stay outside the chain; their hashes prove them.
      conditions: conditions.map((each) => ({
        ...{ dueOn: each.dueOn, owner: each.owner, sha256: sha256(canonicalText(each)) },
      })),
      reasonSha256: sha256(reason),
    },
  )
  if (kind === 'refused') await leaveUnresolved(tenant, moved)
  else await supersedeOlder(tenant, moved)
  const words =
    tenant.side === 'supplier'
      ? reviewMessages.oneOffAgreed()
      : kind === 'refused'
        ? reviewMessages.refused(reason)
        : kind === 'accepted'
          ? reviewMessages.accepted(reason)
          : reviewMessages.acceptedWithConditions(conditions, reason)
  await tell(tenant, moved, 'other side', 'decision', about(tenant.side, words))
  return asMoved(moved)
}

/** What was accepted of the same task before gives way to the newer acceptance. */
async function supersedeOlder(tenant: Tenant, accepted: SubmissionRow): Promise<void> {
  for (const older of await selectAccepted(tenant, accepted)) {
    const move = permittedMove(tenant, 'supersede', older, { 'newer-accepted': true })
    await makeMove(tenant, older, move, { supersededBy: accepted.id }, { supersededBy: accepted.number })
  }
}
