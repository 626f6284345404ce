import { clauseKey } from '@evenrule/metrology'
import type { readCriteria, ScopeKind } from '../../../contract/agreements'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { ResolvedTerm, ResolvedTerms } from '../../../contract/terms'
import type { Tenant } from '../../db/tenant'
import { taskById } from '../parts/parts.lookup.service'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import type { FrozenClause } from '../studies/studies.table'
import { byCatalogue, isTakenAway, whatCounts, type Saying } from './agreements.apply'
import { selectFirstDayInForce, selectInForce, type CriteriaScope } from './agreements.apply.repository'
import { scopeKindOf } from './agreements.scope'
import { readAgreementText } from './agreements.text'

export type { CriteriaScope, FrozenClause }

/** A signed version in force, as what rests on it names it. */
export type VersionInForce = Omit<FrozenClause, 'clauseKey' | 'clause'>

/** What every version in force on the day says, read from the text that both sides signed. */
async function sayings(tenant: Tenant, scope: CriteriaScope): Promise<Saying<VersionInForce>[]> {
  const inForce = await selectInForce(tenant, scope)
  return inForce.map(({ agreement, version }) => {
    const { text, sha256, effectiveOn } = version
    if (agreement.number === null || version.number === null || !text || !sha256 || !effectiveOn)
      throw new Error('A signed version lacks its numbers, its day or its text.')
    const { clauses, terms } = readAgreementText(text)
    const kind: ScopeKind = scopeKindOf(agreement)
    const source: VersionInForce = {
      agreementId: agreement.id,
      agreementNumber: agreement.number,
      versionId: version.id,
      versionNumber: version.number,
      versionSha256: sha256,
      effectiveOn,
      scope: kind,
    }
    return { scope: kind, clauses, terms, source }
  })
}

/**
 * The clauses that apply to a characteristic on a day: of agreements in force then, the narrower scope's in place of
 * the wider's, without those that a narrower scope says do not apply; in the order of the catalogue.
 */
export async function criteriaFor(tenant: Tenant, scope: CriteriaScope): Promise<FrozenClause[]> {
  const { clauses } = whatCounts(await sayings(tenant, scope))
  return [...clauses.values()]
    .filter(({ clause }) => !isTakenAway(clause))
    .sort((a, b) => byCatalogue(a.clause, b.clause))
    .map(({ clause, saying }) => ({ clauseKey: clauseKey(clause), clause, ...saying.source }))
}

/** The terms that hold for a characteristic on a day, field by field, with where each comes from. */
export async function termsFor(
  tenant: Tenant,
  scope: CriteriaScope,
): Promise<{ values: ResolvedTerms; from: ResolvedTerm<VersionInForce>[] }> {
  const { values, from } = whatCounts(await sayings(tenant, scope)).terms
  return { values, from: from.map((term) => ({ ...term, source: term.source && term.source.source })) }
}

/**
 * The first day since which criteria are in force for the characteristic without a gap up to the day asked about:
 * attempts count from it. A version in force is only ever followed by a later one of its agreement, so that is the
 * first day on which any took effect; null where none has.
 */
export const criteriaSince = (tenant: Tenant, scope: CriteriaScope): Promise<string | null> =>
  selectFirstDayInForce(tenant, scope)

/** What applies to a measuring task on a day, by default today. */
export async function criteriaOfTask(
  tenant: Tenant,
  taskId: string,
  query: QueryOf<typeof readCriteria>,
): Promise<AnswerInputOf<typeof readCriteria>> {
  const { relationshipId, partId, characteristicId } = await taskById(tenant, taskId)
  const on = query.on ?? todayIn(await relationshipById(tenant, relationshipId), tenant)
  const scope = { relationshipId, partId, characteristicId, on }
  return { on, since: await criteriaSince(tenant, scope), criteria: await criteriaFor(tenant, scope) }
}
