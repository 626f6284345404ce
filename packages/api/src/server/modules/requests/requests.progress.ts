import { sql, type SQL } from 'drizzle-orm'
import { saidBy, type RequestState } from '../../../contract/moves/request'
import { submissionStates } from '../../../contract/moves/submission'
import type { Tenant } from '../../db/tenant'
import { relationships } from '../relationships/relationships.table'
import { requests } from './requests.table'

/**
 * What follows from the submissions that name a request, as SQL, for lists that filter and sort by it. What each state
 * of a submission says comes from the table of moves; a test compares these with `requestState`.
 */

const said = sql.join(
  submissionStates.flatMap((state) => {
    const word = saidBy(state)
    return word === null ? [] : [sql`(${state}, ${word})`]
  }),
  sql`, `,
)

const stateOfTask = sql`coalesce((
  select case when bool_or(v.said = 'accepted') then 'accepted'
      else (array_agg(v.said order by s.submitted_at desc, s.id desc))[1] end
    from request_answers a
    join submissions s on s.relationship_id = a.relationship_id and s.id = a.submission_id
      and s.submitted_at is not null
    join (values ${said}) v (state, said) on v.state = s.state
    where a.relationship_id = t.relationship_id and a.request_id = t.request_id and a.task_id = t.task_id
  ), 'open')`

/** How many tasks each request of this side has, and how far their answers have come; one row for each request. */
export const progressOf = ({ side, organisationId }: Tenant): SQL => sql`(
  select x.relationship_id, x.request_id, count(*)::integer as tasks,
    (count(*) filter (where x.state in ('open', 'refused')))::integer as owed,
    (count(*) filter (where x.state = 'answered'))::integer as answered,
    (count(*) filter (where x.state = 'accepted'))::integer as accepted
  from (select t.relationship_id, t.request_id, ${stateOfTask} as state from request_tasks t
    where t.${sql.raw(`${side}_org_id`)} = ${organisationId}::uuid) x
  group by x.relationship_id, x.request_id) as progress`

export const progressColumns = {
  tasks: sql<number>`progress.tasks`,
  owed: sql<number>`progress.owed`,
  answered: sql<number>`progress.answered`,
  accepted: sql<number>`progress.accepted`,
}

/** The state of a request, over a query that joins `progressOf`. */
export const stateOfRequest = sql<RequestState>`case
  when ${requests.withdrawnAt} is not null then 'withdrawn'
  when progress.owed > 0 then 'open'
  when progress.accepted = progress.tasks then 'closed'
  else 'answered' end`

/** Days until a request is due, over a query that joins the relationship. */
export const daysLeft = ({ now }: Tenant): SQL<number> =>
  sql<number>`(${requests.dueOn} - (${now}::timestamptz at time zone ${relationships.timeZone})::date)::integer`
