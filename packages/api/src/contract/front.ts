import { z } from 'zod'
import { characteristicFacts } from './characteristics'
import { calendarDate, instant, organisationParams, pageOf, pageQuery, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import { proofStates } from './proof'
import { verdictSchema } from './submission-content'

const count = z.number().int().min(0)

export const readCounts = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/front/counts',
  access: 'front.read',
  params: organisationParams,
  response: z.object({
    /** Rows of this side's front page. */
    waiting: count,
    /** Agreements that wait for this side's answer or signature. */
    agreements: count,
    /** Requests that wait for this side: the supplier's open ones. */
    requests: count,
    /** Messages this person has not read. */
    messages: count,
  }),
  summary: 'What waits for this side, in numbers, for the navigation.',
})

/** What a side is waited for with; the page that offers it follows from it. */
export const waitingActs = [
  'decide',
  'confirm-as-second-person',
  'answer-challenge',
  'agree-unresolved',
  'agree-one-off',
  'report-condition',
  'confirm-condition',
  'answer-request',
  'sign-submission',
  'finish-submission',
  'sign-criteria',
  'answer-proposal',
  'finish-proposal',
  'take-readings',
  'confirm-characteristics',
] as const
export type WaitingAct = (typeof waitingActs)[number]

export const waitingSchema = z.object({
  act: z.enum(waitingActs),
  /** Id of the submission, agreement, study, part or request. */
  id: uuid,
  since: instant,
  /** Calendar days, in this organisation's time zone. */
  ageDays: z.number().int(),
  /** The day by which it is asked for, and how many days are left in the relationship's calendar; negative after it. */
  dueOn: calendarDate.nullable(),
  daysLeft: z.number().int().nullable(),
  /** The organisation on the other side; null where none is concerned. */
  partner: z.string().nullable(),
  /** Number of the agreement, code of the study. */
  name: z.string().nullable(),
  gauge: z.object({ code: z.string(), name: z.string() }).nullable(),
  partNumber: z.string().nullable(),
  characteristic: z
    .object({
      number: z.number().int(),
      name: z.string(),
      nominal: z.string().nullable(),
      lowerLimit: z.string().nullable(),
      upperLimit: z.string().nullable(),
      unit: z.string(),
      safety: z.boolean(),
    })
    .nullable(),
  verdict: verdictSchema.nullable(),
  clausesMet: count.nullable(),
  clausesTotal: count.nullable(),
  /** How many characteristics wait to be confirmed, readings to be taken, tasks to be answered. */
  count: count.nullable(),
})
export type Waiting = z.output<typeof waitingSchema>

export const listWaiting = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/front/waiting',
  access: 'front.read',
  params: organisationParams,
  query: pageQuery.extend({ sort: sortBy(['since']) }),
  response: pageOf(waitingSchema).extend({
    /** Over all pages: days the oldest has waited, how many are overdue or concern a safety characteristic. */
    oldestDays: count,
    overdue: count,
    safety: count,
  }),
  summary: 'What waits for this side: what is overdue first, then the longest.',
})

export const coveredPartSchema = z.object({
  partId: uuid,
  partNumber: z.string(),
  partName: z.string(),
  revision: z.string(),
  partner: z.string(),
  characteristics: z.array(
    z.object({
      id: uuid,
      ...characteristicFacts,
      proof: z.enum(proofStates),
      /** The day on which accepted proof runs out, where that is soon. */
      runsOutOn: calendarDate.nullable(),
      /** The measuring task that is least far; null where there is none. */
      taskId: uuid.nullable(),
    }),
  ),
})
export type CoveredPart = z.output<typeof coveredPartSchema>

export const listCoverage = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/front/coverage',
  access: 'parts.read',
  params: organisationParams,
  query: pageQuery.extend({ sort: sortBy(['partner', 'number']), relationshipId: uuid.optional() }),
  response: pageOf(coveredPartSchema),
  summary: 'How far the characteristics of each active part stand on accepted proof.',
})
