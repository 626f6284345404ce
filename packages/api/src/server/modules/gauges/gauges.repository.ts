import { and, eq, inArray, isNull, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listGauges } from '../../../contract/gauges'
import { archivedIs, containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { sites } from '../organisations/organisations.table'
import { measuringTasks } from '../parts/parts.table'
import { hasStanding, latestOn } from './calibrations.repository'
import { gauges } from './gauges.table'

export type GaugeRow = typeof gauges.$inferSelect

const ownGauge = (tenant: Tenant, gaugeId: string) =>
  and(eq(gauges.orgId, tenant.organisationId), eq(gauges.id, gaugeId))

/** A gauge with its site, the calibration that counts on the day, and the active tasks it serves. */
function fromGauges(tenant: Tenant, day: string) {
  const latest = latestOn(tenant, gauges, day)
  const query = tenant.tx
    .select({
      gauge: gauges,
      site: sites.name,
      calibratedOn: latest.calibratedOn,
      dueOn: latest.dueOn,
      foundWithinLimits: latest.foundWithinLimits,
      tasks: sql<number>`(select count(*)::integer from measuring_tasks t where t.supplier_org_id = ${gauges.orgId} and t.gauge_id = ${gauges.id} and t.archived_at is null)`,
      total: totalOverPages,
    })
    .from(gauges)
    .leftJoin(sites, and(eq(sites.orgId, gauges.orgId), eq(sites.id, gauges.siteId)))
    .leftJoinLateral(latest, sql`true`)
    .$dynamic()
  return { query, latest }
}

export type GaugeListed = Awaited<ReturnType<typeof selectGauges>>[number]

/** One page of gauges; every row carries the total. */
export async function selectGauges(tenant: Tenant, page: QueryOf<typeof listGauges>, day: string) {
  const { code, name, createdAt } = gauges
  const { query, latest } = fromGauges(tenant, day)
  return query
    .where(
      and(
        eq(gauges.orgId, tenant.organisationId),
        archivedIs(page.archived, gauges.archivedAt),
        hasStanding(page.calibration, latest.dueOn, day),
        containing(page.search, code, name, sites.name),
      ),
    )
    .orderBy(
      ...orderOf({ code, name, createdAt, site: sites.name, dueOn: latest.dueOn }, page.sort, gauges.id),
    )
    .limit(windowOf(page).limit)
    .offset(windowOf(page).offset)
}

export async function selectListedGauge(
  tenant: Tenant,
  gaugeId: string,
  day: string,
): Promise<GaugeListed | undefined> {
  const [row] = await fromGauges(tenant, day).query.where(ownGauge(tenant, gaugeId))
  return row
}

export async function selectGauge(tenant: Tenant, gaugeId: string): Promise<GaugeRow | undefined> {
  const [row] = await tenant.tx.select().from(gauges).where(ownGauge(tenant, gaugeId))
  return row
}

/** Gauges by their codes with the names of their sites, archived ones too. */
export async function selectGaugesCoded({ tx, organisationId }: Tenant, codes: readonly string[]) {
  if (codes.length === 0) return []
  return tx
    .select({ gauge: gauges, site: sites.name })
    .from(gauges)
    .leftJoin(sites, and(eq(sites.orgId, gauges.orgId), eq(sites.id, gauges.siteId)))
    .where(and(eq(gauges.orgId, organisationId), inArray(gauges.code, [...codes])))
}

/** What people enter of a gauge. */
export type EnteredGauge = Pick<GaugeRow, 'code' | 'name' | 'resolution' | 'unit' | 'siteId'>

export async function insertGauge(tenant: Tenant, entered: EnteredGauge): Promise<GaugeRow> {
  const [inserted] = await tenant.tx
    .insert(gauges)
    .values({
      ...entered,
      orgId: tenant.organisationId,
      createdAt: tenant.now,
      createdBy: tenant.userId,
    })
    .returning()
  if (!inserted) throw new Error('The gauge was not stored.')
  return inserted
}

/** Changes a gauge that still has the version the sender saw; undefined where it has not. */
export async function updateGauge(
  tenant: Tenant,
  gaugeId: string,
  expectedVersion: number,
  values: Partial<EnteredGauge & Pick<GaugeRow, 'archivedAt'>>,
): Promise<GaugeRow | undefined> {
  const [updated] = await tenant.tx
    .update(gauges)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(and(ownGauge(tenant, gaugeId), eq(gauges.rowVersion, expectedVersion)))
    .returning()
  return updated
}

/** Active measuring tasks that a gauge serves. */
export async function selectTasksOfGauge({ tx, organisationId }: Tenant, gaugeId: string) {
  return tx
    .select()
    .from(measuringTasks)
    .where(
      and(
        eq(measuringTasks.supplierOrgId, organisationId),
        eq(measuringTasks.gaugeId, gaugeId),
        isNull(measuringTasks.archivedAt),
      ),
    )
}

/** Gives the customers' copies of a gauge's code and name in its active tasks the new values. */
export async function renameInTasks({ tx, organisationId }: Tenant, { id, code, name }: GaugeRow) {
  return tx
    .update(measuringTasks)
    .set({ gaugeCode: code, gaugeName: name, rowVersion: sql`${measuringTasks.rowVersion} + 1` })
    .where(
      and(
        eq(measuringTasks.supplierOrgId, organisationId),
        eq(measuringTasks.gaugeId, id),
        isNull(measuringTasks.archivedAt),
      ),
    )
    .returning()
}
