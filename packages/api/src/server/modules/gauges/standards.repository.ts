import { and, eq, inArray, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listStandards } from '../../../contract/standards'
import { archivedIs, containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { hasStanding, latestOn } from './calibrations.repository'
import { referenceStandards } from './gauges.table'

export type StandardRow = typeof referenceStandards.$inferSelect

const ownStandard = (tenant: Tenant, standardId: string) =>
  and(eq(referenceStandards.orgId, tenant.organisationId), eq(referenceStandards.id, standardId))

/** A reference standard with the calibration that counts on the day. */
function fromStandards(tenant: Tenant, day: string) {
  const latest = latestOn(tenant, referenceStandards, day)
  const query = tenant.tx
    .select({
      standard: referenceStandards,
      calibratedOn: latest.calibratedOn,
      dueOn: latest.dueOn,
      foundWithinLimits: latest.foundWithinLimits,
      total: totalOverPages,
    })
    .from(referenceStandards)
    .leftJoinLateral(latest, sql`true`)
    .$dynamic()
  return { query, latest }
}

export type StandardListed = Awaited<ReturnType<typeof selectStandards>>[number]

/** One page of reference standards; every row carries the total. */
export async function selectStandards(tenant: Tenant, page: QueryOf<typeof listStandards>, day: string) {
  const { code, name, createdAt, id } = referenceStandards
  const { query, latest } = fromStandards(tenant, day)
  return query
    .where(
      and(
        eq(referenceStandards.orgId, tenant.organisationId),
        archivedIs(page.archived, referenceStandards.archivedAt),
        hasStanding(page.calibration, latest.dueOn, day),
        containing(page.search, code, name),
      ),
    )
    .orderBy(...orderOf({ code, name, createdAt, dueOn: latest.dueOn }, page.sort, id))
    .limit(windowOf(page).limit)
    .offset(windowOf(page).offset)
}

export async function selectListedStandard(
  tenant: Tenant,
  standardId: string,
  day: string,
): Promise<StandardListed | undefined> {
  const [row] = await fromStandards(tenant, day).query.where(ownStandard(tenant, standardId))
  return row
}

export async function selectStandard(tenant: Tenant, standardId: string): Promise<StandardRow | undefined> {
  const [row] = await tenant.tx.select().from(referenceStandards).where(ownStandard(tenant, standardId))
  return row
}

/** What people enter of a reference standard. */
export type EnteredStandard = Pick<
  StandardRow,
  'code' | 'name' | 'certifiedValue' | 'unit' | 'expandedUncertainty'
> & { coverageFactor?: string }

/** Reference standards by their codes, archived ones too. */
export async function selectStandardsCoded(
  { tx, organisationId }: Tenant,
  codes: readonly string[],
): Promise<StandardRow[]> {
  if (codes.length === 0) return []
  return tx
    .select()
    .from(referenceStandards)
    .where(and(eq(referenceStandards.orgId, organisationId), inArray(referenceStandards.code, [...codes])))
}

export async function insertStandard(tenant: Tenant, entered: EnteredStandard): Promise<StandardRow> {
  const [inserted] = await tenant.tx
    .insert(referenceStandards)
    .values({
      ...entered,
      orgId: tenant.organisationId,
      createdAt: tenant.now,
      createdBy: tenant.userId,
    })
    .returning()
  if (!inserted) throw new Error('The reference standard was not stored.')
  return inserted
}

/** Changes a standard that still has the version the sender saw; undefined where it has not. */
export async function updateStandard(
  tenant: Tenant,
  standardId: string,
  expectedVersion: number,
  values: Partial<EnteredStandard & Pick<StandardRow, 'archivedAt'>>,
): Promise<StandardRow | undefined> {
  const [updated] = await tenant.tx
    .update(referenceStandards)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(and(ownStandard(tenant, standardId), eq(referenceStandards.rowVersion, expectedVersion)))
    .returning()
  return updated
}
