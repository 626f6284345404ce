import type { SubmissionMove, SubmissionMoveName } from '../../../contract/moves/submission'
import type { BodyOf } from '../../../contract/define'
import type {
  accept,
  acceptWithConditions,
  confirm,
  Moved,
  refuse,
  sendBack,
} from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { sha256 } from '../record/record.append'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import { insertSignature, selectText } from '../submissions/submissions.frozen.repository'
import { about, tell } from '../submissions/submissions.messages'
import { asMoved, makeMove, openForMove, permittedMove } from '../submissions/submissions.move.service'
import { selectAccepted, type SubmissionRow } from '../submissions/submissions.repository'
import { leaveUnresolved } from './challenges.service'
import { endProposal, insertDecision, selectProposed, type DecisionRow } from './decisions.repository'
import { reviewFacts } from './reviews.facts.service'
import { reviewMessages } from './reviews.messages'

const meanings = {
  accepted: 'accepts',
  'accepted-with-conditions': 'accepts-with-conditions',
  refused: 'refuses',
} as const

/** Accepts a submission; on a safety-class characteristic it then waits for a second person. */
export async function acceptSubmission(
  tenant: Tenant,
  id: string,
  { reason, ...seen }: BodyOf<typeof accept>,
): Promise<Moved> {
  return decide(tenant, id, 'accept', seen, {
    ...{ kind: 'accepted', conditions: null, conditionsDueOn: null, reason },
  })
}

/** Accepts a submission on conditions, with the last day on which what must follow may follow. */
export async function acceptOnConditions(
  tenant: Tenant,
  id: string,
  { reason, conditions, conditionsDueOn, ...seen }: BodyOf<typeof acceptWithConditions>,
): Promise<Moved> {
  return decide(tenant, id, 'accept-with-conditions', seen, {
    ...{ kind: 'accepted-with-conditions', conditions, conditionsDueOn, reason },
  })
}

/** Refuses a submission; challenges whose answers did not settle them stay unresolved. */
export async function refuseSubmission(
  tenant: Tenant,
  id: string,
  { reason, ...seen }: BodyOf<typeof refuse>,
): Promise<Moved> {
  return decide(tenant, id, 'refuse', seen, {
    ...{ kind: 'refused', conditions: null, conditionsDueOn: null, reason },
  })
}

type Seen = BodyOf<typeof confirm>
type Entered = Pick<DecisionRow, 'kind' | 'conditions' | 'conditionsDueOn' | 'reason'>

async function decide(
  tenant: Tenant,
  id: string,
  name: SubmissionMoveName,
  seen: Seen,
  entered: Entered,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, seen.expectedVersion, { alone: true })
  const move = permittedMove(tenant, name, submission, {
    ...(await seenFacts(tenant, submission, seen)),
    'reason-given': entered.reason !== '',
  })
  await refusePastDays(tenant, submission, entered)
  const final = move.to !== 'awaiting-second-person'
  const decision = await insertDecision(tenant, submission, {
    ...entered,
    state: final ? 'final' : 'awaiting-second-person',
  })
  await insertSignature(tenant, submission, {
    meaning: meanings[decision.kind],
    sha256: seen.sha256,
    decisionId: decision.id,
  })
  if (final) return conclude(tenant, submission, move, decision, seen.sha256)
  // What is proposed is the customer's own business until it is final, in the record too.
  const moved = await makeMove(tenant, submission, move, {}, { sha256: seen.sha256 })
  await tell(tenant, moved, 'own side', 'decision', about('customer', reviewMessages.secondPersonAsked()))
  return asMoved(moved)
}

/** Confirms a proposed acceptance as its second person. */
export async function confirmAcceptance(tenant: Tenant, id: string, seen: Seen): Promise<Moved> {
  const submission = await openForMove(tenant, id, seen.expectedVersion, { alone: true })
  const move = permittedMove(tenant, 'confirm', submission, await seenFacts(tenant, submission, seen))
  const proposed = await proposedOf(tenant, submission)
  await endProposal(tenant, proposed, { state: 'final' })
  await insertSignature(tenant, submission, {
    meaning: 'second-person',
    sha256: seen.sha256,
    decisionId: proposed.id,
  })
  return conclude(tenant, submission, move, proposed, seen.sha256)
}

/** Does not confirm a proposed acceptance: the review goes on. */
export async function sendBackToReview(
  tenant: Tenant,
  id: string,
  { expectedVersion, reason }: BodyOf<typeof sendBack>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const move = permittedMove(tenant, 'send-back', submission, {
    ...(await reviewFacts(tenant, submission)),
    'reason-given': reason !== '',
  })
  await endProposal(tenant, await proposedOf(tenant, submission), {
    state: 'withdrawn',
    sentBackReason: reason,
  })
  const moved = await makeMove(tenant, submission, move)
  await tell(tenant, moved, 'own side', 'decision', about('customer', reviewMessages.sentBack(reason)))
  return asMoved(moved)
}

/** The decision takes effect: the new state, its event, and what it ends. */
async function conclude(
  tenant: Tenant,
  submission: SubmissionRow,
  move: SubmissionMove,
  decision: DecisionRow,
  signed: string,
): Promise<Moved> {
  const { kind, conditions, conditionsDueOn, reason } = decision
  const moved = await makeMove(
    tenant,
    submission,
    move,
    { decidedAt: tenant.now },
    {
      ...{ decisionId: decision.id, sha256: signed, conditionsDueOn },
      // Words of people stay outside the chain; their hashes prove them.
      conditionsSha256: conditions === null ? null : sha256(conditions),
      reasonSha256: sha256(reason),
    },
  )
  if (kind === 'refused') await leaveUnresolved(tenant, moved)
  else await supersedeOlder(tenant, moved)
  await tell(tenant, moved, 'other side', 'decision', about('customer', wordsOf(decision)))
  return asMoved(moved)
}

const wordsOf = ({ kind, conditions, conditionsDueOn, reason }: DecisionRow) =>
  kind === 'refused'
    ? reviewMessages.refused(reason)
    : kind === 'accepted'
      ? reviewMessages.accepted(reason)
      : reviewMessages.acceptedWithConditions(conditions ?? '', conditionsDueOn ?? '', reason)

/** What was accepted of the same task before gives way to the newer acceptance. */
async function supersedeOlder(tenant: Tenant, accepted: SubmissionRow): Promise<void> {
  for (const older of await selectAccepted(tenant, accepted)) {
    const move = permittedMove(tenant, 'supersede', older, { 'newer-accepted': true })
    await makeMove(tenant, older, move, { supersededBy: accepted.id }, { supersededBy: accepted.number })
  }
}

async function seenFacts(tenant: Tenant, submission: SubmissionRow, seen: Seen) {
  const frozen = await selectText(tenant, submission)
  return {
    ...(await reviewFacts(tenant, submission)),
    'as-seen': frozen !== undefined && frozen.sha256 === seen.sha256,
  }
}

async function proposedOf(tenant: Tenant, submission: SubmissionRow): Promise<DecisionRow> {
  const proposed = await selectProposed(tenant, submission)
  if (!proposed) throw new Error(`The submission ${submission.id} waits for nothing that was proposed.`)
  return proposed
}

async function refusePastDays(
  tenant: Tenant,
  { relationshipId }: SubmissionRow,
  { conditionsDueOn }: Entered,
): Promise<void> {
  if (conditionsDueOn === null) return
  const today = todayIn(await relationshipById(tenant, relationshipId), tenant)
  if (conditionsDueOn < today)
    throw invalidInput([
      { path: 'body.conditionsDueOn', message: 'This day is over. Enter today or a later day.' },
    ])
}
