import { and, eq, isNull, max } from 'drizzle-orm'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { requests, requestTasks } from './requests.table'
import type { RequestRow } from './requests.answers.repository'

/** The number that the next request of a relationship gets; the relationship is locked meanwhile. */
export async function nextRequestNumber({ tx }: Tenant, relationshipId: string): Promise<number> {
  const [row] = await tx
    .select({ highest: max(requests.number) })
    .from(requests)
    .where(eq(requests.relationshipId, relationshipId))
  return (row?.highest ?? 0) + 1
}

/** Stores a request with its measuring tasks, in the order given. */
export async function insertRequest(
  { tx }: Tenant,
  row: typeof requests.$inferInsert,
  taskIds: readonly string[],
): Promise<RequestRow> {
  const [inserted] = await tx.insert(requests).values(row).returning()
  if (!inserted) throw new Error('The request was not stored.')
  const { relationshipId, supplierOrgId, customerOrgId } = row
  await tx.insert(requestTasks).values(
    taskIds.map((taskId, position) => ({
      ...{ relationshipId, supplierOrgId, customerOrgId, taskId, position },
      requestId: inserted.id,
    })),
  )
  return inserted
}

/** Changes a request that still has the version the sender saw; undefined where it has not. */
export async function updateRequest(
  tenant: Tenant,
  { id }: Pick<RequestRow, 'id'>,
  expectedVersion: number,
  values: Partial<Pick<RequestRow, 'dueOn' | 'withdrawnAt' | 'withdrawnBy' | 'withdrawalReason'>>,
): Promise<RequestRow | undefined> {
  const [updated] = await tenant.tx
    .update(requests)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(
      and(
        ownSide(tenant, requests),
        eq(requests.id, id),
        eq(requests.rowVersion, expectedVersion),
        isNull(requests.withdrawnAt),
      ),
    )
    .returning()
  return updated
}
