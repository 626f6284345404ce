import type { withdrawVersion } from '../../../contract/agreements'
import type { BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile } from '../../errors'
import { acceptanceOf } from './agreements.acceptance'
import { agreementMessages, tell } from './agreements.messages'
import { factsOf, permittedMove, recordMove } from './agreements.move.service'
import { openForMove, sentRounds } from './agreements.negotiation.service'
import { readAgreementOf } from './agreements.read.service'
import { insertMarks } from './agreements.remarks.repository'
import { updateVersion } from './agreements.repository'
import { deleteRound, updateRound } from './agreements.rounds.repository'
import { agreementTextOf } from './agreements.text'

interface At {
  agreementId: string
  versionId: string
}

/** Accepts the other side's proposal: its text is fixed, to be signed by both sides. */
export async function accept(tenant: Tenant, at: At, expectedVersion: number) {
  const { negotiation, version } = await openForMove(tenant, at)
  const { row, standing, draft } = version
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('proposal')
  const move = permittedMove(tenant, 'accept', version.state, factsOf(tenant, negotiation, version))
  const { agreement, parties, timeZone, scope, characteristics } = negotiation
  if (agreement.number === null || row.number === null) throw new Error('A sent version lacks its numbers.')
  const { clauses, terms, effectiveOn } = standing
  const { text, sha256 } = agreementTextOf({
    agreement: agreement.number,
    version: row.number,
    ...parties,
    timeZone,
    scope,
    characteristics,
    clauses,
    terms,
    effectiveOn,
  })
  // Accepting the whole is a mark on everything that was not marked one by one.
  const open = acceptanceOf(sentRounds(version), version.marks)?.items.filter((item) => !item[tenant.side])
  if (open?.length) {
    const items = open.map(({ kind, clauseKey, sha256: hash }) => ({
      about: { kind, clauseKey },
      sha256: hash,
    }))
    await insertMarks(tenant, standing, items, true)
  }
  if (draft) await deleteRound(tenant, draft)
  if (!(await updateRound(tenant, standing, { state: 'accepted' }))) throw changedMeanwhile('proposal')
  const values = { state: 'agreed', effectiveOn, text, sha256, agreedAt: tenant.now } as const
  const updated = await updateVersion(tenant, row, values)
  if (!updated) throw changedMeanwhile('proposal')
  recordMove(tenant, move, agreement, updated, { round: standing.number, effectiveOn, sha256 })
  const message = agreementMessages.accepted(effectiveOn)
  tell(tenant, negotiation, updated, { side: 'other' }, message)
  tell(tenant, negotiation, updated, { side: 'own', approversOnly: true }, message)
  return readAgreementOf(tenant, agreement.id)
}

/** Ends a negotiation that both sides have not signed, with the reason. */
export async function withdraw(
  tenant: Tenant,
  at: At,
  { expectedVersion, reason }: BodyOf<typeof withdrawVersion>,
) {
  const { negotiation, version } = await openForMove(tenant, at)
  const { row, standing, draft } = version
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('proposal')
  const facts = { ...factsOf(tenant, negotiation, version), 'reason-given': reason !== '' }
  const move = permittedMove(tenant, 'withdraw', version.state, facts)
  if (draft) await deleteRound(tenant, draft)
  if (!(await updateRound(tenant, standing, { state: 'withdrawn' }))) throw changedMeanwhile('proposal')
  const updated = await updateVersion(tenant, row, {
    state: 'withdrawn',
    withdrawnAt: tenant.now,
    withdrawnBy: tenant.side,
    withdrawnReason: reason,
  })
  if (!updated) throw changedMeanwhile('proposal')
  recordMove(tenant, move, negotiation.agreement, updated)
  tell(tenant, negotiation, updated, { side: 'other' }, agreementMessages.withdrawn(reason))
  return readAgreementOf(tenant, at.agreementId)
}
