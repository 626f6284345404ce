import type { agreements, Side } from '@evenrule/api/contract'
import { compareWords as words } from '../../strings/rounds'
import { compareClauses } from './differences'
import { versionInForce } from './negotiation'
import { clausePoint, firstDayPoint, termsPoint, type PointRow } from './pointRows'

/** A round of an agreement that can be held against another. */
export interface ComparableRound {
  /** Version and number of the round. */
  value: string
  title: string
  round: agreements.AgreementRound
}

/** Every round of every version this side may see, the earliest first. */
export function comparableRounds(
  { versions, inForce }: Pick<agreements.Agreement, 'versions' | 'inForce'>,
  side: Side,
  other: string,
): ComparableRound[] {
  const several = versions.length > 1
  return [...versions].reverse().flatMap((version) =>
    version.rounds.map((round) => {
      const name = words.round(
        several ? words.version(version.number) : '',
        round.number,
        round.side,
        side,
        other,
      )
      const standsInForce = version.id === inForce?.versionId && round === version.rounds.at(-1)
      return {
        value: `${version.id} ${round.id}`,
        title: standsInForce ? `${name} (${words.inForce})` : name,
        round,
      }
    }),
  )
}

/** The two rounds to begin with: the one before the last, or what is in force, and the last of the version shown. */
export function firstPair(
  agreement: agreements.Agreement,
  version: agreements.AgreementVersion,
  rounds: readonly ComparableRound[],
): { from: string; to: string } {
  const at = (of: agreements.AgreementVersion | undefined, place: number): string | undefined => {
    const round = of?.rounds.at(place)
    return rounds.find((each) => each.round === round)?.value
  }
  const inForce = versionInForce(agreement)
  const to = at(version, -1) ?? ''
  const from = at(version, -2) ?? (inForce?.id === version.id ? undefined : at(inForce, -1)) ?? to
  return { from, to }
}

/** What one round says otherwise than another, and what both say alike. */
export function roundPoints(
  from: agreements.AgreementRound,
  to: agreements.AgreementRound,
): { differing: PointRow[]; same: PointRow[] } {
  const terms = termsPoint(from.terms, to.terms)
  const points = [
    ...compareClauses(from.clauses, to.clauses).map(clausePoint),
    ...(terms ? [terms] : []),
    firstDayPoint(from.effectiveOn, to.effectiveOn),
  ]
  return {
    differing: points.filter(({ change }) => change !== 'same'),
    same: points.filter(({ change }) => change === 'same'),
  }
}
