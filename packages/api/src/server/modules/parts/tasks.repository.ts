import { and, eq, inArray, isNull, ne, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import type { QueryOf } from '../../../contract/define'
import type { listTasks } from '../../../contract/tasks'
import { archivedIs, containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { isCurrentRevision } from './characteristics.repository'
import { characteristics, measuringTasks, partRevisions, parts } from './parts.table'

export type TaskRow = typeof measuringTasks.$inferSelect

const supplier = alias(organisations, 'supplier')
const customer = alias(organisations, 'customer')

/** Rows of the relationships in which this organisation stands on the side it acts on. */
export const ownTasks = (tenant: Tenant) =>
  eq(
    tenant.side === 'supplier' ? measuringTasks.supplierOrgId : measuringTasks.customerOrgId,
    tenant.organisationId,
  )

const fields = {
  task: measuringTasks,
  characteristic: characteristics,
  part: parts,
  revision: partRevisions,
  isCurrent: isCurrentRevision,
  supplierName: supplier.name,
  customerName: customer.name,
  total: totalOverPages,
}

/** A task with its characteristic, part and revision, and the names of both parties. */
export const fromTasks = (tenant: Tenant) =>
  tenant.tx
    .select(fields)
    .from(measuringTasks)
    .innerJoin(
      characteristics,
      and(
        eq(characteristics.relationshipId, measuringTasks.relationshipId),
        eq(characteristics.id, measuringTasks.characteristicId),
      ),
    )
    .innerJoin(
      parts,
      and(eq(parts.relationshipId, measuringTasks.relationshipId), eq(parts.id, measuringTasks.partId)),
    )
    .innerJoin(
      partRevisions,
      and(
        eq(partRevisions.relationshipId, characteristics.relationshipId),
        eq(partRevisions.id, characteristics.revisionId),
      ),
    )
    .innerJoin(supplier, eq(supplier.id, measuringTasks.supplierOrgId))
    .innerJoin(customer, eq(customer.id, measuringTasks.customerOrgId))
    .$dynamic()

export type TaskListed = Awaited<ReturnType<typeof selectTasks>>[number]

/** One page of tasks; every row carries the total. */
export async function selectTasks(tenant: Tenant, query: QueryOf<typeof listTasks>) {
  const { gaugeCode, gaugeName, site, processStep, createdAt } = measuringTasks
  const sorts = { part: parts.number, characteristic: characteristics.number, gauge: gaugeCode, createdAt }
  return fromTasks(tenant)
    .where(
      and(
        ownTasks(tenant),
        query.relationshipId ? eq(measuringTasks.relationshipId, query.relationshipId) : undefined,
        query.partId ? eq(measuringTasks.partId, query.partId) : undefined,
        query.revisionId ? eq(characteristics.revisionId, query.revisionId) : undefined,
        query.characteristicId ? eq(measuringTasks.characteristicId, query.characteristicId) : undefined,
        // Ids of gauges are the supplier's own affair.
        query.gaugeId && tenant.side === 'supplier' ? eq(measuringTasks.gaugeId, query.gaugeId) : undefined,
        archivedIs(query.archived, measuringTasks.archivedAt),
        containing(
          query.search,
          parts.number,
          parts.supplierNumber,
          characteristics.name,
          gaugeCode,
          gaugeName,
          site,
          processStep,
        ),
      ),
    )
    .orderBy(...orderOf(sorts, query.sort, measuringTasks.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectListedTask(tenant: Tenant, taskId: string): Promise<TaskListed | undefined> {
  const [row] = await fromTasks(tenant).where(and(ownTasks(tenant), eq(measuringTasks.id, taskId)))
  return row
}

/** Tasks of this side by id, archived or not. */
export async function selectListedTasks(tenant: Tenant, taskIds: readonly string[]): Promise<TaskListed[]> {
  if (taskIds.length === 0) return []
  return fromTasks(tenant).where(and(ownTasks(tenant), inArray(measuringTasks.id, [...taskIds])))
}

export async function selectTask(tenant: Tenant, taskId: string): Promise<TaskRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(measuringTasks)
    .where(and(ownTasks(tenant), eq(measuringTasks.id, taskId)))
  return row
}

/** Every active task of some parts, of all their revisions. */
export async function selectTasksOfParts(tenant: Tenant, partIds: readonly string[]): Promise<TaskListed[]> {
  if (partIds.length === 0) return []
  return fromTasks(tenant).where(
    and(ownTasks(tenant), inArray(measuringTasks.partId, [...partIds]), isNull(measuringTasks.archivedAt)),
  )
}

/** Every active task of a revision; a revision has a few dozen at most. */
export async function selectTasksOfRevision(tenant: Tenant, revisionId: string): Promise<TaskListed[]> {
  return fromTasks(tenant)
    .where(
      and(ownTasks(tenant), eq(characteristics.revisionId, revisionId), isNull(measuringTasks.archivedAt)),
    )
    .orderBy(characteristics.number, measuringTasks.id)
}

/** An active task other than `exceptId` for the same characteristic, gauge, site and process step. */
export async function selectSameTask(
  tenant: Tenant,
  {
    relationshipId,
    characteristicId,
    gaugeId,
    site,
    processStep,
  }: Pick<TaskRow, 'relationshipId' | 'characteristicId' | 'gaugeId' | 'site' | 'processStep'>,
  exceptId?: string,
): Promise<string | undefined> {
  const [row] = await tenant.tx
    .select({ id: measuringTasks.id })
    .from(measuringTasks)
    .where(
      and(
        ownTasks(tenant),
        eq(measuringTasks.relationshipId, relationshipId),
        eq(measuringTasks.characteristicId, characteristicId),
        eq(measuringTasks.gaugeId, gaugeId),
        isNull(measuringTasks.archivedAt),
        sql`${measuringTasks.site} is not distinct from ${site}`,
        sql`${measuringTasks.processStep} is not distinct from ${processStep}`,
        exceptId ? ne(measuringTasks.id, exceptId) : undefined,
      ),
    )
    .limit(1)
  return row?.id
}

export async function insertTask({ tx }: Tenant, row: typeof measuringTasks.$inferInsert): Promise<TaskRow> {
  const [inserted] = await tx.insert(measuringTasks).values(row).returning()
  if (!inserted) throw new Error('The measuring task was not stored.')
  return inserted
}

/** Changes a task that still has the version the sender saw; undefined where it has not. */
export async function updateTask(
  tenant: Tenant,
  taskId: string,
  expectedVersion: number,
  values: Partial<Pick<TaskRow, 'site' | 'processStep' | 'archivedAt'>>,
): Promise<TaskRow | undefined> {
  const [updated] = await tenant.tx
    .update(measuringTasks)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(
      and(ownTasks(tenant), eq(measuringTasks.id, taskId), eq(measuringTasks.rowVersion, expectedVersion)),
    )
    .returning()
  return updated
}
