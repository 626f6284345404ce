import { clauseWarnings, safetyFlags } from '../../../contract/agreement-check'
import { sides, type Side } from '../../../contract/access'
import { namedPerFinding, type readAgreement } from '../../../contract/agreements'
import { openVersionStates } from '../../../contract/moves/agreement-version'
import type { AnswerInputOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { acceptanceOf } from './agreements.acceptance'
import { factsOf, offersOf } from './agreements.move.service'
import { sentRounds, type Negotiation, type VersionAtHand } from './agreements.negotiation.service'
import type { RoundRow } from './agreements.rounds.repository'

type VersionAnswer = AnswerInputOf<typeof readAgreement>['versions'][number]
type RoundAnswer = VersionAnswer['rounds'][number]
type Names = ReadonlyMap<string, string>

/** Everybody whose name a version shows. */
export const peopleIn = ({ rounds, comments, marks, signatures }: VersionAtHand): string[] => [
  ...rounds.map(({ createdBy }) => createdBy),
  ...comments.map(({ userId }) => userId),
  ...marks.map(({ userId }) => userId),
  ...signatures.map(({ userId }) => userId),
]

/** One version as a side sees it, with what a person of it may do. */
export function versionAnswer(
  tenant: Tenant,
  negotiation: Negotiation,
  version: VersionAtHand,
  names: Names,
): VersionAnswer {
  const { row, state, rounds, comments, marks, signatures } = version
  const nameOf = (userId: string) => names.get(userId) ?? null
  const numbers = new Map(rounds.map(({ id, number }) => [id, number]))
  const sent = sentRounds(version)
  return {
    ...row,
    state,
    caseOf: rounds.map(caseOfRound).findLast((each) => each !== null) ?? null,
    waitsOn: sides.filter((side) => waitsOn(side, negotiation, version)),
    ...offersOf(tenant, negotiation, version),
    rounds: rounds.map((round) => ({
      ...roundAnswer(round, nameOf),
      ...(round.state === 'draft' ? { number: sent.length + 1 } : {}),
      ...findingsIn(round, negotiation, version),
    })),
    comments: comments.map(({ id, roundId, about: kind, clauseKey, side, userId, at, text }) => ({
      id,
      round: numbers.get(roundId) ?? 0,
      about: { kind, clauseKey },
      side,
      by: nameOf(userId),
      at,
      text,
    })),
    acceptance: acceptanceOf(sent, marks, nameOf),
    signatures: signatures.map((each) => ({ ...each, name: nameOf(each.userId) })),
  }
}

/** The challenge attached to a round. */
export const caseOfRound = ({ caseSubmissionId, caseChallengeId }: RoundRow): RoundAnswer['caseOf'] =>
  caseSubmissionId && caseChallengeId
    ? { submissionId: caseSubmissionId, challengeId: caseChallengeId }
    : null

/** What was written in a round. */
export const roundAnswer = (
  round: RoundRow,
  nameOf: (userId: string) => string | null,
): Omit<RoundAnswer, 'warnings' | 'flags'> => ({
  ...round,
  houseTerms:
    round.houseTermsId && round.houseTermsNumber !== null
      ? { id: round.houseTermsId, number: round.houseTermsNumber }
      : null,
  caseOf: caseOfRound(round),
  by: nameOf(round.createdBy),
})

/** What is to be told of the clauses of a round that may still come into force. */
function findingsIn(
  { state, clauses }: RoundRow,
  { characteristics }: Negotiation,
  version: VersionAtHand,
): Pick<RoundAnswer, 'warnings' | 'flags'> {
  const open = ['draft', ...openVersionStates].includes(version.state)
  if (!open || !['draft', 'sent', 'accepted'].includes(state)) return { warnings: [], flags: [] }
  return {
    warnings: clauseWarnings(clauses, characteristics).map(named),
    flags: safetyFlags(clauses, characteristics).map(named),
  }
}

/** Counts all characteristics, and names the first. */
const named = <F extends { characteristicIds: string[] }>(finding: F): F => ({
  ...finding,
  characteristicIds: finding.characteristicIds.slice(0, namedPerFinding),
})

/** Whose step is next, seen from each side: the answer, a missing signature, or the sending of its draft. */
function waitsOn(side: Side, negotiation: Negotiation, version: VersionAtHand): boolean {
  const facts = factsOf({ side }, negotiation, version)
  switch (version.state) {
    case 'draft':
      return version.row.begunBy === side
    case 'proposed':
    case 'countered':
      return facts['answering-side']
    case 'agreed':
      return facts['own-side-has-not-signed']
    default:
      return false
  }
}
