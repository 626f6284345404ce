import type { answerRound, beginVersion, discardDraft, saveDraft } from '../../../contract/agreements'
import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, withCurrent, type ProblemError } from '../../errors'
import { conflictIn } from './agreements.conflict'
import { draftExists } from './agreements.errors'
import { factsOf, permittedMove, recordMove } from './agreements.move.service'
import {
  negotiationOf,
  openForMove,
  type Negotiation,
  type VersionAtHand,
} from './agreements.negotiation.service'
import { readAgreementOf } from './agreements.read.service'
import {
  deleteAgreement,
  deleteVersion,
  insertAgreement,
  insertVersion,
  lockAgreement,
  lockNumbering,
  selectByScope,
  type AgreementRow,
} from './agreements.repository'
import { deleteRound, updateRound, type RoundRow } from './agreements.rounds.repository'
import { scopeAsEntered } from './agreements.scope.service'
import { sendDraftAtHand } from './agreements.send.service'
import { caseAsEntered, originOf, writeDraft } from './agreements.write.service'

interface At {
  agreementId: string
  versionId: string
}

/** Begins a version for a scope, of a new agreement or of the one there is, and sends it where asked to. */
export async function begin(
  tenant: Tenant,
  { send, houseTermsId, caseOf, ...body }: BodyOf<typeof beginVersion>,
) {
  const { relationship, ...scope } = await scopeAsEntered(tenant, body)
  await lockNumbering(tenant, scope.relationshipId)
  const drafted = await selectByScope(tenant, scope, 'own draft')
  if (drafted) throw await withDraftOf(tenant, draftExists(), drafted)
  const origin = await originOf(tenant, relationship, { houseTermsId, caseOf })
  const known = await selectByScope(tenant, scope, 'sent')
  const agreement = known
    ? await mayFollow(tenant, known)
    : await insertAgreement(tenant, {
        ...scope,
        supplierOrgId: relationship.supplierOrgId,
        customerOrgId: relationship.customerOrgId,
        begunBy: tenant.side,
        createdAt: tenant.now,
      })
  const move = permittedMove(tenant, 'keep-draft', null, { 'no-own-draft': true, 'no-open-version': true })
  const { relationshipId, supplierOrgId, customerOrgId, id: agreementId } = agreement
  const version = await insertVersion(tenant, {
    relationshipId,
    supplierOrgId,
    customerOrgId,
    agreementId,
    state: 'draft',
    begunBy: tenant.side,
    createdAt: tenant.now,
  })
  await writeDraft(tenant, version, { number: 1, answersRound: null }, { ...body, ...origin })
  if (!send) recordMove(tenant, move, agreement, version)
  return send ? sendNow(tenant, agreement, version.id) : readAgreementOf(tenant, agreement.id)
}

/** An agreement that was sent takes a next version where none is open and this side has no draft. */
async function mayFollow(tenant: Tenant, known: AgreementRow): Promise<AgreementRow> {
  const agreement = (await lockAgreement(tenant, known.id)) ?? known
  const negotiation = await negotiationOf(tenant, agreement)
  const [any] = negotiation.versions
  const drafted = negotiation.versions.find(({ state }) => state === 'draft')
  if (drafted) throw withCurrent(draftExists(), await conflictIn(tenant, negotiation, drafted))
  if (any) permittedMove(tenant, 'keep-draft', null, factsOf(tenant, negotiation, any))
  return agreement
}

async function withDraftOf(tenant: Tenant, error: ProblemError, drafted: AgreementRow) {
  const negotiation = await negotiationOf(tenant, drafted)
  const [version] = negotiation.versions
  return version ? withCurrent(error, await conflictIn(tenant, negotiation, version)) : error
}

/** Answers the other side's proposal with a changed one, kept as a draft or sent at once. */
export async function answer(
  tenant: Tenant,
  at: At,
  { expectedVersion, send, caseOf, ...written }: BodyOf<typeof answerRound>,
) {
  const { negotiation, version } = await openForMove(tenant, at)
  const { row, standing } = version
  if (row.rowVersion !== expectedVersion)
    throw withCurrent(changedMeanwhile('proposal'), await conflictIn(tenant, negotiation, version))
  if (version.draft) throw withCurrent(draftExists(), await conflictIn(tenant, negotiation, version))
  const move = permittedMove(tenant, 'keep-draft', version.state, factsOf(tenant, negotiation, version))
  const origin = await originOf(tenant, row, { houseTermsId: null, caseOf })
  const place = { number: standing.number + 1, answersRound: standing.number }
  const draft = await writeDraft(tenant, row, place, { ...written, ...origin })
  if (send)
    return readAgreementOf(tenant, await sendDraftAtHand(tenant, negotiation, withDraft(version, draft)))
  recordMove(tenant, move, negotiation.agreement, row)
  return readAgreementOf(tenant, at.agreementId)
}

/** Changes this side's draft, and sends it where asked to. */
export async function save(
  tenant: Tenant,
  at: At,
  { expectedVersion, send, answersRound, caseOf, ...written }: BodyOf<typeof saveDraft>,
) {
  const { negotiation, version } = await openDraft(tenant, at, expectedVersion, { sending: send })
  const facts = { ...factsOf(tenant, negotiation, version) }
  const move = permittedMove(tenant, 'keep-draft', version.state, facts)
  const draft = await updateRound(tenant, version.draft, {
    ...written,
    ...(caseOf ? await caseAsEntered(tenant, version.row, caseOf) : {}),
    ...(answersRound === undefined || version.draft.answersRound === null ? {} : { answersRound }),
    createdBy: tenant.userId,
    savedAt: tenant.now,
  })
  if (!draft) throw changedMeanwhile('draft')
  if (send)
    return readAgreementOf(tenant, await sendDraftAtHand(tenant, negotiation, withDraft(version, draft)))
  recordMove(tenant, move, negotiation.agreement, version.row)
  return readAgreementOf(tenant, at.agreementId)
}

/** Sends this side's draft as it stands. */
export async function send(tenant: Tenant, at: At, expectedVersion: number) {
  const { negotiation, version } = await openDraft(tenant, at, expectedVersion, { sending: true })
  return readAgreementOf(tenant, await sendDraftAtHand(tenant, negotiation, version))
}

/** Discards this side's draft; of an agreement that was never sent nothing stays. */
export async function discard(
  tenant: Tenant,
  at: At,
  expectedVersion: number,
): Promise<AnswerInputOf<typeof discardDraft>> {
  const { negotiation, version } = await openDraft(tenant, at, expectedVersion)
  const { agreement } = negotiation
  const move = permittedMove(tenant, 'discard-draft', version.state, factsOf(tenant, negotiation, version))
  recordMove(tenant, move, agreement, version.row)
  if (version.state !== 'draft') await deleteRound(tenant, version.draft)
  else await deleteVersion(tenant, version.row)
  if (agreement.number !== null) return { agreementId: agreement.id }
  await deleteAgreement(tenant, agreement)
  return { agreementId: null }
}

type WithDraft = VersionAtHand & { draft: RoundRow }

/** Opens a version of which this side has a draft that still is as the sender saw it. */
async function openDraft(
  tenant: Tenant,
  at: At,
  expectedVersion: number,
  { sending = false } = {},
): Promise<{ negotiation: Negotiation; version: WithDraft }> {
  const { negotiation, version } = await openForMove(tenant, at, { numbering: sending })
  const { draft } = version
  if (!draft || draft.rowVersion !== expectedVersion)
    throw withCurrent(changedMeanwhile('draft'), await conflictIn(tenant, negotiation, version))
  return { negotiation, version: { ...version, draft } }
}

const withDraft = (version: VersionAtHand, draft: RoundRow): VersionAtHand => ({
  ...version,
  draft,
  standing: version.state === 'draft' ? draft : version.standing,
})

async function sendNow(tenant: Tenant, agreement: AgreementRow, versionId: string) {
  const negotiation = await negotiationOf(tenant, agreement)
  const version = negotiation.versions.find(({ row }) => row.id === versionId)
  if (!version) throw new Error('The version just written is not there.')
  return readAgreementOf(tenant, await sendDraftAtHand(tenant, negotiation, version))
}
