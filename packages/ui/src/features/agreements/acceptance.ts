import type { agreements, Side } from '@evenrule/api/contract'
import { describeKey } from '../../strings/clauses'
import { acceptanceWords as words } from '../../strings/rounds'
import { termWords } from '../../strings/terms'
import { standingRound } from './negotiation'

type Version = agreements.AgreementVersion
type Item = agreements.AcceptanceItem

/** What a mark or a comment is about, as an address of it. */
export type About = Pick<Item, 'kind' | 'clauseKey'>

export const aboutClause = (clauseKey: string): About => ({ kind: 'clause', clauseKey })
export const aboutTerms: About = { kind: 'terms', clauseKey: null }
export const aboutFirstDay: About = { kind: 'effective-on', clauseKey: null }

export const sameAbout = (a: About, b: About): boolean => a.kind === b.kind && a.clauseKey === b.clauseKey

/** What it is called in words. */
export function aboutText({ kind, clauseKey }: About): string {
  if (kind === 'terms') return termWords.heading
  if (kind === 'effective-on') return words.firstDay
  return describeKey(clauseKey ?? '')
}

export const itemOf = (version: Version, about: About): Item | undefined =>
  version.acceptance?.items.find((item) => sameAbout(item, about))

export const commentsOn = (version: Version, about: About): agreements.AgreementComment[] =>
  version.comments.filter((comment) => sameAbout(comment.about, about))

const otherSide = (side: Side): Side => (side === 'supplier' ? 'customer' : 'supplier')

/** A standing point, seen from one side: whose acceptance is there, and whether one's own is by a mark. */
export function standingOf(item: Item, side: Side) {
  const ours = item[side]
  const theirs = item[otherSide(side)]
  return { ours, theirs, both: ours !== null && theirs !== null, marked: ours?.how === 'marked' }
}

/** In one line: who stands by what, and how much of it the other side has accepted. */
export function acceptanceLine(version: Version, side: Side, other: string): string {
  const { acceptance } = version
  const round = standingRound(version)
  if (!acceptance || !round || (version.state !== 'proposed' && version.state !== 'countered')) return ''
  const ours = round.side === side
  const answering = otherSide(round.side)
  const accepted = acceptance.items.filter((item) => item[answering] !== null).length
  return ours
    ? words.lineOurs(other, accepted, acceptance.items.length)
    : words.lineTheirs(other, accepted, acceptance.items.length)
}
