import { clauseKey } from '@evenrule/metrology'
import type { commentOnRound, markAccepted, withdrawClauses } from '../../../contract/agreements'
import type { BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput } from '../../errors'
import { sha256 } from '../record/record.append'
import { acceptanceOf } from './agreements.acceptance'
import { agreementMessages, tell } from './agreements.messages'
import { factsOf, permittedMove, recordMove } from './agreements.move.service'
import { openForMove, sentRounds } from './agreements.negotiation.service'
import { readAgreementOf } from './agreements.read.service'
import { insertComment, insertMarks, selectMarks } from './agreements.remarks.repository'
import { updateVersion } from './agreements.repository'
import { insertRound, updateRound } from './agreements.rounds.repository'
import { canBeAgreed, isEmpty } from './agreements.sendable'

interface At {
  agreementId: string
  versionId: string
}

/** Takes clauses out of this side's standing proposal: a new round of the same side stands in its place. */
export async function withdrawClausesOf(
  tenant: Tenant,
  at: At,
  { expectedVersion, clauseKeys, words }: BodyOf<typeof withdrawClauses>,
) {
  const { negotiation, version } = await openForMove(tenant, at)
  const { row, standing } = version
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('proposal')
  const keys = standing.clauses.map(clauseKey)
  const left = {
    ...standing,
    clauses: standing.clauses.filter((each) => !clauseKeys.includes(clauseKey(each))),
  }
  const move = permittedMove(tenant, 'withdraw-clauses', version.state, {
    ...factsOf(tenant, negotiation, version),
    'clauses-remain': !isEmpty(left),
    'clauses-can-be-agreed': canBeAgreed(left, negotiation),
    'reason-given': words !== '',
  })
  if (!clauseKeys.every((key) => keys.includes(key)))
    throw invalidInput([{ path: 'body.clauseKeys', message: 'Choose clauses that stand in the proposal.' }])
  if (!(await updateRound(tenant, standing, { state: 'replaced' }))) throw changedMeanwhile('proposal')
  const { id: _replaced, ...kept } = left
  const round = await insertRound(tenant, {
    ...kept,
    number: standing.number + 1,
    state: 'sent',
    comment: words,
    withdrawnClauses: keys.filter((key) => clauseKeys.includes(key)),
    createdAt: tenant.now,
    createdBy: tenant.userId,
    savedAt: tenant.now,
    sentAt: tenant.now,
    rowVersion: 1,
  })
  const updated = await updateVersion(tenant, row, { state: row.state })
  if (!updated) throw changedMeanwhile('proposal')
  const { number, withdrawnClauses } = round
  recordMove(tenant, move, negotiation.agreement, updated, { round: number, clauseKeys: withdrawnClauses })
  const message = agreementMessages.clausesWithdrawn(withdrawnClauses.length, words)
  tell(tenant, negotiation, updated, { side: 'other' }, message)
  return readAgreementOf(tenant, at.agreementId)
}

/** Says something about one thing in a round that was sent; both sides read it, and nobody changes it. */
export async function comment(
  tenant: Tenant,
  at: At,
  { round: number, about, text }: BodyOf<typeof commentOnRound>,
) {
  const { negotiation, version } = await openForMove(tenant, at)
  const sent = sentRounds(version)
  const round = sent.find((each) => each.number === number)
  const isThere =
    about.kind !== 'clause' ||
    sent.some(({ clauses }) => clauses.some((each) => clauseKey(each) === about.clauseKey))
  const move = permittedMove(tenant, 'comment', version.state, {
    ...factsOf(tenant, negotiation, version),
    'sent-round': round !== undefined && isThere,
  })
  if (!round) throw new Error('A move was permitted without its round.')
  const { id: commentId } = await insertComment(tenant, round, { about, text })
  const data = { round: number, about, commentId, sha256: sha256(text) }
  recordMove(tenant, move, negotiation.agreement, version.row, data)
  tell(tenant, negotiation, version.row, { side: 'other' }, agreementMessages.commented(text))
  return readAgreementOf(tenant, at.agreementId)
}

/** Marks single things of the other side's standing proposal as accepted, or takes such marks back. */
export async function mark(tenant: Tenant, at: At, { round, items, accepted }: BodyOf<typeof markAccepted>) {
  const { negotiation, version } = await openForMove(tenant, at)
  const { standing, row } = version
  const sent = sentRounds(version)
  const stands = acceptanceOf(sent, version.marks)
  const isThere = ({ about, sha256: hash }: (typeof items)[number]) =>
    stands?.items.some(
      (each) => each.kind === about.kind && each.clauseKey === about.clauseKey && each.sha256 === hash,
    )
  const move = permittedMove(tenant, 'mark', version.state, {
    ...factsOf(tenant, negotiation, version),
    'round-stands': round === standing.number && items.every(isThere),
  })
  await insertMarks(tenant, standing, items, accepted)
  recordMove(tenant, move, negotiation.agreement, row, { round, items, accepted })
  const after = acceptanceOf(sent, await selectMarks(tenant, [row]))
  const complete = (of: typeof after) => of?.everythingBy.includes(tenant.side) ?? false
  if (complete(after) && !complete(stands))
    tell(tenant, negotiation, row, { side: 'other' }, agreementMessages.everythingMarked)
  return readAgreementOf(tenant, at.agreementId)
}
