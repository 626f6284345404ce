import { clauseKey, clauseTypes, type Clause } from '@evenrule/metrology'
import type { ScopeKind } from '../../../contract/agreements'
import { resolveTerms, type Terms } from '../../../contract/terms'

/** What one version in force says, with what tells where it is from. */
export interface Saying<Source> {
  scope: ScopeKind
  clauses: readonly Clause[]
  terms: Terms
  source: Source
}

/** How wide a scope is; of two clauses with the same key the narrower scope's counts. */
const width: Record<ScopeKind, number> = { relationship: 2, part: 1, characteristic: 0 }

/** The order of the catalogue. */
export const byCatalogue = (a: Clause, b: Clause): number =>
  clauseTypes.indexOf(a.type) - clauseTypes.indexOf(b.type)

export const isTakenAway = (clause: Clause): clause is Extract<Clause, { type: 'does-not-apply' }> =>
  clause.type === 'does-not-apply'

/**
 * What counts of all that versions in force say about one characteristic, one version for each scope: for every
 * subject and measure, and for every term, what the narrowest scope says that says anything. The one home of that rule.
 */
export function whatCounts<Source>(sayings: readonly Saying<Source>[]) {
  const narrowestFirst = [...sayings].sort((a, b) => width[a.scope] - width[b.scope])
  const clauses = new Map<string, { clause: Clause; saying: Saying<Source> }>()
  for (const saying of narrowestFirst)
    for (const clause of saying.clauses) {
      const key = clauseKey(clause)
      if (!clauses.has(key)) clauses.set(key, { clause, saying })
    }
  return {
    clauses,
    terms: resolveTerms(narrowestFirst.map((saying) => ({ terms: saying.terms, source: saying }))),
  }
}
