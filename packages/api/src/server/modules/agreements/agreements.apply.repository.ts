import { and, asc, desc, eq, isNull, lte, or } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { agreements, agreementVersions } from './agreements.table'

/** Where criteria are asked for: one characteristic, on one calendar day of the relationship. */
export interface CriteriaScope {
  relationshipId: string
  partId: string
  characteristicId: string
  on: string
}

/** Versions signed by both sides whose first day has come, of every agreement that covers the characteristic. */
const signedAndBegun = (tenant: Tenant, { relationshipId, partId, characteristicId, on }: CriteriaScope) =>
  and(
    ownSide(tenant, agreements),
    eq(agreements.relationshipId, relationshipId),
    or(isNull(agreements.partId), eq(agreements.partId, partId)),
    or(isNull(agreements.characteristicId), eq(agreements.characteristicId, characteristicId)),
    eq(agreementVersions.state, 'signed'),
    lte(agreementVersions.effectiveOn, on),
  )

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
    .where(signedAndBegun(tenant, scope))
    .orderBy(agreements.id, desc(agreementVersions.number))
}

/** The first day on which any agreement that covers the characteristic took effect, up to the day asked about. */
export async function selectFirstDayInForce(tenant: Tenant, scope: CriteriaScope): Promise<string | null> {
  const [first] = await tenant.tx
    .select({ effectiveOn: agreementVersions.effectiveOn })
    .from(agreements)
    .innerJoin(agreementVersions, ofAgreement)
    .where(signedAndBegun(tenant, scope))
    .orderBy(asc(agreementVersions.effectiveOn))
    .limit(1)
  return first?.effectiveOn ?? null
}
