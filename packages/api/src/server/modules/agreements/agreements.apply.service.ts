import { clauseKey, clauseTypes, type Clause } from '@evenrule/metrology'
import type { ScopeKind } from '../../../contract/agreements'
import type { Tenant } from '../../db/tenant'
import type { FrozenClause } from '../studies/studies.table'
import { selectFirstDayInForce, selectInForce, type CriteriaScope } from './agreements.apply.repository'

export type { CriteriaScope, FrozenClause }

/** How wide a scope is; of two clauses with the same key the narrower scope's counts. */
const width: Record<ScopeKind, number> = { relationship: 2, part: 1, characteristic: 0 }

/** What an agreement's columns say about its scope. */
export const scopeKindOf = (scope: { partId: string | null; characteristicId: string | null }): ScopeKind =>
  scope.characteristicId ? 'characteristic' : scope.partId ? 'part' : 'relationship'

const place = ({ clause }: { clause: Clause }): number => clauseTypes.indexOf(clause.type)

/**
 * The clauses that apply to a characteristic on a day: of agreements signed by both sides and in force then, the
 * narrower scope's in place of the wider's, in the order of the catalogue.
 */
export async function criteriaFor(tenant: Tenant, scope: CriteriaScope): Promise<FrozenClause[]> {
  const inForce = await selectInForce(tenant, scope)
  const found = new Map<string, FrozenClause>()
  for (const { agreement, version, clauses } of inForce) {
    const { number: agreementNumber } = agreement
    const { number: versionNumber, sha256 } = version
    if (agreementNumber === null || versionNumber === null || sha256 === null)
      throw new Error('A signed version lacks its number or its hash.')
    for (const clause of clauses) {
      const frozen: FrozenClause = {
        clauseKey: clauseKey(clause),
        clause,
        agreementId: agreement.id,
        agreementNumber,
        versionId: version.id,
        versionNumber,
        versionSha256: sha256,
        scope: scopeKindOf(agreement),
      }
      const known = found.get(frozen.clauseKey)
      if (!known || width[frozen.scope] < width[known.scope]) found.set(frozen.clauseKey, frozen)
    }
  }
  return [...found.values()].sort((a, b) => place(a) - place(b))
}

/**
 * The first day since which criteria are in force for the characteristic without a gap up to the day asked about:
 * attempts count from it. An agreement in force is only ever followed by its own later version, so the first day on
 * which any took effect is that day; null where none has.
 */
export async function criteriaSince(tenant: Tenant, scope: CriteriaScope): Promise<string | null> {
  return selectFirstDayInForce(tenant, scope)
}
