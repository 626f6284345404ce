import { and, eq, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import type { listAgreements } from '../../../contract/agreements'
import type { QueryOf } from '../../../contract/define'
import { ownSide } from '../../db/own-side'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { characteristics, partRevisions, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { stateToday, todayOf, waitsOnSide } from './agreements.states'
import { agreementRounds, agreements, agreementVersions } from './agreements.table'

const inForce = alias(agreementVersions, 'in_force')
const standing = alias(agreementRounds, 'standing')

/** The version in which something happens: the open one, else the side's own draft, else the last one sent. */
const newestOf = (tenant: Tenant) => sql`(
  select v.id from agreement_versions v
  where v.relationship_id = ${agreements.relationshipId} and v.agreement_id = ${agreements.id}
  order by (v.state in ('proposed', 'countered') or (v.state = 'agreed' and v.effective_on >= ${todayOf(tenant)})) desc,
    v.number desc nulls first
  limit 1)`

/** The last proposal that was sent; of a version never sent, its draft. */
const standingOf = sql`(
  select r.id from agreement_rounds r
  where r.relationship_id = ${agreementVersions.relationshipId} and r.version_id = ${agreementVersions.id}
  order by (r.state = 'draft'), r.number desc
  limit 1)`

const inForceOf = (tenant: Tenant) => sql`(
  select v.id from agreement_versions v
  where v.relationship_id = ${agreements.relationshipId} and v.agreement_id = ${agreements.id}
    and v.state = 'signed' and v.effective_on <= ${todayOf(tenant)}
  order by v.number desc
  limit 1)`

const { createdAt, agreedAt, signedAt, withdrawnAt } = agreementVersions
const changedAt =
  sql`greatest(${createdAt}, ${standing.sentAt}, ${agreedAt}, ${signedAt}, ${withdrawnAt})`.mapWith(createdAt)
const effectiveOn = sql<string>`coalesce(${agreementVersions.effectiveOn}, ${standing.effectiveOn})`

export type AgreementListed = Awaited<ReturnType<typeof selectAgreements>>[number]

/** One page of agreements with what happens in them; every row carries the total. */
export async function selectAgreements(tenant: Tenant, query: QueryOf<typeof listAgreements>) {
  const state = stateToday(tenant)
  const waits = { supplier: waitsOn('supplier'), customer: waitsOn('customer') }
  function waitsOn(side: 'supplier' | 'customer') {
    return waitsOnSide(state, sql`${standing.side}`, side)
  }
  const other = tenant.side === 'supplier' ? agreements.customerOrgId : agreements.supplierOrgId
  const sorts = {
    changed: changedAt,
    number: agreements.number,
    part: parts.number,
    other: organisations.name,
    effective: effectiveOn,
  }
  return tenant.tx
    .select({
      agreement: agreements,
      version: agreementVersions,
      standing,
      inForce,
      part: { number: parts.number, name: parts.name },
      characteristic: { number: characteristics.number, name: characteristics.name },
      revision: partRevisions.label,
      other: { id: organisations.id, name: organisations.name },
      state,
      effectiveOn,
      changedAt,
      waitsOnSupplier: waits.supplier,
      waitsOnCustomer: waits.customer,
      total: totalOverPages,
    })
    .from(agreements)
    .innerJoin(relationships, eq(relationships.id, agreements.relationshipId))
    .innerJoin(organisations, eq(organisations.id, other))
    .innerJoin(agreementVersions, eq(agreementVersions.id, newestOf(tenant)))
    .innerJoin(standing, eq(standing.id, standingOf))
    .leftJoin(inForce, eq(inForce.id, inForceOf(tenant)))
    .leftJoin(
      parts,
      and(eq(parts.relationshipId, agreements.relationshipId), eq(parts.id, agreements.partId)),
    )
    .leftJoin(
      characteristics,
      and(
        eq(characteristics.relationshipId, agreements.relationshipId),
        eq(characteristics.id, agreements.characteristicId),
      ),
    )
    .leftJoin(
      partRevisions,
      and(
        eq(partRevisions.relationshipId, characteristics.relationshipId),
        eq(partRevisions.id, characteristics.revisionId),
      ),
    )
    .where(
      and(
        ownSide(tenant, agreements),
        query.relationshipId ? eq(agreements.relationshipId, query.relationshipId) : undefined,
        query.partId ? eq(agreements.partId, query.partId) : undefined,
        query.waitsOn ? waits[query.waitsOn] : undefined,
        query.state === 'in-force'
          ? sql`${inForce.id} is not null`
          : query.state
            ? eq(state, query.state)
            : undefined,
        containing(
          query.search,
          parts.number,
          parts.supplierNumber,
          parts.name,
          characteristics.name,
          organisations.name,
        ),
      ),
    )
    .orderBy(...orderOf(sorts, query.sort, agreements.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}
