import type { agreements } from '@evenrule/api/contract'
import { ownDraft, standingRound } from './negotiation'
import { dayAfter, typedClauses, type TypedProposal } from './proposalDraft'
import { typedTerms } from './typedTerms'

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
    ? { kind: 'draft', version, round: draft, initial, caseOf: draft.caseOf }
    : { kind: 'answer', version, initial, caseOf }
}

/** What a proposal was begun from: the row that must still stand as it did, and what it said. */
export interface Basis {
  kind: ProposalTarget['kind']
  rowVersion: number | null
  typed: TypedProposal
}

export function basisOf(target: ProposalTarget): Basis {
  const rowVersion =
    target.kind === 'draft'
      ? target.round.rowVersion
      : target.kind === 'answer'
        ? target.version.rowVersion
        : null
  return { kind: target.kind, rowVersion, typed: target.initial }
}

export const sameBasis = (a: Basis, b: Basis): boolean => a.kind === b.kind && a.rowVersion === b.rowVersion
