import { z } from 'zod'
import { expectedVersion, instant, paragraph, paramsWith, uuid } from './common'
import { conditionAskedSchema, conditionSchema, mostConditions } from './conditions'
import { defineEndpoint } from './define'
import { hashSchema } from './frozen'
import { movedSchema } from './moved'

const words = paragraph().min(1, 'Say it in words.')

export const decisionKinds = ['accepted', 'accepted-with-conditions', 'refused'] as const
export type DecisionKind = (typeof decisionKinds)[number]

export const decisionStates = ['awaiting-second-person', 'awaiting-other-side', 'final', 'withdrawn'] as const
export type DecisionState = (typeof decisionStates)[number]

export const decisionSchema = z.object({
  id: uuid,
  kind: z.enum(decisionKinds),
  state: z.enum(decisionStates),
  /** What must follow; empty but for a conditional acceptance. */
  conditions: z.array(conditionSchema),
  reason: z.string(),
  /** The revision whose text it names. */
  revision: z.number().int(),
  /** Names; null where the person may not be named to the reader. */
  decidedBy: z.string().nullable(),
  decidedAt: instant,
  secondBy: z.string().nullable(),
  secondAt: instant.nullable(),
  /** Only ever sent to the customer. */
  sentBackReason: z.string().nullable(),
  /** Without agreed criteria: the supplier's approver who agreed, or did not and said why. */
  otherSideBy: z.string().nullable(),
  otherSideAt: instant.nullable(),
  declinedReason: z.string().nullable(),
})
export type Decision = z.output<typeof decisionSchema>

const base = '/organisations/:organisationId/submissions/:submissionId'
const params = paramsWith('submissionId')
/** A decision names the bytes it is about: the hash of the newest text, which the person had before them. */
const seen = { expectedVersion, sha256: hashSchema }

export const accept = defineEndpoint({
  method: 'post',
  path: `${base}/accept`,
  access: 'reviews.decide',
  params,
  body: z.object({ ...seen, reason: paragraph().default('') }),
  response: movedSchema,
  fresh: true,
  summary:
    'Accepts a submission. On a safety-class characteristic a second person must confirm; without agreed criteria an approver of each side decides.',
})

export const acceptWithConditions = defineEndpoint({
  method: 'post',
  path: `${base}/accept-with-conditions`,
  access: 'reviews.approve',
  params,
  body: z.object({
    ...seen,
    conditions: z
      .array(conditionAskedSchema)
      .min(1, 'Say what must follow.')
      .max(mostConditions, `Name at most ${mostConditions} conditions.`),
    reason: paragraph().default(''),
  }),
  response: movedSchema,
  fresh: true,
  summary: 'Accepts a submission on conditions: what must follow, until when, and who owes it.',
})

export const refuse = defineEndpoint({
  method: 'post',
  path: `${base}/refuse`,
  access: 'reviews.decide',
  params,
  body: z.object({ ...seen, reason: words }),
  response: movedSchema,
  fresh: true,
  summary: 'Refuses a submission, with the reason.',
})

export const confirm = defineEndpoint({
  method: 'post',
  path: `${base}/confirm`,
  access: 'reviews.decide',
  params,
  body: z.object(seen),
  response: movedSchema,
  fresh: true,
  summary: 'Confirms an acceptance as its second person.',
})

export const sendBack = defineEndpoint({
  method: 'post',
  path: `${base}/send-back`,
  access: 'reviews.decide',
  params,
  body: z.object({ expectedVersion, reason: words }),
  response: movedSchema,
  summary: 'Does not confirm a proposed acceptance: the review goes on.',
})

export const agreeOneOff = defineEndpoint({
  method: 'post',
  path: `${base}/agree-one-off`,
  access: 'submissions.sign',
  params,
  body: z.object(seen),
  response: movedSchema,
  fresh: true,
  summary: "The supplier's approver agrees to an acceptance without agreed criteria; it takes effect.",
})

export const declineOneOff = defineEndpoint({
  method: 'post',
  path: `${base}/decline-one-off`,
  access: 'submissions.sign',
  params,
  body: z.object({ expectedVersion, reason: words }),
  response: movedSchema,
  summary: 'Does not agree to an acceptance without agreed criteria, with the reason: the review goes on.',
})
