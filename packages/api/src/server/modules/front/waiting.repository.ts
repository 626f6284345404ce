import { sql } from 'drizzle-orm'
import type { WaitingAct } from '../../../contract/front'
import type { Verdict } from '@evenrule/metrology'
import type { Tenant } from '../../db/tenant'
import { waitingOf } from './waiting.pieces'

/** One row of what waits, as the database answers it. */
export interface WaitingRow {
  act: WaitingAct
  id: string
  since: string
  dueOn: string | null
  daysLeft: number | null
  partner: string | null
  name: string | null
  gaugeCode: string | null
  gaugeName: string | null
  partNumber: string | null
  number: number | null
  characteristic: string | null
  nominal: string | null
  lowerLimit: string | null
  upperLimit: string | null
  unit: string | null
  safety: boolean
  verdict: Verdict | null
  clausesMet: number | null
  clausesTotal: number | null
  count: number | null
  /** Over all rows. */
  total: number
  safetyTotal: number
  overdueTotal: number
  oldest: string
}

/** One page of what waits for this side, what is overdue first, then the longest; every row carries the totals. */
export async function selectWaiting(
  tenant: Tenant,
  { limit, offset, descending }: { limit: number; offset: number; descending: boolean },
): Promise<WaitingRow[]> {
  const { rows } = await tenant.tx.execute<{ [K in keyof WaitingRow]: WaitingRow[K] }>(sql`
    with waiting as (${waitingOf(tenant)})
    select w.act, w.id, w.since, w.due_on::text as "dueOn", w.days_left as "daysLeft", o.name as partner, w.name, w.gauge_code as "gaugeCode",
      w.gauge_name as "gaugeName", w.part_number as "partNumber", c.number, c.name as characteristic, c.nominal,
      c.lower_limit as "lowerLimit", c.upper_limit as "upperLimit", c.unit,
      (w.safety or coalesce(c.class = 'safety', false)) as safety, w.verdict, w.clauses_met as "clausesMet",
      w.clauses_total as "clausesTotal", w.count, count(*) over ()::integer as total,
      (count(*) filter (where w.safety) over ())::integer as "safetyTotal",
      (count(*) filter (where w.days_left < 0) over ())::integer as "overdueTotal", min(w.since) over () as oldest
    from waiting w
    left join organisations o on o.id = w.partner_id
    left join characteristics c on c.id = w.characteristic_id
    order by coalesce(w.days_left < 0, false) desc, w.since ${descending ? sql`desc` : sql`asc`}, w.id, w.act
    limit ${limit} offset ${offset}`)
  return rows
}

/** Numbers for the navigation. */
export async function selectCounts(
  tenant: Tenant,
): Promise<{ waiting: number; agreements: number; requests: number }> {
  const { rows } = await tenant.tx.execute<{ waiting: number; agreements: number; requests: number }>(sql`
    select count(*)::integer as waiting,
      (count(*) filter (where w.act in ('sign-criteria', 'answer-proposal', 'finish-proposal')))::integer as agreements,
      (count(*) filter (where w.act = 'answer-request'))::integer as requests
    from (${waitingOf(tenant)}) w`)
  const [counts] = rows
  if (!counts) throw new Error('The counts were not answered.')
  return counts
}
