import type { AgreementScope, ScopedCharacteristic } from '../../../contract/agreements'
import { openVersionStates, type AgreementVersionState } from '../../../contract/moves/agreement-version'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { selectCharacteristic } from '../parts/characteristics.repository'
import { characteristicsInScope } from '../parts/parts.lookup.service'
import { partRow } from '../parts/parts.service'
import {
  partiesOf,
  relationshipById,
  todayIn,
  type Parties,
} from '../relationships/relationships.lookup.service'
import {
  lockAgreement,
  lockNumbering,
  selectAgreement,
  selectByScope,
  selectVersions,
  type AgreementRow,
  type VersionRow,
} from './agreements.repository'
import { selectComments, selectMarks, type CommentRow, type MarkRow } from './agreements.remarks.repository'
import {
  selectRounds,
  selectSignatures,
  type RoundRow,
  type SignatureRow,
} from './agreements.rounds.repository'
import { namedScope, type ScopeColumns } from './agreements.scope'

/** One version with everything that belongs to it, as far as this side may see it. */
export interface VersionAtHand {
  row: VersionRow
  /** Its state today: what follows from dates included. */
  state: AgreementVersionState
  rounds: RoundRow[]
  /** The last proposal sent; of a version that was never sent, its draft. */
  standing: RoundRow
  /** This side's own unsent proposal or answer. */
  draft: RoundRow | undefined
  /** In the order they were made. */
  comments: CommentRow[]
  marks: MarkRow[]
  signatures: SignatureRow[]
}

/** One agreement with what its moves are judged by. */
export interface Negotiation {
  agreement: AgreementRow
  parties: Parties
  timeZone: string
  today: string
  scope: AgreementScope
  characteristics: ScopedCharacteristic[]
  /** Drafts first, then the newest. */
  versions: VersionAtHand[]
  /** Of an agreement not sent yet: the other side has sent one of the same scope, which is under negotiation. */
  openElsewhere: boolean
}

const isOpen = ({ state }: { state: AgreementVersionState }): boolean =>
  (openVersionStates as readonly string[]).includes(state)

/** The version under negotiation, if any: at most one of an agreement is. */
export const openVersion = ({ versions }: Negotiation): VersionAtHand | undefined => versions.find(isOpen)

/** The version of this side that was never sent. */
export const draftVersion = ({ versions }: Negotiation): VersionAtHand | undefined =>
  versions.find(({ state }) => state === 'draft')

/** One agreement of this side; 404 for those of others and for the other side's drafts. */
export async function agreementById(tenant: Tenant, agreementId: string): Promise<AgreementRow> {
  const row = await selectAgreement(tenant, agreementId)
  if (!row) throw notFound('agreement')
  return row
}

/** The same with everything around it. */
export async function negotiationOf(tenant: Tenant, agreement: AgreementRow): Promise<Negotiation> {
  const relationship = await relationshipById(tenant, agreement.relationshipId)
  const selected = await selectVersions(tenant, agreement)
  const rows = selected.map(({ version }) => version)
  const rounds = await selectRounds(tenant, rows)
  const signatures = await selectSignatures(tenant, rows)
  const comments = await selectComments(tenant, rows)
  const marks = await selectMarks(tenant, rows)
  const taken = agreement.number === null ? await selectByScope(tenant, agreement, 'sent') : undefined
  return {
    agreement,
    parties: await partiesOf(tenant, relationship),
    timeZone: relationship.timeZone,
    today: todayIn(relationship, tenant),
    scope: await scopeWithNames(tenant, agreement),
    characteristics: await characteristicsInScope(tenant, agreement),
    versions: selected.map(({ version, state }) => ({
      row: version,
      state,
      ...roundsOf(rounds.filter(({ versionId }) => versionId === version.id)),
      comments: comments.filter(({ versionId }) => versionId === version.id),
      marks: marks.filter(({ versionId }) => versionId === version.id),
      signatures: signatures.filter(({ versionId }) => versionId === version.id),
    })),
    openElsewhere: taken !== undefined && (await selectVersions(tenant, taken)).some(isOpen),
  }
}

/** Rounds of a version that were sent, in their order. */
export const sentRounds = ({ rounds }: Pick<VersionAtHand, 'rounds'>): RoundRow[] =>
  rounds.filter(({ state }) => state !== 'draft')

function roundsOf(rounds: RoundRow[]): Pick<VersionAtHand, 'rounds' | 'standing' | 'draft'> {
  const standing = rounds.findLast(({ state }) => state !== 'draft') ?? rounds[0]
  if (!standing) throw new Error('A version has no proposal.')
  return { rounds, standing, draft: rounds.find(({ state }) => state === 'draft') }
}

/** Names part and characteristic of a scope; 404 where this organisation does not have them on this side. */
export async function scopeWithNames(
  tenant: Tenant,
  { partId, characteristicId }: ScopeColumns,
): Promise<AgreementScope> {
  const part = partId === null ? null : await partRow(tenant, partId)
  const found = characteristicId === null ? null : await selectCharacteristic(tenant, characteristicId)
  return namedScope(
    { partId, characteristicId },
    { part, characteristic: found?.characteristic ?? null, revision: found?.revision.label ?? null },
  )
}

/**
 * One version, with its agreement locked for a move until the transaction ends. `numbering` for a sending, which may
 * give numbers. `withLimits` keeps the limits in scope as they are: parts and characteristics are locked before the
 * agreement, as everywhere.
 */
export async function openForMove(
  tenant: Tenant,
  { agreementId, versionId }: { agreementId: string; versionId: string },
  { numbering = false, withLimits = false } = {},
): Promise<{ negotiation: Negotiation; version: VersionAtHand }> {
  const seen = await agreementById(tenant, agreementId)
  if (numbering) await lockNumbering(tenant, seen.relationshipId)
  if (withLimits) await characteristicsInScope(tenant, seen, { locked: true })
  const agreement = await lockAgreement(tenant, agreementId)
  if (!agreement) throw notFound('agreement')
  const negotiation = await negotiationOf(tenant, agreement)
  const version = negotiation.versions.find(({ row }) => row.id === versionId)
  if (!version) throw notFound('version of this agreement')
  return { negotiation, version }
}
