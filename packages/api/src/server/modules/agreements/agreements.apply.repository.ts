import { and, asc, countDistinct, desc, eq, isNotNull, isNull, lte, not, or, sql } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { characteristics, partRevisions, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { stateToday } from './agreements.states'
import { agreements, agreementVersions } from './agreements.table'

/** Where criteria are asked for: one characteristic, on one calendar day of the relationship. */
export interface CriteriaScope {
  relationshipId: string
  partId: string
  characteristicId: string
  on: string
}

const covering = ({ partId, characteristicId }: CriteriaScope) =>
  and(
    or(isNull(agreements.partId), eq(agreements.partId, partId)),
    or(isNull(agreements.characteristicId), eq(agreements.characteristicId, characteristicId)),
  )

const ofRelationship = (tenant: Tenant, { relationshipId }: CriteriaScope) =>
  and(ownSide(tenant, agreements), eq(agreements.relationshipId, relationshipId))

/** Versions signed by both sides whose first day has come. */
const begun = ({ on }: CriteriaScope) =>
  and(eq(agreementVersions.state, 'signed'), lte(agreementVersions.effectiveOn, on))

const ofAgreement = and(
  eq(agreementVersions.relationshipId, agreements.relationshipId),
  eq(agreementVersions.agreementId, agreements.id),
)

/**
 * Of every agreement that covers the characteristic the one version in force on the day: a later signed version that
 * has taken effect replaces an earlier one.
 */
export async function selectInForce(tenant: Tenant, scope: CriteriaScope) {
  return tenant.tx
    .selectDistinctOn([agreements.id], { agreement: agreements, version: agreementVersions })
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .where(and(ofRelationship(tenant, scope), covering(scope), begun(scope)))
    .orderBy(agreements.id, desc(agreementVersions.number))
}

/** The first day on which any agreement that covers the characteristic took effect, up to the day asked about. */
export async function selectFirstDayInForce(tenant: Tenant, scope: CriteriaScope): Promise<string | null> {
  const [first] = await tenant.tx
    .select({ effectiveOn: agreementVersions.effectiveOn })
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .where(and(ofRelationship(tenant, scope), covering(scope), begun(scope)))
    .orderBy(asc(agreementVersions.effectiveOn))
    .limit(1)
  return first?.effectiveOn ?? null
}

/** A version with its agreement and the names of what that covers. */
const named = (tenant: Tenant) => ({
  agreement: agreements,
  version: agreementVersions,
  state: stateToday(tenant),
  part: { number: parts.number, name: parts.name },
  characteristic: { number: characteristics.number, name: characteristics.name },
  revision: partRevisions.label,
})
const partOf = and(eq(parts.relationshipId, agreements.relationshipId), eq(parts.id, agreements.partId))
const characteristicOf = and(
  eq(characteristics.relationshipId, agreements.relationshipId),
  eq(characteristics.id, agreements.characteristicId),
)
const revisionOf = and(
  eq(partRevisions.relationshipId, characteristics.relationshipId),
  eq(partRevisions.id, characteristics.revisionId),
)

export type NamedVersion = Awaited<ReturnType<typeof selectCovering>>[number]

/** Every version that was sent, of agreements that cover the characteristic, begun up to the day; the newest first. */
export async function selectCovering(tenant: Tenant, scope: CriteriaScope) {
  const begunOn = sql`(${agreementVersions.createdAt} at time zone ${relationships.timeZone})::date`
  return tenant.tx
    .select(named(tenant))
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .innerJoin(relationships, eq(relationships.id, agreements.relationshipId))
    .leftJoin(parts, partOf)
    .leftJoin(characteristics, characteristicOf)
    .leftJoin(partRevisions, revisionOf)
    .where(
      and(
        ofRelationship(tenant, scope),
        covering(scope),
        isNotNull(agreementVersions.number),
        sql`${begunOn} <= ${scope.on}`,
      ),
    )
    .orderBy(asc(agreements.number), desc(agreementVersions.number))
}

const elsewhere = (tenant: Tenant, scope: CriteriaScope) =>
  and(ofRelationship(tenant, scope), not(covering(scope) ?? sql`true`), begun(scope))

/** Versions in force on the day for other parts and characteristics, those of the same part first. */
export async function selectElsewhere(tenant: Tenant, scope: CriteriaScope, limit: number) {
  const inForce = sql`not exists (
    select 1 from agreement_versions later where later.relationship_id = ${agreements.relationshipId}
      and later.agreement_id = ${agreements.id} and later.state = 'signed'
      and later.number > ${agreementVersions.number} and later.effective_on <= ${scope.on})`
  return tenant.tx
    .select(named(tenant))
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .innerJoin(relationships, eq(relationships.id, agreements.relationshipId))
    .leftJoin(parts, partOf)
    .leftJoin(characteristics, characteristicOf)
    .leftJoin(partRevisions, revisionOf)
    .where(and(elsewhere(tenant, scope), inForce))
    .orderBy(desc(eq(agreements.partId, scope.partId)), asc(agreements.number))
    .limit(limit)
}

/** Of how many agreements those are. */
export async function countElsewhere(tenant: Tenant, scope: CriteriaScope): Promise<number> {
  const [row] = await tenant.tx
    .select({ agreements: countDistinct(agreements.id) })
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .where(elsewhere(tenant, scope))
  return row?.agreements ?? 0
}
