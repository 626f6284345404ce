import { dayIn, dayInWords } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectOpenRequests, type RequestListed } from '../requests/requests.list.repository'
import { countOfTasks } from '../requests/requests.messages'
import { inDays, stageOf } from './reminders.stages'
import type { Reminder } from './reminders.types'

const daysBefore = [7, 1]

/** Open requests whose day comes near, for the supplier, or is over, for both. */
export async function remindOfRequests(tenant: Tenant): Promise<Reminder[]> {
  return (await selectOpenRequests(tenant)).flatMap((row) => reminderOf(tenant, row))
}

function reminderOf(tenant: Tenant, row: RequestListed): Reminder[] {
  const { request, daysLeft, owed, partner, timeZone } = row
  const { id, number, dueOn } = request
  const today = dayIn(timeZone, tenant.now)
  const stage = stageOf(dueOn, today, daysBefore, dayIn(timeZone, request.askedAt))
  if (stage === null || (stage !== 'over' && tenant.side === 'customer')) return []
  const missing = `${countOfTasks(owed)} without an answer.`
  const byUs = tenant.side === 'supplier'
  const subject =
    stage === 'over'
      ? `${byUs ? 'Overdue' : 'Not answered in time'}: request ${number}`
      : `Due ${inDays(daysLeft)}: request ${number}`
  return [
    {
      kind: stage === 'over' ? 'request-overdue' : `request-due-${stage}`,
      subjectId: id,
      day: dueOn,
      notice: {
        kind: 'reminder',
        subject,
        body: byUs
          ? `${partner.name} asked for proof by ${dayInWords(dueOn)}.\n\n${missing}`
          : `${partner.name} was to answer by ${dayInWords(dueOn)}.\n\n${missing}`,
        path: `requests/${id}`,
      },
    },
  ]
}
