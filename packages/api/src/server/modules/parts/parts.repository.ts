import { and, eq, inArray, or, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import type { QueryOf } from '../../../contract/define'
import type { listParts } from '../../../contract/parts'
import { archivedIs, containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { relationships } from '../relationships/relationships.table'
import { partRevisions, parts } from './parts.table'

export type PartRow = typeof parts.$inferSelect

const supplier = alias(organisations, 'supplier')
const customer = alias(organisations, 'customer')

/** Rows of the relationships in which this organisation stands on the side it acts on. */
const ownParts = (tenant: Tenant) =>
  eq(tenant.side === 'supplier' ? parts.supplierOrgId : parts.customerOrgId, tenant.organisationId)

const countOfCharacteristics = (condition = sql`true`) =>
  sql<number>`(select count(*)::integer from characteristics c where c.relationship_id = ${parts.relationshipId} and c.revision_id = ${partRevisions.id} and c.archived_at is null and ${condition})`

const fields = {
  part: parts,
  revision: partRevisions,
  supplierName: supplier.name,
  customerName: customer.name,
  characteristics: countOfCharacteristics(),
  unconfirmed: countOfCharacteristics(sql`not c.confirmed_by_customer`),
  total: totalOverPages,
}

/** A part with its current revision and the names of both parties. */
const fromParts = (tenant: Tenant) =>
  tenant.tx
    .select(fields)
    .from(parts)
    .innerJoin(
      partRevisions,
      and(
        eq(partRevisions.relationshipId, parts.relationshipId),
        eq(partRevisions.partId, parts.id),
        sql`${partRevisions.sequence} = (select max(r.sequence) from part_revisions r where r.relationship_id = ${parts.relationshipId} and r.part_id = ${parts.id})`,
      ),
    )
    .innerJoin(supplier, eq(supplier.id, parts.supplierOrgId))
    .innerJoin(customer, eq(customer.id, parts.customerOrgId))
    .$dynamic()

export type PartListed = Awaited<ReturnType<typeof selectParts>>[number]

/** One page of parts; every row carries the total. */
export async function selectParts(tenant: Tenant, query: QueryOf<typeof listParts>) {
  const partner = tenant.side === 'supplier' ? customer.name : supplier.name
  const { number, supplierNumber, name, createdAt } = parts
  return fromParts(tenant)
    .where(
      and(
        ownParts(tenant),
        query.relationshipId ? eq(parts.relationshipId, query.relationshipId) : undefined,
        archivedIs(query.archived, parts.archivedAt),
        containing(query.search, number, supplierNumber, name),
      ),
    )
    .orderBy(...orderOf({ number, supplierNumber, name, createdAt, partner }, query.sort, parts.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectPart(tenant: Tenant, partId: string): Promise<PartListed | undefined> {
  const [row] = await fromParts(tenant).where(and(ownParts(tenant), eq(parts.id, partId)))
  return row
}

/** Parts of this side by the customer's or the supplier's own number, archived ones too. */
export async function selectPartsNumbered(tenant: Tenant, numbers: readonly string[]): Promise<PartListed[]> {
  if (numbers.length === 0) return []
  const wanted = [...numbers]
  return fromParts(tenant).where(
    and(ownParts(tenant), or(inArray(parts.number, wanted), inArray(parts.supplierNumber, wanted))),
  )
}

/** The two parties of a relationship in which this organisation stands on the side it acts on. */
export async function selectRelationship(tenant: Tenant, relationshipId: string) {
  const side = tenant.side === 'supplier' ? relationships.supplierOrgId : relationships.customerOrgId
  const [row] = await tenant.tx
    .select({
      relationshipId: relationships.id,
      supplierOrgId: relationships.supplierOrgId,
      customerOrgId: relationships.customerOrgId,
    })
    .from(relationships)
    .where(and(eq(relationships.id, relationshipId), eq(side, tenant.organisationId)))
  return row
}

export async function insertPart({ tx }: Tenant, row: typeof parts.$inferInsert): Promise<PartRow> {
  const [inserted] = await tx.insert(parts).values(row).returning()
  if (!inserted) throw new Error('The part was not stored.')
  return inserted
}

/** Changes a part that still has the version the sender saw; undefined where it has not. */
export async function updatePart(
  tenant: Tenant,
  partId: string,
  expectedVersion: number,
  values: Partial<Pick<PartRow, 'number' | 'supplierNumber' | 'name' | 'archivedAt'>>,
): Promise<PartRow | undefined> {
  const [updated] = await tenant.tx
    .update(parts)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(and(ownParts(tenant), eq(parts.id, partId), eq(parts.rowVersion, expectedVersion)))
    .returning()
  return updated
}

/** Whether the customer stands behind any characteristic of the part. */
export async function hasConfirmedCharacteristic({ tx }: Tenant, part: PartRow): Promise<boolean> {
  const found = await tx.execute(
    sql`select 1 from characteristics where relationship_id = ${part.relationshipId} and part_id = ${part.id} and confirmed_by_customer and archived_at is null limit 1`,
  )
  return found.rows.length > 0
}
