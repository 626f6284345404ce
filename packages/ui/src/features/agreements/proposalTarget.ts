import type { agreements } from '@evenrule/api/contract'
import { ownDraft, standingRound } from './negotiation'
import { dayAfter, typedClauses, type TypedProposal } from './proposalDraft'
import { typedTerms } from './typedTerms'
import type { Snapshot } from './useConcurrent'

type Version = agreements.AgreementVersion

/** What a proposal is written for: an unsent round of one's own, an answer to the other side, a new version. */
export type ProposalTarget = {
  initial: TypedProposal
  /** The challenge that asks for the change, where one does. */
  caseOf: agreements.AgreementCase | null
} & (
  | { kind: 'draft'; version: Version; round: agreements.AgreementRound }
  | { kind: 'answer'; version: Version }
  | { kind: 'begin' }
)

/** Where what is typed is kept, by the version or, for one that is not begun, the agreement. */
export const proposalKey = (id: string): string => `agreement.proposal.${id}`

/** Days from today that a new proposal offers as its first day: time for an answer and two signatures. */
export const usualLead = 30

/** The proposal that can be written in a version: one's own draft, else an answer to the round that stands. */
export function proposalTarget(
  agreement: agreements.Agreement | undefined,
  version: Version | undefined,
  caseOf: agreements.AgreementCase | null,
): ProposalTarget | undefined {
  if (!agreement || !version?.moves.includes('keep-draft')) return undefined
  const draft = ownDraft(version)
  const from = draft ?? standingRound(version)
  const initial = {
    clauses: typedClauses(from?.clauses ?? [], agreement.characteristics[0]?.unit),
    terms: typedTerms(from?.terms),
    effectiveOn:
      from && from.effectiveOn >= agreement.today ? from.effectiveOn : dayAfter(agreement.today, usualLead),
    comment: draft?.comment ?? '',
  }
  return draft
    ? { kind: 'draft', version, round: draft, initial, caseOf: caseOf ?? draft.caseOf }
    : { kind: 'answer', version, initial, caseOf }
}

/** What a proposal stands upon: the row that must still be as it was, and what it says. */
export function snapshotOf(target: ProposalTarget): Snapshot<TypedProposal> {
  const { initial: typed } = target
  if (target.kind === 'draft') {
    const { rowVersion, by, savedAt } = target.round
    return { kind: 'draft', rowVersion, typed, by, savedAt }
  }
  const rowVersion = target.kind === 'answer' ? target.version.rowVersion : null
  return { kind: target.kind, rowVersion, typed, by: undefined, savedAt: null }
}
