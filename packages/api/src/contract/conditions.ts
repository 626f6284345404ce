import { z } from 'zod'
import { calendarDate, expectedVersion, instant, paragraph, paramsWith, sideSchema, uuid } from './common'
import { defineEndpoint } from './define'
import { attachmentIds, attachmentSchema } from './files'
import { conditionStates, type ConditionMoveName, type ConditionState } from './moves/condition'

/** Most conditions of one acceptance. */
export const mostConditions = 20

/** What shows that a condition is fulfilled. */
export const followUps = ['new-study', 'document', 'action', 'other'] as const
export type FollowUp = (typeof followUps)[number]

/** A condition as it is asked for. */
export const conditionAskedSchema = z.object({
  text: paragraph(2000).min(1, 'Say what must follow.'),
  dueOn: calendarDate,
  owner: sideSchema,
  followUp: z.enum(followUps, 'Choose what shows that it is fulfilled.'),
})
export type ConditionAsked = z.output<typeof conditionAskedSchema>

export const conditionReportSchema = z.object({
  id: uuid,
  move: z.enum(['report', 'confirm', 'return'] as const satisfies readonly ConditionMoveName[]),
  side: sideSchema,
  name: z.string().nullable(),
  text: z.string(),
  files: z.array(attachmentSchema),
  createdAt: instant,
})

export const conditionSchema = conditionAskedSchema.extend({
  id: uuid,
  /** Counts the conditions of the acceptance, from one. */
  number: z.number().int(),
  state: z.enum(conditionStates),
  /** The day is over and it is not confirmed: the acceptance has lapsed. */
  overdue: z.boolean(),
  confirmedAt: instant.nullable(),
  rowVersion: z.number().int(),
  reports: z.array(conditionReportSchema),
})
export type Condition = z.output<typeof conditionSchema>

/** What the lapse of an acceptance follows from. */
export interface ConditionDue {
  dueOn: string
  state: ConditionState
}

/** Past its day without having been confirmed; the day itself is still in time. */
export const isOverdue = ({ dueOn, state }: ConditionDue, today: string): boolean =>
  state !== 'confirmed' && dueOn < today

const base = '/organisations/:organisationId/submissions/:submissionId/conditions/:conditionId'
const params = paramsWith('submissionId', 'conditionId')
const fileIds = attachmentIds.default([])

export const reportCondition = defineEndpoint({
  method: 'post',
  path: `${base}/report`,
  access: 'conditions.report',
  params,
  body: z.object({ expectedVersion, text: paragraph().min(1, 'Say what was done.'), fileIds }),
  response: conditionSchema,
  summary: 'Whoever owes a condition reports it done, in words and by files.',
})

export const confirmCondition = defineEndpoint({
  method: 'post',
  path: `${base}/confirm`,
  access: 'reviews.decide',
  params,
  body: z.object({ expectedVersion, text: paragraph().default('') }),
  response: conditionSchema,
  summary: 'The customer confirms that a condition is fulfilled.',
})

export const returnCondition = defineEndpoint({
  method: 'post',
  path: `${base}/return`,
  access: 'reviews.decide',
  params,
  body: z.object({ expectedVersion, text: paragraph().min(1, 'Say what is missing.') }),
  response: conditionSchema,
  summary: 'The customer does not take a condition for fulfilled; it is open again.',
})
