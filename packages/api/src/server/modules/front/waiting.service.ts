import type { QueryOf } from '../../../contract/define'
import type { listWaiting, Waiting } from '../../../contract/front'
import { windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { selectTimeZone } from '../organisations/organisations.repository'
import { ageInDays } from '../submissions/submissions.list.service'
import { countUnread } from '../notifications/messages.repository'
import { selectCounts, selectWaiting, type WaitingRow } from './waiting.repository'

/** What waits for this side and what this person has not read, in numbers. */
export const countsOf = async (tenant: Tenant) => ({
  ...(await selectCounts(tenant)),
  messages: await countUnread(tenant),
})

/** One page of what waits for this side, with how long the oldest has waited. */
export async function listOfWaiting(tenant: Tenant, query: QueryOf<typeof listWaiting>) {
  const descending = query.sort.startsWith('-')
  const rows = await selectWaiting(tenant, { ...windowOf(query), descending })
  // A page beyond the end still tells the totals.
  const [first] =
    rows.length === 0 && query.page > 1
      ? await selectWaiting(tenant, { limit: 1, offset: 0, descending })
      : rows
  const timeZone = await selectTimeZone(tenant)
  const age = (since: string) => ageInDays(tenant, timeZone, since)
  return {
    items: rows.map((row) => asAnswer(row, age(row.since))),
    total: first?.total ?? 0,
    safety: first?.safetyTotal ?? 0,
    overdue: first?.overdueTotal ?? 0,
    oldestDays: first ? age(first.oldest) : 0,
    page: query.page,
    size: query.size,
  }
}

function asAnswer(row: WaitingRow, ageDays: number): Waiting {
  const { number, characteristic, nominal, lowerLimit, upperLimit, unit, safety, gaugeCode, gaugeName } = row
  return {
    ...row,
    since: new Date(row.since).toISOString(),
    ageDays,
    gauge: gaugeCode !== null && gaugeName !== null ? { code: gaugeCode, name: gaugeName } : null,
    characteristic:
      number !== null && characteristic !== null && unit !== null
        ? { number, name: characteristic, nominal, lowerLimit, upperLimit, unit, safety }
        : null,
  }
}
