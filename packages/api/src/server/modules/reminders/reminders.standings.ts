import { runsOutWithin, type Standing } from '../../../contract/standing'
import { dayIn, dayInWords, daysBetween } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectAcceptedIds } from '../standing/standing.repository'
import { standingsOf } from '../standing/standing.service'
import { inDays, stageOf } from './reminders.stages'
import { selectNamedSubmissions, titleOf, type NamedSubmission } from './reminders.submissions.repository'
import type { Reminder } from './reminders.types'

const daysBefore = [runsOutWithin, 14]

/**
 * Acceptances that run out soon, and those that stopped standing by the calendar alone: expired, lapsed, on hold. What
 * a person did to one (a gauge reported, a revision added) was told when it was done.
 */
export async function remindOfStandings(tenant: Tenant): Promise<Reminder[]> {
  const standings = await standingsOf(tenant, await selectAcceptedIds(tenant))
  const concerned = [...standings].filter(([, { until, state }]) => until !== null || state in stopped)
  const rows = await selectNamedSubmissions(
    tenant,
    concerned.map(([id]) => id),
  )
  return rows.flatMap((row) => {
    const standing = standings.get(row.submissionId)
    return standing ? [...ofStopped(row, standing), ...ofValidity(tenant, row, standing)] : []
  })
}

const stopped = { expired: 'Expired', lapsed: 'Lapsed', 'on-hold': 'On hold' } as const

function ofStopped(row: NamedSubmission, { state, since, cause }: Standing): Reminder[] {
  if (state !== 'expired' && state !== 'lapsed' && state !== 'on-hold') return []
  return [
    {
      kind: `standing-${state}`,
      subjectId: row.submissionId,
      day: since,
      notice: {
        kind: 'standing',
        subject: `${stopped[state]}: ${titleOf(row)}`,
        body: [`The acceptance has not stood since ${dayInWords(since)}.`, whyStopped(cause)].join('\n\n'),
        path: `submissions/${row.submissionId}`,
      },
    },
  ]
}

/** Why it stopped standing, and what lets it stand again. */
function whyStopped(cause: Standing['cause']): string {
  switch (cause?.kind) {
    case 'validity':
      return `It was agreed to hold ${cause.months} months. New proof takes its place.`
    case 'condition':
      return `A condition was due on ${dayInWords(cause.dueOn)} and is not confirmed.`
    case 'calibration-overdue':
      return `The calibration of ${cause.code} was due on ${dayInWords(cause.dueOn)}. A calibration found within limits lifts this.`
    default:
      return ''
  }
}

function ofValidity(tenant: Tenant, row: NamedSubmission, { state, until }: Standing): Reminder[] {
  if (until === null || state === 'expired' || state === 'lapsed' || state === 'reopened') return []
  const today = dayIn(row.timeZone, tenant.now)
  const stage = stageOf(until, today, daysBefore)
  if (stage === null || stage === 'over') return []
  return [
    {
      kind: `acceptance-ends-${stage}`,
      subjectId: row.submissionId,
      day: until,
      notice: {
        kind: 'reminder',
        subject: `Runs out ${inDays(daysBetween(today, until))}: ${titleOf(row)}`,
        body: `The acceptance holds until ${dayInWords(until)}. New proof before that day keeps the characteristic covered.`,
        path: `submissions/${row.submissionId}`,
      },
    },
  ]
}
