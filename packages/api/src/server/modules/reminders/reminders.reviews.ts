import { dayIn, dayInWords, daysBetween } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { inDays, stageOf } from './reminders.stages'
import { selectOpenChallenges, selectOpenConditions, titleOf } from './reminders.submissions.repository'
import type { Reminder } from './reminders.types'

const challengeDays = [3]
const conditionDays = [14, 3]

/** Challenges and conditions whose day comes near, for those who owe something, or is over. */
export const remindOfReviews = async (tenant: Tenant): Promise<Reminder[]> => [
  ...(await selectOpenChallenges(tenant)).flatMap((row) => ofChallenge(tenant, row)),
  ...(await selectOpenConditions(tenant)).flatMap((row) => ofCondition(tenant, row)),
]

function ofChallenge(
  tenant: Tenant,
  row: Awaited<ReturnType<typeof selectOpenChallenges>>[number],
): Reminder[] {
  const { id, number, dueOn, openedAt } = row.challenge
  const today = dayIn(row.timeZone, tenant.now)
  const stage = stageOf(dueOn, today, challengeDays, dayIn(row.timeZone, openedAt))
  const byUs = tenant.side === 'supplier'
  if (stage === null || (stage !== 'over' && !byUs)) return []
  const what = `challenge ${number} of ${titleOf(row)}`
  const subject =
    stage === 'over'
      ? `${byUs ? 'Answer overdue' : 'Not answered in time'}: ${what}`
      : `Answer due ${inDays(daysBetween(today, dueOn))}: ${what}`
  return [
    {
      kind: stage === 'over' ? 'challenge-overdue' : `challenge-due-${stage}`,
      subjectId: id,
      day: dueOn,
      notice: {
        kind: 'reminder',
        subject,
        body: `The answer ${stage === 'over' ? 'was' : 'is'} asked for by ${dayInWords(dueOn)}.`,
        path: `submissions/${row.submissionId}`,
      },
    },
  ]
}

/** A condition whose day is over lapses the acceptance, which is told as such; see standings. */
function ofCondition(
  tenant: Tenant,
  row: Awaited<ReturnType<typeof selectOpenConditions>>[number],
): Reminder[] {
  const { id, dueOn, owner, text, state } = row.condition
  const today = dayIn(row.timeZone, tenant.now)
  const stage = stageOf(dueOn, today, conditionDays, dayIn(row.timeZone, row.decidedAt))
  // What was reported done waits for the customer, who confirms it.
  const waitsOn = state === 'reported' ? 'customer' : owner
  if (stage === null || stage === 'over' || tenant.side !== waitsOn) return []
  return [
    {
      kind: `condition-due-${stage}`,
      subjectId: id,
      day: dueOn,
      notice: {
        kind: 'reminder',
        subject: `Condition due ${inDays(daysBetween(today, dueOn))}: ${titleOf(row)}`,
        body: [
          text,
          `${state === 'reported' ? 'It was reported done and waits to be confirmed.' : 'It is not reported done yet.'} If it is not confirmed by ${dayInWords(dueOn)}, the acceptance lapses.`,
        ].join('\n\n'),
        path: `submissions/${row.submissionId}`,
      },
    },
  ]
}
