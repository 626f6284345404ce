import type { agreements, Side } from '@evenrule/api/contract'
import { clauseKey, type Clause } from '@evenrule/metrology'

type Agreement = agreements.Agreement
type Version = agreements.AgreementVersion
type Round = agreements.AgreementRound

/** The proposal that stands in a version: the last one sent, or the draft of one that was never sent. */
export const standingRound = (version: Version): Round | undefined =>
  version.rounds.findLast(({ state }) => state !== 'draft') ?? version.rounds.at(-1)

/** One's own unsent proposal or answer in a version. */
export const ownDraft = (version: Version): Round | undefined =>
  version.rounds.find(({ state }) => state === 'draft')

const openStates: readonly Version['state'][] = ['proposed', 'countered', 'agreed']
export const isOpen = ({ state }: Pick<Version, 'state'>): boolean => openStates.includes(state)

/**
 * The version a reader comes for: the one the address names, else what is under negotiation, one's own draft, what is
 * signed and still to come, what is in force, the newest.
 */
export function versionAtHand(agreement: Agreement, wanted?: string): Version | undefined {
  const { versions, inForce } = agreement
  return (
    versions.find(({ id }) => id === wanted) ??
    versions.find(isOpen) ??
    versions.find(({ state }) => state === 'draft') ??
    versions.find(({ state }) => state === 'signed') ??
    versions.find(({ id }) => id === inForce?.versionId) ??
    versions[0]
  )
}

/** What is in force now of the agreement itself. */
export function versionInForce(agreement: Agreement): Version | undefined {
  return agreement.versions.find(({ id }) => id === agreement.inForce?.versionId)
}

/** A clause of a wider scope that applies where the narrower one says nothing. */
export interface WiderClause {
  key: string
  clause: Clause
  agreementNumber: number
  scope: agreements.ScopeKind
}

/** A set of clauses as it would apply: its own, and beneath them those of the wider scopes. */
export function effectiveClauses(own: readonly Clause[], wider: readonly WiderClause[]): Clause[] {
  const keys = new Set(own.map(clauseKey))
  return [...own, ...wider.filter(({ clause }) => !keys.has(clauseKey(clause))).map(({ clause }) => clause)]
}

/** The clauses of wider agreements, the narrower agreement first; of one key the narrower's counts. */
export function widerClauses(agreementsInForce: readonly Agreement[]): WiderClause[] {
  const clauses = new Map<string, WiderClause>()
  const order: readonly agreements.ScopeKind[] = ['characteristic', 'part', 'relationship']
  const narrowerFirst = [...agreementsInForce].sort(
    (a, b) => order.indexOf(a.scope.kind) - order.indexOf(b.scope.kind),
  )
  for (const agreement of narrowerFirst) {
    const version = versionInForce(agreement)
    for (const clause of (version && standingRound(version)?.clauses) ?? [])
      if (!clauses.has(clauseKey(clause)))
        clauses.set(clauseKey(clause), {
          key: clauseKey(clause),
          clause,
          agreementNumber: agreement.number ?? 0,
          scope: agreement.scope.kind,
        })
  }
  return [...clauses.values()]
}

/** The other organisation, seen from one side. */
export const otherOf = (agreement: Pick<Agreement, 'supplier' | 'customer'>, side: Side): string =>
  side === 'supplier' ? agreement.customer.name : agreement.supplier.name

/** The earlier rounds of a version, the latest first. */
export const roundsBefore = (version: Version, round: Round | undefined): Round[] =>
  version.rounds.filter(({ number }) => round !== undefined && number < round.number).reverse()
