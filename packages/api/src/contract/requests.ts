import { z } from 'zod'
import { characteristicClass } from './characteristics'
import {
  calendarDate,
  expectedVersion,
  instant,
  organisationParams,
  pageOf,
  pageQuery,
  paragraph,
  paramsWith,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { requestStates, requestTaskStates } from './moves/request'
import { studyStates } from './moves/study'
import { submissionStates } from './moves/submission'
import { proofStates } from './proof'

/** Why proof is asked for. */
export const requestOccasions = ['new-part', 'change', 'yearly', 'complaint', 'other'] as const
export type RequestOccasion = (typeof requestOccasions)[number]
const occasion = z.enum(requestOccasions, 'Choose the occasion.')

/** A request asks for the proof of at most so many measuring tasks. */
export const tasksAtMost = 50

const count = z.number().int().min(0)
const reason = paragraph().min(1, 'Say why.')

const requestFields = {
  id: uuid,
  relationshipId: uuid,
  /** Counts the requests of the relationship. */
  number: z.number().int(),
  state: z.enum(requestStates),
  occasion,
  words: z.string(),
  dueOn: calendarDate,
  /** Calendar days until the day, in the relationship's time zone; negative once it is over. */
  daysLeft: z.number().int(),
  /** The organisation on the other side. */
  partner: z.object({ id: uuid, name: z.string() }),
  askedAt: instant,
  tasks: count,
  /** Of them: how many the supplier still owes, how many wait for the decision, how many are accepted. */
  owed: count,
  answered: count,
  accepted: count,
}

export const requestRowSchema = z.object(requestFields)
export type RequestRow = z.output<typeof requestRowSchema>

/** A measuring task as requests name it. */
const taskFields = {
  taskId: uuid,
  gaugeCode: z.string(),
  gaugeName: z.string(),
  site: z.string().nullable(),
  processStep: z.string().nullable(),
  partId: uuid,
  partNumber: z.string(),
  partName: z.string(),
  revision: z.string(),
  characteristicNumber: z.number().int(),
  characteristicName: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  class: characteristicClass,
  /** How far its proof has come, whoever asked for it. */
  proof: z.enum(proofStates),
}

export const requestTaskSchema = z.object({
  ...taskFields,
  archived: z.boolean(),
  state: z.enum(requestTaskStates),
  /** The newest signed submission that names the request. */
  submission: z
    .object({ id: uuid, number: z.number().int(), state: z.enum(submissionStates), submittedAt: instant })
    .nullable(),
  /** The supplier's own work towards an answer; null for the customer. */
  work: z
    .object({
      /** The newest study of the task that was not abandoned. */
      study: z
        .object({ id: uuid, code: z.string(), state: z.enum(studyStates), registeredAt: instant })
        .nullable(),
      /** A submission that is being prepared. */
      draft: z.object({ id: uuid, state: z.enum(submissionStates) }).nullable(),
    })
    .nullable(),
})
export type RequestTask = z.output<typeof requestTaskSchema>

export const requestSchema = z.object({
  ...requestFields,
  /** Null where the person may not be named to the reader. */
  askedBy: z.string().nullable(),
  withdrawnAt: instant.nullable(),
  withdrawnBy: z.string().nullable(),
  withdrawalReason: z.string().nullable(),
  rowVersion: z.number().int(),
  list: z.array(requestTaskSchema),
})
export type ProofRequest = z.output<typeof requestSchema>

export const requestSorts = ['dueOn', 'number', 'askedAt', 'partner', 'owed'] as const

export const listRequests = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/requests',
  access: 'requests.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(requestSorts),
    state: z.enum(requestStates).optional(),
    /** Those still open whose day is over, or within the next 30 days. */
    due: z.enum(['overdue', 'soon']).optional(),
    occasion: occasion.optional(),
    relationshipId: uuid.optional(),
    taskId: uuid.optional(),
  }),
  response: pageOf(requestRowSchema),
  summary: 'Requests for proof of this side, by the day they are due.',
})

export const readRequest = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/requests/:requestId',
  access: 'requests.read',
  params: paramsWith('requestId'),
  response: requestSchema,
  summary: 'One request with each of its measuring tasks and how far the answer has come.',
})

export const requestChoiceSchema = z.object({
  ...taskFields,
  /** Numbers of the requests that ask for this task and are not closed. */
  askedIn: z.array(z.number().int()),
})
export type RequestChoice = z.output<typeof requestChoiceSchema>

export const listRequestChoices = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/request-choices',
  access: 'requests.ask',
  params: organisationParams,
  query: pageQuery.extend({
    /** Those without accepted proof come first by `proof`. */
    sort: sortBy(['proof', 'part', 'characteristic', 'gauge']),
    relationshipId: uuid,
    partId: uuid.optional(),
    /** Only those without accepted proof, or only those with it. */
    proof: z.enum(['missing', 'accepted']).optional(),
    class: characteristicClass.optional(),
  }),
  response: pageOf(requestChoiceSchema),
  summary: 'Active measuring tasks of one supplier, to ask proof of; those without accepted proof first.',
})

export const askForProof = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/requests',
  access: 'requests.ask',
  params: organisationParams,
  body: z.object({
    relationshipId: uuid,
    taskIds: z
      .array(uuid)
      .min(1, 'Choose at least one measuring task.')
      .max(tasksAtMost, `Choose at most ${tasksAtMost} measuring tasks for one request.`),
    dueOn: calendarDate,
    occasion,
    words: paragraph(2000).default(''),
  }),
  response: requestSchema,
  summary: 'Asks a supplier for proof of measuring tasks by a day.',
})

export const moveRequestDate = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/requests/:requestId/date',
  access: 'requests.ask',
  params: paramsWith('requestId'),
  body: z.object({ expectedVersion, dueOn: calendarDate, reason }),
  response: requestSchema,
  summary: 'Moves the day of a request that is still open, with the reason.',
})

export const withdrawRequest = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/requests/:requestId/withdraw',
  access: 'requests.ask',
  params: paramsWith('requestId'),
  body: z.object({ expectedVersion, reason }),
  response: requestSchema,
  summary: 'Withdraws a request, with the reason; both sides keep it.',
})
