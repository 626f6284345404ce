import { and, asc, desc, eq, gt, inArray, sql, type SQL } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listEvents } from '../../../contract/record'
import { addDays } from '../../calendar'
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

/** How canonical JSON names a clause; no text of a person can look like it, because its quotes would be escaped. */
const namesClause = (clauseKey: string): string => `"clauseKey":${JSON.stringify(clauseKey)}`

/** The instant at which a calendar day begins in a time zone. */
const startOf = (day: string, timeZone: string): SQL => sql`(${day}::timestamp at time zone ${timeZone})`

/** One page of events; every row carries the total. Events of one act keep their order. */
export async function selectEvents(tenant: Tenant, query: QueryOf<typeof listEvents>, timeZone: string) {
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
        query.clauseKey ? sql`strpos(${recordEvents.text}, ${namesClause(query.clauseKey)}) > 0` : undefined,
        query.from ? sql`${at} >= ${startOf(query.from, timeZone)}` : undefined,
        query.to ? sql`${at} < ${startOf(addDays(query.to, 1), timeZone)}` : undefined,
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
  { tx }: Pick<Tenant, 'tx'>,
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
export async function selectChainEnd({ tx }: Pick<Tenant, 'tx'>, chainId: string): Promise<ChainEnd> {
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

/** At most so many of each kind to choose from; who wants more narrows by other filters first. */
const mostChoices = 200

/** Whom, which tasks and which clauses the events of the chains name, the most frequent first. */
export async function selectChoices(tenant: Tenant, chainId: string | undefined) {
  const { tx } = tenant
  const visible = and(ownChains(tenant), chainId ? eq(recordEvents.chainId, chainId) : undefined)
  const byFrequency = sql`count(*) desc`
  const people = await tx
    .select({ id: recordEvents.actorUserId, organisationId: recordEvents.actorOrgId })
    .from(recordEvents)
    .where(visible)
    .groupBy(recordEvents.actorUserId, recordEvents.actorOrgId)
    .orderBy(byFrequency)
    .limit(mostChoices)
  const tasks = await tx
    .select({ id: recordEvents.taskId })
    .from(recordEvents)
    .where(and(visible, sql`${recordEvents.taskId} is not null`))
    .groupBy(recordEvents.taskId)
    .orderBy(byFrequency)
    .limit(mostChoices)
  const found = sql<string>`(regexp_matches(${recordEvents.text}, '"clauseKey":("(?:[^"\\\\]|\\\\.)*")', 'g'))[1]`
  const named = tx
    .select({ key: found.as('key') })
    .from(recordEvents)
    .where(visible)
    .as('named')
  const keys = await tx
    .select({ key: named.key })
    .from(named)
    .groupBy(named.key)
    .orderBy(byFrequency)
    .limit(mostChoices)
  return {
    people: people.flatMap(({ id, organisationId }) => (id === null ? [] : [{ id, organisationId }])),
    taskIds: tasks.flatMap(({ id }) => id ?? []),
    clauseKeys: keys.map(({ key }) => JSON.parse(key) as string),
  }
}
