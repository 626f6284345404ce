import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listRevisions } from '../../../contract/parts'
import { newId } from '../../db/columns'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { characteristics, partRevisions } from './parts.table'
import type { PartRow } from './parts.repository'

export type RevisionRow = typeof partRevisions.$inferSelect

/** One page of the revisions of a part; every row carries the total. */
export async function selectRevisions({ tx }: Tenant, part: PartRow, query: QueryOf<typeof listRevisions>) {
  const { sequence, label } = partRevisions
  return tx
    .select({ revision: partRevisions, total: totalOverPages })
    .from(partRevisions)
    .where(
      and(
        eq(partRevisions.relationshipId, part.relationshipId),
        eq(partRevisions.partId, part.id),
        containing(query.search, label),
      ),
    )
    .orderBy(...orderOf({ sequence, label }, query.sort, partRevisions.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectRevision(
  { tx }: Tenant,
  part: PartRow,
  revisionId: string,
): Promise<RevisionRow | undefined> {
  const [row] = await tx
    .select()
    .from(partRevisions)
    .where(
      and(
        eq(partRevisions.relationshipId, part.relationshipId),
        eq(partRevisions.partId, part.id),
        eq(partRevisions.id, revisionId),
      ),
    )
  return row
}

/** The newest revisions of a part, the current one first. */
export async function selectNewestRevisions(
  { tx }: Tenant,
  part: PartRow,
  count: number,
): Promise<RevisionRow[]> {
  return tx
    .select()
    .from(partRevisions)
    .where(and(eq(partRevisions.relationshipId, part.relationshipId), eq(partRevisions.partId, part.id)))
    .orderBy(desc(partRevisions.sequence))
    .limit(count)
}

/** Every revision of some parts, in their order. */
export async function selectRevisionsOfParts(
  { tx }: Tenant,
  partIds: readonly string[],
): Promise<RevisionRow[]> {
  if (partIds.length === 0) return []
  return tx
    .select()
    .from(partRevisions)
    .where(inArray(partRevisions.partId, [...partIds]))
    .orderBy(asc(partRevisions.sequence))
}

/** Adds a revision at the end of the part's sequence. */
export async function insertRevision(tenant: Tenant, part: PartRow, label: string): Promise<RevisionRow> {
  const { relationshipId, supplierOrgId, customerOrgId } = part
  const [inserted] = await tenant.tx
    .insert(partRevisions)
    .values({
      relationshipId,
      supplierOrgId,
      customerOrgId,
      partId: part.id,
      label,
      sequence: sql`(select coalesce(max(r.sequence), 0) + 1 from part_revisions r where r.relationship_id = ${relationshipId} and r.part_id = ${part.id})`,
      createdAt: tenant.now,
      createdBy: tenant.userId,
    })
    .returning()
  if (!inserted) throw new Error('The revision was not stored.')
  return inserted
}

/**
 * Copies the active characteristics of one revision into another; returns how many there were. What the customer
 * has confirmed stays confirmed only where the customer copies it.
 */
export async function copyCharacteristics(
  tenant: Tenant,
  from: RevisionRow,
  to: RevisionRow,
): Promise<number> {
  const rows = await tenant.tx
    .select()
    .from(characteristics)
    .where(
      and(
        eq(characteristics.relationshipId, from.relationshipId),
        eq(characteristics.revisionId, from.id),
        sql`archived_at is null`,
      ),
    )
  if (rows.length === 0) return 0
  const { now: createdAt, userId: createdBy } = tenant
  await tenant.tx.insert(characteristics).values(
    rows.map((row) => ({
      ...row,
      id: newId(),
      revisionId: to.id,
      confirmedByCustomer: row.confirmedByCustomer && tenant.side === 'customer',
      createdAt,
      createdBy,
      rowVersion: 1,
    })),
  )
  return rows.length
}
