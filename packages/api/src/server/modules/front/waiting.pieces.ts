import { sql, type SQL } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { Tenant } from '../../db/tenant'
import { stateToday, waitsOnSide } from '../agreements/agreements.states'
import { progressOf } from '../requests/requests.progress'

/*
 * What waits for one side, as SQL: each piece answers the same columns, so that they make one list. `due_on` is the day
 * by which a thing is asked for; how many days are left is judged in the relationship's calendar.
 */

/** The acts that submissions wait for, by state, on each side. */
const submissionActs: Record<Side, SQL> = {
  supplier: sql`(values ('draft', 'finish-submission'), ('for-signature', 'sign-submission'),
    ('challenged', 'answer-challenge'), ('awaiting-other-side', 'agree-one-off'))`,
  customer: sql`(values ('submitted', 'decide'), ('answered', 'decide'), ('awaiting-second-person', 'confirm-as-second-person'))`,
}

const ownColumn = (side: Side): SQL => sql.raw(`${side}_org_id`)
const otherColumn = (side: Side): SQL => sql.raw(side === 'supplier' ? 'customer_org_id' : 'supplier_org_id')

const leftUntil = ({ now }: Tenant, dueOn: SQL, timeZone: SQL): SQL =>
  sql`(${dueOn} - (${now}::timestamptz at time zone ${timeZone})::date)`

/** Submissions by their state; a challenge that the customer wants to leave unresolved asks for agreement instead. */
const waitingSubmissions = (tenant: Tenant): SQL => {
  const { side, organisationId } = tenant
  return sql`
  select case when a.act = 'answer-challenge' and h.due_on is null then 'agree-unresolved' else a.act end as act,
    s.id, s.state_since as since, h.due_on, ${leftUntil(tenant, sql`h.due_on`, sql`r.time_zone`)} as days_left,
    s.${otherColumn(side)} as partner_id, null::text as name,
    t.gauge_code, t.gauge_name, p.number as part_number, s.characteristic_id, s.safety, s.verdict, s.clauses_met,
    s.clauses_total, null::integer as count
  from submissions s
  join ${submissionActs[side]} a (state, act) on a.state = s.state
  join relationships r on r.id = s.relationship_id
  left join lateral (select min(h.due_on) as due_on from challenges h where h.relationship_id = s.relationship_id
    and h.submission_id = s.id and h.state = 'open' and s.state = 'challenged' and ${side} = 'supplier') h on true
  join measuring_tasks t on t.relationship_id = s.relationship_id and t.id = s.task_id
  join parts p on p.relationship_id = s.relationship_id and p.id = s.part_id
  where s.${ownColumn(side)} = ${organisationId}::uuid`
}

/** Conditions of acceptances: whoever owes one reports it, the customer confirms what was reported. */
const waitingConditions = (tenant: Tenant): SQL => {
  const { side, organisationId } = tenant
  const ours =
    side === 'customer'
      ? sql`k.state = 'reported' or (k.state = 'open' and k.owner = 'customer')`
      : sql`k.state = 'open' and k.owner = 'supplier'`
  return sql`
  select case k.state when 'reported' then 'confirm-condition' else 'report-condition' end as act, s.id,
    d.decided_at as since, k.due_on, ${leftUntil(tenant, sql`k.due_on`, sql`r.time_zone`)} as days_left,
    s.${otherColumn(side)} as partner_id, k.number::text as name, t.gauge_code, t.gauge_name,
    p.number as part_number, s.characteristic_id, s.safety, null::text as verdict, null::integer as clauses_met,
    null::integer as clauses_total, null::integer as count
  from conditions k
  join decisions d on d.relationship_id = k.relationship_id and d.id = k.decision_id and d.state = 'final'
  join submissions s on s.relationship_id = k.relationship_id and s.id = k.submission_id
    and s.state = 'accepted-with-conditions'
  join relationships r on r.id = s.relationship_id
  join measuring_tasks t on t.relationship_id = s.relationship_id and t.id = s.task_id
  join parts p on p.relationship_id = s.relationship_id and p.id = s.part_id
  where k.${ownColumn(side)} = ${organisationId}::uuid and (${ours})`
}

/** Open requests, which wait for the supplier; `count` is how many tasks it still owes. */
const waitingRequests = (tenant: Tenant): SQL => sql`
  select 'answer-request' as act, q.id, q.asked_at as since, q.due_on,
    ${leftUntil(tenant, sql`q.due_on`, sql`r.time_zone`)} as days_left, q.customer_org_id as partner_id,
    q.number::text as name, null::text as gauge_code, null::text as gauge_name, null::text as part_number,
    null::uuid as characteristic_id,
    exists (select 1 from request_tasks x join measuring_tasks m on m.relationship_id = x.relationship_id
      and m.id = x.task_id join characteristics c on c.relationship_id = m.relationship_id
      and c.id = m.characteristic_id where x.relationship_id = q.relationship_id and x.request_id = q.id
      and c.class = 'safety') as safety,
    null::text as verdict, null::integer as clauses_met, null::integer as clauses_total, progress.owed as count
  from requests q
  join relationships r on r.id = q.relationship_id
  join ${progressOf(tenant)} on progress.relationship_id = q.relationship_id and progress.request_id = q.id
  where q.supplier_org_id = ${tenant.organisationId}::uuid and q.withdrawn_at is null and progress.owed > 0`

/** Versions that wait for this side by the one rule of agreements: its draft, its answer or its signature. */
function waitingAgreements(tenant: Tenant): SQL {
  const { side, organisationId } = tenant
  const state = stateToday(tenant)
  return sql`
  select case ${state} when 'agreed' then 'sign-criteria' when 'draft' then 'finish-proposal'
      else 'answer-proposal' end as act, a.id,
    coalesce(agreement_versions.agreed_at, r.sent_at, agreement_versions.created_at) as since,
    null::date as due_on, null::integer as days_left, a.${otherColumn(side)} as partner_id, a.number::text as name,
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
  select 'take-readings' as act, s.id, s.registered_at as since, null::date as due_on,
    null::integer as days_left, null::uuid as partner_id, s.code as name,
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
  select 'confirm-characteristics' as act, p.id, min(c.created_at) as since, null::date as due_on,
    null::integer as days_left, p.supplier_org_id as partner_id,
    null::text as name, null::text as gauge_code, null::text as gauge_name, p.number as part_number,
    null::uuid as characteristic_id, bool_or(c.class = 'safety') as safety, null::text as verdict,
    null::integer as clauses_met, null::integer as clauses_total, count(*)::integer as count
  from characteristics c join parts p on p.relationship_id = c.relationship_id and p.id = c.part_id
  where c.customer_org_id = ${organisationId}::uuid and not c.confirmed_by_customer and c.archived_at is null
    and p.archived_at is null
  group by p.id`

/** Everything that waits for this side. */
export const waitingOf = (tenant: Tenant): SQL =>
  sql.join(
    [
      waitingSubmissions(tenant),
      waitingAgreements(tenant),
      waitingConditions(tenant),
      ...(tenant.side === 'supplier'
        ? [waitingRequests(tenant), waitingStudies(tenant)]
        : [waitingCharacteristics(tenant)]),
    ],
    sql` union all `,
  )
