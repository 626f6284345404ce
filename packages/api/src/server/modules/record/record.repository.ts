import { and, asc, desc, eq, gt, inArray, sql, type SQL } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listEvents } from '../../../contract/record'
import { totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { relationships } from '../relationships/relationships.table'
import { recordEvents, recordHeads } from './record.table'

export type EventRow = typeof recordEvents.$inferSelect

/** The chains of this side: the relationships in which the organisation stands on it, and its own journal. */
const ownChains = ({ organisationId, side }: Tenant): SQL => {
  const own = side === 'supplier' ? relationships.supplierOrgId : relationships.customerOrgId
  return sql`${recordEvents.chainId} in (select ${relationships.id} from ${relationships} where ${own} = ${organisationId} union all select ${organisationId}::uuid)`
}

/** One page of events; every row carries the total. Events of one act keep their order. */
export async function selectEvents(tenant: Tenant, query: QueryOf<typeof listEvents>) {
  const { chainId, sequence, at, type, subjectType, subjectId, taskId, actorUserId } = recordEvents
  const order = query.sort === 'at' ? asc : desc
  return tenant.tx
    .select({ event: recordEvents, total: totalOverPages })
    .from(recordEvents)
    .where(
      and(
        ownChains(tenant),
        query.chainId ? eq(chainId, query.chainId) : undefined,
        query.type ? eq(type, query.type) : undefined,
        query.subjectType ? eq(subjectType, query.subjectType) : undefined,
        query.subjectId ? eq(subjectId, query.subjectId) : undefined,
        query.taskId ? eq(taskId, query.taskId) : undefined,
        query.personId ? eq(actorUserId, query.personId) : undefined,
      ),
    )
    .orderBy(order(at), asc(chainId), order(sequence))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

/** Whether the chain is this organisation's journal or one of its relationships on this side. */
export async function isOwnChain(tenant: Tenant, chainId: string): Promise<boolean> {
  if (chainId === tenant.organisationId) return true
  const own = tenant.side === 'supplier' ? relationships.supplierOrgId : relationships.customerOrgId
  const [row] = await tenant.tx
    .select({ id: relationships.id })
    .from(relationships)
    .where(and(eq(relationships.id, chainId), eq(own, tenant.organisationId)))
  return row !== undefined
}

/** The events of a chain after a number, in order, at most `limit`. */
export async function selectChainAfter(
  { tx }: Tenant,
  chainId: string,
  sequence: number,
  limit: number,
): Promise<EventRow[]> {
  return tx
    .select()
    .from(recordEvents)
    .where(and(eq(recordEvents.chainId, chainId), gt(recordEvents.sequence, sequence)))
    .orderBy(asc(recordEvents.sequence))
    .limit(limit)
}

export interface ChainEnd {
  /** What the head says; null where the chain has none. */
  head: { sequence: number; hash: string } | null
  /** Number of the last event there is. */
  last: number
}

/** The head and the last event, as they stood at one moment. */
export async function selectChainEnd({ tx }: Tenant, chainId: string): Promise<ChainEnd> {
  const { rows } = await tx.execute<{ last: number; sequence: number | null; hash: string | null }>(
    sql`select coalesce((select max(sequence) from ${recordEvents} where chain_id = ${chainId}), 0) as last, h.sequence, h.hash
      from (select 1) one left join ${recordHeads} h on h.chain_id = ${chainId}`,
  )
  const row = rows[0]
  if (!row) throw new Error('The end of the chain was not read.')
  const { last, sequence, hash } = row
  return { last, head: sequence === null || hash === null ? null : { sequence, hash } }
}

/** Names of organisations this one may see. */
export async function selectOrganisationNames(
  { tx }: Tenant,
  ids: readonly string[],
): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map()
  const rows = await tx
    .select({ id: organisations.id, name: organisations.name })
    .from(organisations)
    .where(inArray(organisations.id, [...ids]))
  return new Map(rows.map(({ id, name }) => [id, name]))
}
