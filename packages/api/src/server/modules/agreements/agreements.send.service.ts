import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound } from '../../errors'
import { agreementMessages, tell } from './agreements.messages'
import { factsOf, permittedMove, recordMove } from './agreements.move.service'
import { negotiationOf, type Negotiation, type VersionAtHand } from './agreements.negotiation.service'
import {
  deleteAgreement,
  lockAgreement,
  numberAgreement,
  selectByScope,
  updateVersion,
} from './agreements.repository'
import { updateRound, type RoundRow } from './agreements.rounds.repository'
import { contentErrors } from './agreements.sendable'

/** Sends this side's draft: as a proposal, or as the answer to the other side's. Gives the agreement it stands in. */
export async function sendDraftAtHand(
  tenant: Tenant,
  negotiation: Negotiation,
  version: VersionAtHand,
): Promise<string> {
  return version.state === 'draft'
    ? propose(tenant, negotiation, version)
    : counter(tenant, negotiation, version)
}

async function propose(tenant: Tenant, negotiation: Negotiation, version: VersionAtHand): Promise<string> {
  const facts = { ...factsOf(tenant, negotiation, version), ...sendable(version.standing, negotiation) }
  const move = permittedMove(tenant, 'propose', version.state, facts)
  const home = await numbered(tenant, negotiation)
  const { agreement, versions } = home
  const number = 1 + Math.max(0, ...versions.map(({ row }) => row.number ?? 0))
  const round = await sent(tenant, version.standing, 1)
  const updated = await updateVersion(tenant, version.row, {
    agreementId: agreement.id,
    number,
    state: 'proposed',
  })
  if (!updated) throw changedMeanwhile('proposal')
  // Its only version has moved to the agreement that the other side sent meanwhile.
  if (agreement.id !== negotiation.agreement.id) await deleteAgreement(tenant, negotiation.agreement)
  recordMove(tenant, move, agreement, updated, roundData(round))
  const message = agreementMessages.proposed(round.effectiveOn, round.comment)
  tell(tenant, home, updated, { side: 'other' }, message)
  return agreement.id
}

/**
 * The agreement that the proposal goes to, with its number. Where the other side has sent one of the same scope since
 * the draft was begun, the proposal becomes the next version of that, unless one is under negotiation there.
 */
async function numbered(tenant: Tenant, negotiation: Negotiation): Promise<Negotiation> {
  const { agreement } = negotiation
  if (agreement.number !== null) return negotiation
  const taken = await selectByScope(tenant, agreement, 'sent')
  if (!taken) return { ...negotiation, agreement: await numberAgreement(tenant, agreement) }
  const locked = await lockAgreement(tenant, taken.id)
  if (!locked) throw notFound('agreement')
  return negotiationOf(tenant, locked)
}

async function counter(tenant: Tenant, negotiation: Negotiation, version: VersionAtHand): Promise<string> {
  const { draft, standing, row } = version
  const { agreement } = negotiation
  if (!draft) throw notFound('draft of an answer')
  const facts = { ...factsOf(tenant, negotiation, version), ...sendable(draft, negotiation) }
  const move = permittedMove(tenant, 'counter', version.state, facts)
  if (!(await updateRound(tenant, standing, { state: 'answered' }))) throw changedMeanwhile('proposal')
  const round = await sent(tenant, draft, standing.number + 1)
  const updated = await updateVersion(tenant, row, { state: 'countered' })
  if (!updated) throw changedMeanwhile('proposal')
  recordMove(tenant, move, agreement, updated, roundData(round))
  const message = agreementMessages.countered(round.effectiveOn, round.comment)
  tell(tenant, negotiation, updated, { side: 'other' }, message)
  return agreement.id
}

async function sent(tenant: Tenant, draft: RoundRow, number: number): Promise<RoundRow> {
  const round = await updateRound(tenant, draft, {
    state: 'sent',
    number,
    sentAt: tenant.now,
    savedAt: tenant.now,
    createdBy: tenant.userId,
  })
  if (!round) throw changedMeanwhile('draft')
  return round
}

/** What the record keeps of a proposal. */
export const roundData = ({
  number,
  clauses,
  terms,
  effectiveOn,
  houseTermsNumber,
  caseChallengeId,
}: RoundRow) => ({
  round: number,
  clauses,
  terms,
  effectiveOn,
  ...(houseTermsNumber === null ? {} : { houseTerms: houseTermsNumber }),
  ...(caseChallengeId === null ? {} : { challengeId: caseChallengeId }),
})

/** The conditions of a sending that rest on what was written; where one does not hold, it is told at its field. */
function sendable(round: RoundRow, negotiation: Negotiation) {
  const errors = contentErrors(round, negotiation)
  if (round.effectiveOn < negotiation.today)
    errors.push({
      path: 'body.effectiveOn',
      message: 'This day has passed. Enter today or a later day as the first in force.',
    })
  if (errors.length > 0) throw invalidInput(errors)
  return { 'clauses-can-be-agreed': true, 'effective-date-not-past': true } as const
}
