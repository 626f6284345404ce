import type { agreements, Side } from '@evenrule/api/contract'
import { formatDate } from '../../format'
import { roomWords as words } from '../../strings/agreements'
import { countChanges, type ClauseDifference } from './differences'
import { isOpen, otherOf, ownDraft, standingRound } from './negotiation'

/** Where a version stands, the decisive sentence first, then what follows from it. */
export function roomAnswer(
  agreement: agreements.Agreement,
  version: agreements.AgreementVersion,
  side: Side,
  rows: readonly ClauseDifference[],
  today = agreement.today,
): { strong: string; rest: string[] } {
  const other = otherOf(agreement, side)
  const round = standingRound(version)
  const effectiveOn = version.effectiveOn ?? round?.effectiveOn ?? today
  const changes = agreement.inForce ? [words.changes(countChanges(rows))] : []
  const stays = agreement.inForce
    ? words.stays(agreement.number, agreement.inForce.number)
    : words.nothingInForce
  const withdrawnBy = version.withdrawnBy === side ? words.us : other
  switch (version.state) {
    case 'draft':
      return { strong: words.draft, rest: [words.draftRest(other), ...changes] }
    case 'proposed':
    case 'countered': {
      const ours = round?.side === side
      return {
        strong: ours ? words.waitsForThem(round.number, other) : words.waitsForUs(round?.number ?? 1, other),
        rest: [...changes, stays, ...(ownDraft(version) ? [words.ownDraftAnswer] : [])],
      }
    }
    case 'agreed':
      return {
        strong: words.agreed(version.waitsOn, side, other),
        rest: [...changes, words.lapses(effectiveOn), ...(agreement.inForce ? [stays] : [])],
      }
    case 'signed':
      return { strong: words.signed(effectiveOn), rest: changes }
    case 'in-force': {
      const own = round?.clauses.length ?? 0
      const wider = rows.filter(({ after }) => after).length - own
      return { strong: words.inForce(own, effectiveOn), rest: wider > 0 ? [words.fromWider(wider)] : [] }
    }
    case 'superseded':
      return { strong: words.superseded, rest: [] }
    case 'withdrawn':
      return {
        strong: words.withdrawn(withdrawnBy, formatDate(version.withdrawnAt, agreement.timeZone)),
        rest: version.withdrawnReason ? [words.reason(version.withdrawnReason)] : [],
      }
    case 'lapsed':
      return { strong: words.lapsed(effectiveOn), rest: [] }
  }
}

/** From when the question asks: a first day that is still to come, or under negotiation. */
export function askedFrom(
  agreement: Pick<agreements.Agreement, 'today'>,
  version: agreements.AgreementVersion | undefined,
): string | null {
  const effectiveOn = version && (version.effectiveOn ?? standingRound(version)?.effectiveOn)
  if (!version || !effectiveOn) return null
  const awaited = isOpen(version) || version.state === 'draft' || version.state === 'signed'
  return awaited && effectiveOn >= agreement.today ? effectiveOn : null
}
