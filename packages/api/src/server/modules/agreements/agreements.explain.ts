import { clauseKey, type Clause } from '@evenrule/metrology'
import type { CriterionSource, ExplainedClause, ExplainedTerm, WhyNot } from '../../../contract/agreements'
import type { Terms } from '../../../contract/terms'
import { byCatalogue, isTakenAway, whatCounts, type Saying } from './agreements.apply'

/** What a version says, with what keeps it from counting on the day; `why` null: it is in force. */
export interface Candidate {
  source: CriterionSource
  clauses: readonly Clause[]
  terms: Terms
  why: WhyNot | null
}

/** For every subject and measure and every term: what counts, and why everything else that is said does not. */
export function explain(candidates: readonly Candidate[]): {
  clauses: ExplainedClause[]
  terms: ExplainedTerm[]
} {
  const inForce = candidates.filter(({ why }) => why === null)
  const counts = whatCounts(
    inForce.map((each): Saying<CriterionSource> => ({ ...each, scope: each.source.scope.kind })),
  )
  const covering = candidates.filter(({ why }) => !isElsewhere(why))
  const keys = [
    ...new Set(
      covering
        .flatMap(({ clauses }) => clauses)
        .sort(byCatalogue)
        .map(clauseKey),
    ),
  ]
  return {
    clauses: keys.map((key): ExplainedClause => {
      const found = counts.clauses.get(key)
      const winner = found ? { clause: found.clause, source: found.saying.source } : null
      const others = candidates.flatMap(({ source, clauses, why }) => {
        const clause = clauses.find((each) => clauseKey(each) === key)
        if (!clause || source.versionId === winner?.source.versionId) return []
        return [{ clause, source, why: why ?? narrower(winner?.source, winner?.clause) }]
      })
      return { clauseKey: key, winner, applies: winner !== null && !isTakenAway(winner.clause), others }
    }),
    terms: counts.terms.from.map(({ field, value, source: saying }): ExplainedTerm => {
      const source = saying?.source ?? null
      const others = covering.flatMap((each) => {
        const said = each.terms[field]
        if (said === null || each.source.versionId === source?.versionId) return []
        return [{ value: said, source: each.source, why: each.why ?? narrower(source) }]
      })
      return { field, value, source, others }
    }),
  }
}

const isElsewhere = (why: WhyNot | null): boolean =>
  why?.code === 'other-part' || why?.code === 'other-characteristic'

/** Why something in force does not count: the narrower scope has the word. */
function narrower(winner: CriterionSource | null | undefined, clause?: Clause): WhyNot {
  if (!winner) throw new Error('What is in force gave way to nothing.')
  const by = {
    agreementNumber: winner.agreementNumber,
    versionNumber: winner.versionNumber,
    scope: winner.scope.kind,
  }
  return clause && isTakenAway(clause)
    ? { code: 'does-not-apply', by, reason: clause.parameters.reason }
    : { code: 'wider-scope', by }
}
