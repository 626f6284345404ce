import { and, eq, exists, lt, lte, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listRequests } from '../../../contract/requests'
import { ownSide } from '../../db/own-side'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { organisations } from '../organisations/organisations.table'
import { relationships } from '../relationships/relationships.table'
import { daysLeft, progressColumns, progressOf, stateOfRequest } from './requests.progress'
import { requests, requestTasks } from './requests.table'

/** How near a day has to be to count as soon. */
const soonDays = 30

/** Requests of this side with what follows from their answers, the partner's name and the days left. */
const fromRequests = (tenant: Tenant) =>
  tenant.tx
    .select({
      request: requests,
      ...progressColumns,
      state: stateOfRequest,
      daysLeft: daysLeft(tenant),
      partner: { id: organisations.id, name: organisations.name },
      timeZone: relationships.timeZone,
      total: totalOverPages,
    })
    .from(requests)
    .innerJoin(relationships, eq(relationships.id, requests.relationshipId))
    .innerJoin(
      organisations,
      eq(organisations.id, tenant.side === 'supplier' ? requests.customerOrgId : requests.supplierOrgId),
    )
    .innerJoin(
      progressOf(tenant),
      sql`progress.relationship_id = ${requests.relationshipId} and progress.request_id = ${requests.id}`,
    )
    .$dynamic()

export type RequestListed = Awaited<ReturnType<typeof selectRequests>>[number]

/** One page of requests; every row carries the total. */
export async function selectRequests(tenant: Tenant, query: QueryOf<typeof listRequests>) {
  const { dueOn, number, askedAt, occasion, relationshipId } = requests
  const sorts = { dueOn, number, askedAt, partner: organisations.name, owed: progressColumns.owed }
  const left = daysLeft(tenant)
  const isOpen = eq(stateOfRequest, 'open')
  return fromRequests(tenant)
    .where(
      and(
        ownSide(tenant, requests),
        query.state ? eq(stateOfRequest, query.state) : undefined,
        query.due === 'overdue' ? and(isOpen, lt(left, 0)) : undefined,
        query.due === 'soon' ? and(isOpen, lte(left, soonDays)) : undefined,
        query.occasion ? eq(occasion, query.occasion) : undefined,
        query.relationshipId ? eq(relationshipId, query.relationshipId) : undefined,
        query.taskId ? exists(asksFor(tenant, query.taskId)) : undefined,
        containing(query.search, sql`${number}::text`, requests.words, organisations.name, namesOfTasks),
      ),
    )
    .orderBy(...orderOf(sorts, query.sort, requests.id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

const asksFor = ({ tx }: Tenant, taskId: string) =>
  tx
    .select({ one: sql`1` })
    .from(requestTasks)
    .where(
      and(
        eq(requestTasks.relationshipId, requests.relationshipId),
        eq(requestTasks.requestId, requests.id),
        eq(requestTasks.taskId, taskId),
      ),
    )

/** Parts, characteristics and gauges of a request in one text, for the search. */
const namesOfTasks = sql`(select string_agg(concat_ws(' ', p.number, c.name, m.gauge_code, m.gauge_name), ' / ')
  from request_tasks t
  join measuring_tasks m on m.relationship_id = t.relationship_id and m.id = t.task_id
  join characteristics c on c.relationship_id = m.relationship_id and c.id = m.characteristic_id
  join parts p on p.relationship_id = m.relationship_id and p.id = m.part_id
  where t.relationship_id = ${requests.relationshipId} and t.request_id = ${requests.id})`

export async function selectListedRequest(
  tenant: Tenant,
  requestId: string,
): Promise<RequestListed | undefined> {
  const [row] = await fromRequests(tenant).where(and(ownSide(tenant, requests), eq(requests.id, requestId)))
  return row
}

/** Every open request of this side, for reminders. */
export async function selectOpenRequests(tenant: Tenant): Promise<RequestListed[]> {
  return fromRequests(tenant)
    .where(and(ownSide(tenant, requests), eq(stateOfRequest, 'open')))
    .orderBy(requests.dueOn, requests.id)
}
