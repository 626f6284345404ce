import { otherSide, allows, type Role, type Side } from '../../../contract/access'
import { agreementHindranceSchema, type AgreementHindrance } from '../../../contract/agreements'
import {
  agreementMoves,
  type AgreementMove,
  type AgreementMoveName,
  type AgreementPrecondition,
  type AgreementVersionState,
} from '../../../contract/moves/agreement-version'
import { chooseMove, type Facts } from '../../../contract/moves/define'
import type { Tenant } from '../../db/tenant'
import { refusals, wrongVersionState } from './agreements.errors'
import {
  draftVersion,
  openVersion,
  type Negotiation,
  type VersionAtHand,
} from './agreements.negotiation.service'
import type { AgreementRow, VersionRow } from './agreements.repository'
import type { RoundRow } from './agreements.rounds.repository'
import { canBeAgreed, isEmpty } from './agreements.sendable'
import { limitsAreThoseOf } from './agreements.text'

export type AgreementFacts = Facts<AgreementPrecondition>
type Actor = Pick<Tenant, 'side' | 'roles'>

/** Rows of the table that this person may use from the state. */
const candidates = (
  { side, roles }: { side: Side; roles: readonly Role[] },
  name: AgreementMoveName,
  from: AgreementVersionState | null,
): AgreementMove[] =>
  agreementMoves.filter(
    (move) =>
      move.name === name &&
      move.side === side &&
      allows(move.permission, side, roles) &&
      (from === null ? move.from.length === 0 : (move.from as readonly string[]).includes(from)),
  )

/** What is known, before anybody acts, of the conditions of moves from a version. */
export function factsOf({ side }: Pick<Tenant, 'side'>, negotiation: Negotiation, version: VersionAtHand) {
  const { characteristics, today } = negotiation
  const { row, standing, draft, signatures } = version
  const hasSigned = (who: Side) => signatures.some((each) => each.side === who)
  return {
    'no-own-draft': draftVersion(negotiation) === undefined,
    'no-open-version': openVersion(negotiation) === undefined && !negotiation.openElsewhere,
    'own-draft': draft !== undefined,
    'answering-side': standing.side !== side,
    'own-side-stands': standing.state !== 'draft' && standing.side === side,
    // An answer that was begun to a round that its writers have replaced since is to be looked at again.
    'round-stands': !draft || draft.answersRound === null || draft.answersRound === standing.number,
    'clauses-remain': standing.clauses.length > 1 || !isEmpty({ ...standing, clauses: [] }),
    'sent-round': standing.state !== 'draft',
    'clauses-can-be-agreed': canBeAgreed(standing, negotiation),
    'effective-date-not-past': (row.effectiveOn ?? standing.effectiveOn) >= today,
    'limits-unchanged': row.text !== null && limitsAreThoseOf(row.text, characteristics),
    'own-side-has-not-signed': !hasSigned(side),
    'other-side-has-signed': hasSigned(otherSide(side)),
    'other-side-has-not-signed': !hasSigned(otherSide(side)),
  } satisfies AgreementFacts
}

/** The row of the table of moves that may be made here and now; refuses with the condition that does not hold. */
export function permittedMove(
  actor: Actor,
  name: AgreementMoveName,
  from: AgreementVersionState | null,
  facts: AgreementFacts,
): AgreementMove {
  const { move, refused } = chooseMove<AgreementPrecondition, AgreementMove>(
    candidates(actor, name, from),
    facts,
  )
  if (move) return move
  throw (refused && refusals[refused]?.()) ?? wrongVersionState(from ?? 'draft')
}

/** Conditions that a person should know of before trying; where another fails, the move is not offered at all. */
const codes: Partial<Record<AgreementPrecondition, AgreementHindrance['code']>> = {
  'no-open-version': 'negotiation-open',
  'clauses-can-be-agreed': 'clauses-cannot-be-agreed',
  'effective-date-not-past': 'effective-date-past',
  'limits-unchanged': 'limits-changed',
  'own-side-has-not-signed': 'own-side-has-signed',
  'round-stands': 'round-replaced',
  'clauses-remain': 'last-clause',
}

/** What the person may do with a version, and what keeps them from it now. */
export function offersOf(
  actor: Actor,
  negotiation: Negotiation,
  version: VersionAtHand,
): { moves: AgreementMoveName[]; hindrances: AgreementHindrance[] } {
  const known = { ...factsOf(actor, negotiation, version), 'reason-given': true, 'as-seen': true }
  const { draft } = version
  const particular: Partial<Record<AgreementMoveName, AgreementFacts>> = {
    // An answer is judged as it is drafted; one not yet written cannot be at fault.
    counter: {
      'clauses-can-be-agreed': !draft || canBeAgreed(draft, negotiation),
      'effective-date-not-past': !draft || draft.effectiveOn >= negotiation.today,
    },
    // What is left is judged once it is known which clauses are taken out.
    'withdraw-clauses': { 'clauses-can-be-agreed': true },
    mark: { 'round-stands': true },
  }
  const moves: AgreementMoveName[] = []
  const hindrances: AgreementHindrance[] = []
  for (const name of agreementHindranceSchema.shape.move.options) {
    const facts = { ...known, ...particular[name] }
    const { move, refused } = chooseMove<AgreementPrecondition, AgreementMove>(
      candidates(actor, name, version.state),
      facts,
    )
    const judged = name === 'counter' ? (draft ?? version.standing) : version.standing
    const code = refused ? codeOf(refused, judged) : undefined
    if (move || code) moves.push(name)
    if (code) hindrances.push({ move: name, code })
  }
  return { moves, hindrances }
}

const codeOf = (refused: AgreementPrecondition, judged: RoundRow) =>
  refused === 'clauses-can-be-agreed' && isEmpty(judged) ? 'no-clauses' : codes[refused]

/** Writes the event of a move: what was sent stands in the relationship's chain, drafts in one's own journal. */
export function recordMove(
  tenant: Tenant,
  move: Pick<AgreementMove, 'event' | 'name'>,
  {
    id,
    relationshipId,
    supplierOrgId,
    customerOrgId,
    number,
  }: Pick<AgreementRow, 'id' | 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'number'>,
  version: Pick<VersionRow, 'id' | 'number'>,
  data: Record<string, unknown> = {},
): void {
  const isPrivate = move.name === 'keep-draft' || move.name === 'discard-draft'
  tenant.record({
    type: move.event,
    ...(isPrivate ? {} : { relationship: { id: relationshipId, supplierOrgId, customerOrgId } }),
    subject: { type: 'agreement-version', id: version.id },
    data: { agreementId: id, agreement: number, version: version.number, ...data },
  })
}
