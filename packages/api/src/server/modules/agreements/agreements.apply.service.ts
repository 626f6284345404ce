import { clauseKey, clauseTypes, type Clause } from '@evenrule/metrology'
import type { readCriteria, ScopeKind } from '../../../contract/agreements'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { taskById } from '../parts/parts.lookup.service'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import type { FrozenClause } from '../studies/studies.table'
import { selectFirstDayInForce, selectInForce, type CriteriaScope } from './agreements.apply.repository'
import { scopeKindOf } from './agreements.scope'
import { readAgreementText } from './agreements.text'

export type { CriteriaScope, FrozenClause }

/** How wide a scope is; of two clauses with the same key the narrower scope's counts. */
const width: Record<ScopeKind, number> = { relationship: 2, part: 1, characteristic: 0 }

const place = ({ clause }: { clause: Clause }): number => clauseTypes.indexOf(clause.type)

/**
 * The clauses that apply to a characteristic on a day, read from the text that both sides signed: of agreements in
 * force then, the narrower scope's in place of the wider's, in the order of the catalogue.
 */
export async function criteriaFor(tenant: Tenant, scope: CriteriaScope): Promise<FrozenClause[]> {
  const found = new Map<string, FrozenClause>()
  for (const { agreement, version } of await selectInForce(tenant, scope)) {
    const { text, sha256, effectiveOn } = version
    if (agreement.number === null || version.number === null || !text || !sha256 || !effectiveOn)
      throw new Error('A signed version lacks its numbers or its text.')
    for (const clause of readAgreementText(text).clauses) {
      const frozen: FrozenClause = {
        clauseKey: clauseKey(clause),
        clause,
        agreementId: agreement.id,
        agreementNumber: agreement.number,
        versionId: version.id,
        versionNumber: version.number,
        versionSha256: sha256,
        effectiveOn,
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
