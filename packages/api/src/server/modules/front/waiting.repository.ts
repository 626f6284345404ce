import { sql, type SQL } from 'drizzle-orm'
import type { WaitingAct } from '../../../contract/front'
import type { Verdict } from '@evenrule/metrology'
import type { Side } from '../../../contract/access'
import type { Tenant } from '../../db/tenant'
import { stateToday, waitsOnSide } from '../agreements/agreements.states'

/** One row of what waits, as the database answers it. */
export interface WaitingRow {
  act: WaitingAct
  id: string
  since: string
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
  oldest: string
}

/** The acts that submissions wait for, by state, on each side. */
const submissionActs: Record<Side, SQL> = {
  supplier: sql`(values ('draft', 'finish-submission'), ('for-signature', 'sign-submission'), ('challenged', 'answer-challenge'))`,
  customer: sql`(values ('submitted', 'decide'), ('answered', 'decide'), ('awaiting-second-person', 'confirm-as-second-person'))`,
}

const ownColumn = (side: Side): SQL => sql.raw(`${side}_org_id`)
const otherColumn = (side: Side): SQL => sql.raw(side === 'supplier' ? 'customer_org_id' : 'supplier_org_id')

const waitingSubmissions = ({ side, organisationId }: Tenant): SQL => sql`
  select a.act, s.id, s.state_since as since, s.${otherColumn(side)} as partner_id, null::text as name,
    t.gauge_code, t.gauge_name, p.number as part_number, s.characteristic_id, s.safety, s.verdict, s.clauses_met,
    s.clauses_total, null::integer as count
  from submissions s
  join ${submissionActs[side]} a (state, act) on a.state = s.state
  join measuring_tasks t on t.relationship_id = s.relationship_id and t.id = s.task_id
  join parts p on p.relationship_id = s.relationship_id and p.id = s.part_id
  where s.${ownColumn(side)} = ${organisationId}::uuid`

/** Versions that wait for this side by the one rule of agreements: its draft, its answer or its signature. */
function waitingAgreements(tenant: Tenant): SQL {
  const { side, organisationId } = tenant
  const state = stateToday(tenant)
  return sql`
  select case ${state} when 'agreed' then 'sign-criteria' when 'draft' then 'finish-proposal'
      else 'answer-proposal' end as act, a.id,
    coalesce(agreement_versions.agreed_at, r.sent_at, agreement_versions.created_at) as since,
    a.${otherColumn(side)} as partner_id, a.number::text as name,
    null::text as gauge_code, null::text as gauge_name, p.number as part_number, a.characteristic_id,
    exists (select 1 from characteristics c where c.relationship_id = a.relationship_id and c.class = 'safety'
      and c.archived_at is null and (a.part_id is null or c.part_id = a.part_id)
      and (a.characteristic_id is null or c.id = a.characteristic_id)) as safety,
    null::text as verdict, null::integer as clauses_met, null::integer as clauses_total,
    jsonb_array_length(r.clauses) as count
  from agreement_versions
  join agreements a on a.relationship_id = agreement_versions.relationship_id and a.id = agreement_versions.agreement_id
  join relationships on relationships.id = agreement_versions.relationship_id
  join lateral (select r.side, r.sent_at, r.clauses from agreement_rounds r
    where r.relationship_id = agreement_versions.relationship_id and r.version_id = agreement_versions.id
    order by (r.state = 'draft'), r.number desc limit 1) r on true
  left join parts p on p.relationship_id = a.relationship_id and p.id = a.part_id
  where a.${ownColumn(side)} = ${organisationId}::uuid and ${waitsOnSide(state, sql`r.side`, side)}`
}

/** Studies of the supplier that were registered and have no result yet. */
const waitingStudies = ({ organisationId }: Tenant): SQL => sql`
  select 'take-readings' as act, s.id, s.registered_at as since, null::uuid as partner_id, s.code as name,
    g.code as gauge_code, g.name as gauge_name, null::text as part_number,
    (select t.characteristic_id from study_tasks k join measuring_tasks t on t.relationship_id = k.relationship_id
      and t.id = k.task_id where k.org_id = s.org_id and k.study_id = s.id order by k.task_id limit 1)
      as characteristic_id,
    false as safety, null::text as verdict, null::integer as clauses_met, null::integer as clauses_total,
    s.planned_readings as count
  from studies s join gauges g on g.org_id = s.org_id and g.id = s.gauge_id
  where s.org_id = ${organisationId}::uuid and s.state in ('registered', 'collecting')`

/** Parts whose supplier entered characteristics that the customer has not confirmed. */
const waitingCharacteristics = ({ organisationId }: Tenant): SQL => sql`
  select 'confirm-characteristics' as act, p.id, min(c.created_at) as since, p.supplier_org_id as partner_id,
    null::text as name, null::text as gauge_code, null::text as gauge_name, p.number as part_number,
    null::uuid as characteristic_id, bool_or(c.class = 'safety') as safety, null::text as verdict,
    null::integer as clauses_met, null::integer as clauses_total, count(*)::integer as count
  from characteristics c join parts p on p.relationship_id = c.relationship_id and p.id = c.part_id
  where c.customer_org_id = ${organisationId}::uuid and not c.confirmed_by_customer and c.archived_at is null
    and p.archived_at is null
  group by p.id`

/** One page of what waits for this side, the longest first; every row carries the totals. */
export async function selectWaiting(
  tenant: Tenant,
  { limit, offset, descending }: { limit: number; offset: number; descending: boolean },
): Promise<WaitingRow[]> {
  const own = tenant.side === 'supplier' ? waitingStudies(tenant) : waitingCharacteristics(tenant)
  const { rows } = await tenant.tx.execute<{ [K in keyof WaitingRow]: WaitingRow[K] }>(sql`
    with waiting as (
      ${waitingSubmissions(tenant)} union all ${waitingAgreements(tenant)} union all ${own})
    select w.act, w.id, w.since, o.name as partner, w.name, w.gauge_code as "gaugeCode",
      w.gauge_name as "gaugeName", w.part_number as "partNumber", c.number, c.name as characteristic, c.nominal,
      c.lower_limit as "lowerLimit", c.upper_limit as "upperLimit", c.unit,
      (w.safety or coalesce(c.class = 'safety', false)) as safety, w.verdict, w.clauses_met as "clausesMet",
      w.clauses_total as "clausesTotal", w.count, count(*) over ()::integer as total,
      (count(*) filter (where w.safety) over ())::integer as "safetyTotal", min(w.since) over () as oldest
    from waiting w
    left join organisations o on o.id = w.partner_id
    left join characteristics c on c.id = w.characteristic_id
    order by w.since ${descending ? sql`desc` : sql`asc`}, w.id
    limit ${limit} offset ${offset}`)
  return rows
}

/** Numbers for the navigation. */
export async function selectCounts(tenant: Tenant): Promise<{ waiting: number; agreements: number }> {
  const own = tenant.side === 'supplier' ? waitingStudies(tenant) : waitingCharacteristics(tenant)
  const { rows } = await tenant.tx.execute<{ waiting: number; agreements: number }>(sql`
    with submissions_waiting as (${waitingSubmissions(tenant)}), agreements_waiting as (${waitingAgreements(tenant)}),
      own_waiting as (${own}), agreed as (select count(*)::integer as n from agreements_waiting)
    select ((select count(*) from submissions_waiting) + agreed.n + (select count(*) from own_waiting))::integer
        as waiting,
      agreed.n as agreements
    from agreed`)
  const [counts] = rows
  if (!counts) throw new Error('The counts were not answered.')
  return counts
}
