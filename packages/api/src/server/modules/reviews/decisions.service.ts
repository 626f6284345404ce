import type { BodyOf } from '../../../contract/define'
import type { SubmissionMove, SubmissionMoveName } from '../../../contract/moves/submission'
import type {
  accept,
  acceptWithConditions,
  ConditionAsked,
  confirm,
  Moved,
  refuse,
  sendBack,
} from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { insertSignature } from '../submissions/submissions.frozen.repository'
import { about, tell } from '../submissions/submissions.messages'
import { asMoved, makeMove, openForMove, permittedMove } from '../submissions/submissions.move.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { insertConditions, selectConditions } from './conditions.repository'
import { conclude, conditionsOf, proposedOf, seenFacts } from './decisions.conclude.service'
import { endProposal, insertDecision, type DecisionRow } from './decisions.repository'
import { reviewFacts } from './reviews.facts.service'
import { reviewMessages } from './reviews.messages'
import { todayOf } from './reviews.read.service'

const meanings = {
  accepted: 'accepts',
  'accepted-with-conditions': 'accepts-with-conditions',
  refused: 'refuses',
} as const

/** Where a decision stands that put the submission into a state. */
const standsAs = (to: SubmissionMove['to']): DecisionRow['state'] =>
  to === 'awaiting-second-person' || to === 'awaiting-other-side' ? to : 'final'

/** Accepts a submission; on a safety-class characteristic it then waits for a second person. */
export const acceptSubmission = (
  tenant: Tenant,
  id: string,
  { reason, ...seen }: BodyOf<typeof accept>,
): Promise<Moved> => decide(tenant, id, 'accept', seen, { kind: 'accepted', conditions: [], reason })

/** Accepts a submission on conditions: what must follow, until when, and who owes it. */
export const acceptOnConditions = (
  tenant: Tenant,
  id: string,
  { reason, conditions, ...seen }: BodyOf<typeof acceptWithConditions>,
): Promise<Moved> =>
  decide(tenant, id, 'accept-with-conditions', seen, {
    ...{ kind: 'accepted-with-conditions', conditions, reason },
  })

/** Refuses a submission; challenges whose answers did not settle them stay unresolved. */
export const refuseSubmission = (
  tenant: Tenant,
  id: string,
  { reason, ...seen }: BodyOf<typeof refuse>,
): Promise<Moved> => decide(tenant, id, 'refuse', seen, { kind: 'refused', conditions: [], reason })

type Seen = BodyOf<typeof confirm>
interface Entered {
  kind: DecisionRow['kind']
  conditions: readonly ConditionAsked[]
  reason: string
}

async function decide(
  tenant: Tenant,
  id: string,
  name: SubmissionMoveName,
  seen: Seen,
  { kind, conditions, reason }: Entered,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, seen.expectedVersion, { alone: true })
  const { revision, facts } = await seenFacts(tenant, submission, seen)
  const move = permittedMove(tenant, name, submission, { ...facts, 'reason-given': reason !== '' })
  await refusePastDays(tenant, submission, conditions)
  const state = standsAs(move.to)
  const decision = await insertDecision(tenant, submission, { kind, state, reason, revision })
  await insertConditions(tenant, submission, decision.id, conditions)
  await insertSignature(tenant, submission, {
    meaning: meanings[kind],
    ...{ revision, sha256: seen.sha256, decisionId: decision.id },
  })
  return state === 'final'
    ? conclude(tenant, submission, move, decision, seen.sha256)
    : propose(tenant, submission, move, decision, seen.sha256)
}

/** Confirms a proposed acceptance as its second person. */
export async function confirmAcceptance(tenant: Tenant, id: string, seen: Seen): Promise<Moved> {
  const submission = await openForMove(tenant, id, seen.expectedVersion, { alone: true })
  const { revision, facts } = await seenFacts(tenant, submission, seen)
  const move = permittedMove(tenant, 'confirm', submission, facts)
  const proposed = await proposedOf(tenant, submission)
  const final = move.to !== 'awaiting-other-side'
  await endProposal(tenant, proposed, { state: final ? 'final' : 'awaiting-other-side' })
  await insertSignature(tenant, submission, {
    meaning: 'second-person',
    ...{ revision, sha256: seen.sha256, decisionId: proposed.id },
  })
  return final
    ? conclude(tenant, submission, move, proposed, seen.sha256)
    : propose(tenant, submission, move, proposed, seen.sha256)
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

/** The decision waits for one more signature: of a second person, or of the supplier's approver. */
async function propose(
  tenant: Tenant,
  submission: SubmissionRow,
  move: SubmissionMove,
  decision: DecisionRow,
  signed: string,
): Promise<Moved> {
  // What waits for its second person is the customer's own business until it is final, in the record too.
  const toSupplier = move.to === 'awaiting-other-side'
  const data = toSupplier ? { decisionId: decision.id, kind: decision.kind } : {}
  const moved = await makeMove(tenant, submission, move, {}, { sha256: signed, ...data })
  if (toSupplier) {
    const conditions = conditionsOf(await selectConditions(tenant, submission), decision)
    const words = about('customer', reviewMessages.oneOffProposed(conditions, decision.reason))
    await tell(tenant, moved, 'other side', 'decision', words, ['supplier-approver'])
  } else
    await tell(tenant, moved, 'own side', 'decision', about('customer', reviewMessages.secondPersonAsked()))
  return asMoved(moved)
}

async function refusePastDays(
  tenant: Tenant,
  submission: SubmissionRow,
  conditions: readonly ConditionAsked[],
): Promise<void> {
  if (conditions.length === 0) return
  const today = await todayOf(tenant, submission)
  const errors = conditions.flatMap(({ dueOn }, at) =>
    dueOn < today
      ? [
          {
            path: `body.conditions.${at}.dueOn`,
            message: 'This day is over. Enter today or a later day.',
          },
        ]
      : [],
  )
  if (errors.length > 0) throw invalidInput(errors)
}
