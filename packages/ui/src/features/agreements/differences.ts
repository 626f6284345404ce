import { compareClauses as matchClauses, type ClauseDifference as Matched } from '@evenrule/api/contract'
import { clauseSubject, type Clause, type Subject } from '@evenrule/metrology'

export { countChanges, parameterChanges, type ParameterChange } from '@evenrule/api/contract'

/** One row of two sets of clauses side by side, headed by what it is about. */
export interface ClauseDifference extends Matched {
  subject: Subject
}

/** The decisive subject first; what is not named here follows in the order of the catalogue. */
const subjectOrder: readonly Subject[] = ['bias', 'resolution', 'calibration', 'design']
const placeOf = (subject: Subject): number => {
  const place = subjectOrder.indexOf(subject)
  return place < 0 ? subjectOrder.length : place
}

/** What the clauses of a key are about: a key is the subject and the measure. */
export const subjectOfKey = (key: string): Subject => key.split('/', 1)[0] as Subject

/** Clauses in the order in which the room names subjects. */
export const bySubject = <C extends Clause>(clauses: readonly C[]): C[] =>
  [...clauses].sort((a, b) => placeOf(clauseSubject(a)) - placeOf(clauseSubject(b)))

/**
 * Two sets of clauses row by row, matched by what they are about: the zero-difference test of one stands beside the
 * equivalence of the other.
 */
export const compareClauses = (before: readonly Clause[], after: readonly Clause[]): ClauseDifference[] =>
  matchClauses(before, after)
    .map((row) => ({ ...row, subject: subjectOfKey(row.key) }))
    .sort((a, b) => placeOf(a.subject) - placeOf(b.subject) || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0))
