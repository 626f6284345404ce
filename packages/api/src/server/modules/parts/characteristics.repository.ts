import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm'
import type { listCharacteristics } from '../../../contract/characteristics'
import type { QueryOf } from '../../../contract/define'
import { archivedIs, containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import type { PartRow } from './parts.repository'
import { characteristics, partRevisions, parts } from './parts.table'

export type CharacteristicRow = typeof characteristics.$inferSelect

/** Rows of the relationships in which this organisation stands on the side it acts on. */
const ownCharacteristics = (tenant: Tenant) =>
  eq(
    tenant.side === 'supplier' ? characteristics.supplierOrgId : characteristics.customerOrgId,
    tenant.organisationId,
  )

export const isCurrentRevision = sql<boolean>`${partRevisions.sequence} = (select max(r.sequence) from part_revisions r where r.relationship_id = ${parts.relationshipId} and r.part_id = ${parts.id})`

/**
 * The number of the signed agreement that rests on a characteristic: one that covers it and was signed when it already
 * stood there. What a later revision brings is reopened by it.
 */
const signedFor = (resting = sql`true`) => sql<number | null>`(
  select min(a.number) from agreements a
  join agreement_versions v on v.relationship_id = a.relationship_id and v.agreement_id = a.id
  where a.relationship_id = ${characteristics.relationshipId}
    and v.state = 'signed' and v.signed_at >= ${characteristics.createdAt}
    and (a.part_id is null or a.part_id = ${characteristics.partId})
    and (a.characteristic_id is null or a.characteristic_id = ${characteristics.id})
    and ${resting})`

/** The number of a submission that was decided on these limits, or is under review with them. */
const submittedWith = sql<number | null>`(
  select min(s.number) from submissions s
  where s.relationship_id = ${characteristics.relationshipId} and s.characteristic_id = ${characteristics.id}
    and s.submitted_at is not null and s.state not in ('refused', 'withdrawn'))`

/** Every signed agreement rests on the limits. */
const frozenBy = signedFor()
/** On the spread of the process those rest of which a clause takes a share of it. */
const spreadFrozenBy = signedFor(
  sql`jsonb_path_exists(v.text::jsonb, '$.clauses[*].parameters.** ? (@.base == "process" || @.kind == "process")')`,
)

const fields = {
  characteristic: characteristics,
  part: parts,
  revision: partRevisions,
  isCurrent: isCurrentRevision,
  frozenBy,
  submittedWith,
  spreadFrozenBy,
  total: totalOverPages,
}

/** A characteristic with what it belongs to. */
const fromCharacteristics = (tenant: Tenant) =>
  tenant.tx
    .select(fields)
    .from(characteristics)
    .innerJoin(
      parts,
      and(eq(parts.relationshipId, characteristics.relationshipId), eq(parts.id, characteristics.partId)),
    )
    .innerJoin(
      partRevisions,
      and(
        eq(partRevisions.relationshipId, characteristics.relationshipId),
        eq(partRevisions.id, characteristics.revisionId),
      ),
    )
    .$dynamic()

export type CharacteristicInPart = Awaited<ReturnType<typeof selectCharacteristics>>[number]

/** One page of characteristics; every row carries the total. */
export async function selectCharacteristics(tenant: Tenant, query: QueryOf<typeof listCharacteristics>) {
  const { number, name } = characteristics
  // Safety first when descending: the order of the classes, not of their names.
  const byClass = sql`array_position(array['ordinary', 'significant', 'safety'], ${characteristics.class})`
  return fromCharacteristics(tenant)
    .where(
      and(
        ownCharacteristics(tenant),
        query.relationshipId ? eq(characteristics.relationshipId, query.relationshipId) : undefined,
        query.partId ? eq(characteristics.partId, query.partId) : undefined,
        query.revisionId ? eq(characteristics.revisionId, query.revisionId) : isCurrentRevision,
        query.class ? eq(characteristics.class, query.class) : undefined,
        archivedIs(query.archived, characteristics.archivedAt),
        // Characteristics of an archived part are seen only when one asks for that part.
        query.partId ? undefined : archivedIs('active', parts.archivedAt),
        containing(query.search, name, sql`${number}::text`, parts.number, parts.supplierNumber),
      ),
    )
    .orderBy(...orderOf({ number, name, class: byClass, part: parts.number }, query.sort, characteristics.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** Every active characteristic of some revisions, by number on the drawing. */
export async function selectActiveOfRevisions(
  tenant: Tenant,
  revisionIds: readonly string[],
): Promise<CharacteristicRow[]> {
  if (revisionIds.length === 0) return []
  return tenant.tx
    .select()
    .from(characteristics)
    .where(
      and(
        ownCharacteristics(tenant),
        inArray(characteristics.revisionId, [...revisionIds]),
        isNull(characteristics.archivedAt),
      ),
    )
    .orderBy(asc(characteristics.number))
}

/** Every characteristic of some parts, of all their revisions, archived ones too. */
export async function selectCharacteristicsOfParts(
  tenant: Tenant,
  partIds: readonly string[],
): Promise<CharacteristicInPart[]> {
  if (partIds.length === 0) return []
  return fromCharacteristics(tenant).where(
    and(ownCharacteristics(tenant), inArray(characteristics.partId, [...partIds])),
  )
}

export async function selectCharacteristic(
  tenant: Tenant,
  characteristicId: string,
): Promise<CharacteristicInPart | undefined> {
  const [row] = await fromCharacteristics(tenant).where(
    and(ownCharacteristics(tenant), eq(characteristics.id, characteristicId)),
  )
  return row
}

/** What an agreement is about: the whole relationship, one part, or one characteristic of it. */
export interface ScopeOfCharacteristics {
  relationshipId: string
  partId: string | null
  characteristicId: string | null
}

/** The one characteristic of the scope, or the active ones of the current revision of each active part in it. */
export async function selectInScope(
  tenant: Tenant,
  { relationshipId, partId, characteristicId }: ScopeOfCharacteristics,
): Promise<CharacteristicInPart[]> {
  return fromCharacteristics(tenant)
    .where(
      and(
        ownCharacteristics(tenant),
        eq(characteristics.relationshipId, relationshipId),
        partId ? eq(characteristics.partId, partId) : isNull(parts.archivedAt),
        characteristicId
          ? eq(characteristics.id, characteristicId)
          : and(isCurrentRevision, isNull(characteristics.archivedAt)),
      ),
    )
    .orderBy(asc(parts.number), asc(characteristics.number), asc(characteristics.id))
}

/**
 * Keeps the characteristics of a scope from being changed, added or archived until the transaction ends. Parts are
 * locked before characteristics, and both before any agreement, always in the order of their ids; the lock of a part
 * excludes new characteristics, because their foreign key asks for one on it.
 */
export async function lockInScope(
  { tx }: Tenant,
  { relationshipId, partId, characteristicId }: ScopeOfCharacteristics,
): Promise<void> {
  if (characteristicId === null)
    await tx
      .select({ id: parts.id })
      .from(parts)
      .where(and(eq(parts.relationshipId, relationshipId), partId ? eq(parts.id, partId) : undefined))
      .orderBy(parts.id)
      .for('update')
  await tx
    .select({ id: characteristics.id })
    .from(characteristics)
    .where(
      and(
        eq(characteristics.relationshipId, relationshipId),
        partId ? eq(characteristics.partId, partId) : undefined,
        characteristicId ? eq(characteristics.id, characteristicId) : undefined,
      ),
    )
    .orderBy(characteristics.id)
    .for('share')
}

/**
 * Locks a characteristic for a change. What a signature freezes is read after it, so that an agreement signed at the
 * same instant is seen.
 */
export async function lockCharacteristic(tenant: Tenant, characteristicId: string): Promise<void> {
  await tenant.tx
    .select({ id: characteristics.id })
    .from(characteristics)
    .where(and(ownCharacteristics(tenant), eq(characteristics.id, characteristicId)))
    .for('no key update')
}

/** What people enter of a characteristic. */
export type EnteredCharacteristic = Pick<
  CharacteristicRow,
  | 'number'
  | 'name'
  | 'nominal'
  | 'lowerLimit'
  | 'upperLimit'
  | 'unit'
  | 'class'
  | 'processStandardDeviation'
  | 'confirmedByCustomer'
>

export async function insertCharacteristic(
  tenant: Tenant,
  part: PartRow,
  revisionId: string,
  entered: EnteredCharacteristic,
): Promise<CharacteristicRow> {
  const { relationshipId, supplierOrgId, customerOrgId } = part
  const [inserted] = await tenant.tx
    .insert(characteristics)
    .values({
      ...entered,
      relationshipId,
      supplierOrgId,
      customerOrgId,
      partId: part.id,
      revisionId,
      createdAt: tenant.now,
      createdBy: tenant.userId,
    })
    .returning()
  if (!inserted) throw new Error('The characteristic was not stored.')
  return inserted
}

/** Changes a characteristic that still has the version the sender saw; undefined where it has not. */
export async function updateCharacteristic(
  tenant: Tenant,
  characteristicId: string,
  expectedVersion: number,
  values: Partial<EnteredCharacteristic & Pick<CharacteristicRow, 'archivedAt'>>,
): Promise<CharacteristicRow | undefined> {
  const [updated] = await tenant.tx
    .update(characteristics)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(
      and(
        ownCharacteristics(tenant),
        eq(characteristics.id, characteristicId),
        eq(characteristics.rowVersion, expectedVersion),
      ),
    )
    .returning()
  return updated
}
