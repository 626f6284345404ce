import { canonicalText, clauseKey } from '@evenrule/metrology'
import { sides, type Side } from '../../../contract/access'
import type { Acceptance, AcceptanceItem, About } from '../../../contract/agreements-rounds'
import { saysNothing } from '../../../contract/terms'
import { sha256 } from '../record/record.append'
import type { MarkRow } from './agreements.remarks.repository'
import type { RoundRow } from './agreements.rounds.repository'

type Content = Pick<RoundRow, 'clauses' | 'terms' | 'effectiveOn'>
type Sent = Content & Pick<RoundRow, 'id' | 'number' | 'side' | 'createdBy' | 'createdAt' | 'sentAt'>
type Mark = Pick<
  MarkRow,
  'roundId' | 'about' | 'clauseKey' | 'side' | 'userId' | 'at' | 'sha256' | 'accepted'
>
type Accepted = NonNullable<AcceptanceItem['supplier']>
type NameOf = (userId: string) => string | null

/** Exactly what is accepted with one thing of a round; null for a clause that the round does not have. */
const contentOf = ({ clauses, terms, effectiveOn }: Content, { kind, clauseKey: key }: About): unknown =>
  kind === 'clause'
    ? (clauses.find((each) => clauseKey(each) === key) ?? null)
    : kind === 'terms'
      ? terms
      : effectiveOn

const hashOf = (round: Content, about: About): string => sha256(canonicalText(contentOf(round, about)))

/** Everything that any of the rounds says or leaves out, clauses in the order in which they came up. */
function thingsIn(rounds: readonly Sent[]): About[] {
  const keys = new Set(rounds.flatMap(({ clauses }) => clauses.map(clauseKey)))
  return [
    ...[...keys].map((key): About => ({ kind: 'clause', clauseKey: key })),
    ...(rounds.every(({ terms }) => saysNothing(terms))
      ? []
      : [{ kind: 'terms', clauseKey: null } satisfies About]),
    { kind: 'effective-on', clauseKey: null },
  ]
}

/**
 * Since when a side has accepted a thing as the last of the rounds has it. It counts as long as the thing stays as it
 * is from round to round: by a round of the side's own that says it, or by a mark; the last word counts.
 */
function acceptedBy(
  side: Side,
  about: About,
  rounds: readonly Sent[],
  marks: readonly Mark[],
  nameOf: NameOf,
): Accepted | null {
  const hashes = rounds.map((round) => hashOf(round, about))
  const unchangedSince = hashes.findLastIndex((hash) => hash !== hashes.at(-1)) + 1
  let accepted: Accepted | null = null
  for (const round of rounds.slice(unchangedSince)) {
    if (round.side === side)
      accepted ??= {
        round: round.number,
        how: 'written',
        by: nameOf(round.createdBy),
        at: round.sentAt ?? round.createdAt,
      }
    for (const mark of marks) {
      const meant =
        mark.roundId === round.id &&
        mark.side === side &&
        mark.about === about.kind &&
        mark.clauseKey === about.clauseKey &&
        mark.sha256 === hashes.at(-1)
      if (meant && !mark.accepted) accepted = null
      else if (meant)
        accepted ??= { round: round.number, how: 'marked', by: nameOf(mark.userId), at: mark.at }
    }
  }
  return accepted
}

/** Who has accepted what of the last round that was sent; null where none was. */
export function acceptanceOf(
  sent: readonly Sent[],
  marks: readonly Mark[],
  nameOf: NameOf = () => null,
): Acceptance | null {
  const standing = sent.at(-1)
  if (!standing) return null
  const items = thingsIn(sent).flatMap((about): AcceptanceItem[] => {
    const present = about.kind !== 'clause' || contentOf(standing, about) !== null
    // That a clause is left out is to be accepted by a side only if it had wanted or accepted the clause.
    const before = sent.slice(0, sent.findLastIndex((round) => contentOf(round, about) !== null) + 1)
    const by = (side: Side) => acceptedBy(side, about, sent, marks, nameOf)
    const matters = (side: Side) =>
      present || (by(side) === null && acceptedBy(side, about, before, marks, nameOf) !== null)
    if (!sides.some(matters)) return []
    const { kind, clauseKey: key } = about
    const sha = hashOf(standing, about)
    return [
      { kind, clauseKey: key, present, sha256: sha, supplier: by('supplier'), customer: by('customer') },
    ]
  })
  return {
    round: standing.number,
    items,
    everythingBy: sides.filter((side) => items.every((item) => item[side] !== null)),
  }
}
