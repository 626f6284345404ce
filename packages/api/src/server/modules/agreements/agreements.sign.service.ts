import type { signVersion } from '../../../contract/agreements'
import type { BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile } from '../../errors'
import { sha256 as hashOf } from '../record/record.append'
import { agreementMessages, tell } from './agreements.messages'
import { factsOf, permittedMove, recordMove } from './agreements.move.service'
import { openForMove } from './agreements.negotiation.service'
import { readAgreementOf } from './agreements.read.service'
import { updateVersion } from './agreements.repository'
import { insertSignature } from './agreements.rounds.repository'

/**
 * Signs the agreed text for this side. The limits in scope are locked first, so that none is changed at the same
 * instant: with the second signature they are frozen.
 */
export async function sign(
  tenant: Tenant,
  at: { agreementId: string; versionId: string },
  { expectedVersion, sha256 }: BodyOf<typeof signVersion>,
) {
  const { negotiation, version } = await openForMove(tenant, at, { withLimits: true })
  const { row } = version
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('agreement')
  const move = permittedMove(tenant, 'sign', version.state, {
    ...factsOf(tenant, negotiation, version),
    'as-seen': sha256 === row.sha256 && row.text !== null && hashOf(row.text) === sha256,
  })
  await insertSignature(tenant, row, { side: tenant.side, sha256 })
  const complete = move.to === 'signed'
  const updated = await updateVersion(
    tenant,
    row,
    complete ? { state: 'signed', signedAt: tenant.now } : { state: 'agreed' },
  )
  if (!updated) throw changedMeanwhile('agreement')
  recordMove(tenant, move, negotiation.agreement, updated, { sha256 })
  const effectiveOn = updated.effectiveOn ?? ''
  if (complete) {
    tell(tenant, negotiation, updated, { side: 'other' }, agreementMessages.signed(effectiveOn))
    tell(tenant, negotiation, updated, { side: 'own' }, agreementMessages.signed(effectiveOn))
  } else {
    const message = agreementMessages.signedByOne(effectiveOn)
    tell(tenant, negotiation, updated, { side: 'other', approversOnly: true }, message)
  }
  return readAgreementOf(tenant, at.agreementId)
}
