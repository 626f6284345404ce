import { z } from 'zod'
import {
  calendarDate,
  expectedVersion,
  instant,
  line,
  paragraph,
  paramsWith,
  sideSchema,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { challengeStates } from './moves/challenge'
import { submissionStates } from './moves/submission'

const hash = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a SHA-256 hash.')
const words = paragraph().min(1, 'Say it in words.')

export const challengeReasons = ['result', 'readings', 'set-up', 'reference-standard', 'calculation'] as const
export type ChallengeReason = (typeof challengeReasons)[number]

export const decisionKinds = ['accepted', 'accepted-with-conditions', 'refused'] as const
export type DecisionKind = (typeof decisionKinds)[number]

export const decisionSchema = z.object({
  id: uuid,
  kind: z.enum(decisionKinds),
  state: z.enum(['awaiting-second-person', 'final', 'withdrawn']),
  conditions: z.string().nullable(),
  conditionsDueOn: calendarDate.nullable(),
  reason: z.string(),
  /** Names; null where the person may not be named to the reader. */
  decidedBy: z.string().nullable(),
  decidedAt: instant,
  secondBy: z.string().nullable(),
  secondAt: instant.nullable(),
  /** Only ever sent to the customer. */
  sentBackReason: z.string().nullable(),
})
export type Decision = z.output<typeof decisionSchema>

export const challengeSchema = z.object({
  id: uuid,
  number: z.number().int(),
  clauseKey: z.string(),
  reasonKind: z.enum(challengeReasons),
  state: z.enum(challengeStates),
  openedAt: instant,
  closedAt: instant.nullable(),
  closedBy: z.string().nullable(),
  rowVersion: z.number().int(),
  messages: z.array(
    z.object({
      id: uuid,
      side: sideSchema,
      name: z.string().nullable(),
      text: z.string(),
      createdAt: instant,
    }),
  ),
})
export type Challenge = z.output<typeof challengeSchema>

/** Where a move has put the submission. */
export const movedSchema = z.object({
  id: uuid,
  state: z.enum(submissionStates),
  rowVersion: z.number().int(),
})
export type Moved = z.output<typeof movedSchema>

const base = '/organisations/:organisationId/submissions/:submissionId'
const params = paramsWith('submissionId')
/** A decision names the bytes it is about: the hash of the text that the person had before them. */
const seen = { expectedVersion, sha256: hash }

export const accept = defineEndpoint({
  method: 'post',
  path: `${base}/accept`,
  access: 'reviews.decide',
  params,
  body: z.object({ ...seen, reason: paragraph().default('') }),
  response: movedSchema,
  fresh: true,
  summary: 'Accepts a submission; on a safety-class characteristic a second person must confirm.',
})

export const acceptWithConditions = defineEndpoint({
  method: 'post',
  path: `${base}/accept-with-conditions`,
  access: 'reviews.approve',
  params,
  body: z.object({
    ...seen,
    conditions: words,
    conditionsDueOn: calendarDate,
    reason: paragraph().default(''),
  }),
  response: movedSchema,
  fresh: true,
  summary: 'Accepts a submission on conditions: what must follow, and until when.',
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

export const openChallenge = defineEndpoint({
  method: 'post',
  path: `${base}/challenges`,
  access: 'reviews.decide',
  params,
  body: z.object({
    expectedVersion,
    clauseKey: line(100),
    reasonKind: z.enum(challengeReasons),
    text: words,
  }),
  response: challengeSchema,
  summary: 'Challenges the result of one clause, with a reason.',
})

const challengePath = `${base}/challenges/:challengeId`
const challengeParams = paramsWith('submissionId', 'challengeId')
const say = z.object({ expectedVersion, text: words })
const maySay = z.object({ expectedVersion, text: paragraph().default('') })

export const answerChallenge = defineEndpoint({
  method: 'post',
  path: `${challengePath}/answer`,
  access: 'reviews.answer',
  params: challengeParams,
  body: say,
  response: challengeSchema,
  summary: "The supplier's answer to a challenge, in words.",
})

export const replyToAnswer = defineEndpoint({
  method: 'post',
  path: `${challengePath}/reply`,
  access: 'reviews.decide',
  params: challengeParams,
  body: say,
  response: challengeSchema,
  summary: 'The customer replies to the answer; the challenge is open again.',
})

export const settleChallenge = defineEndpoint({
  method: 'post',
  path: `${challengePath}/settle`,
  access: 'reviews.decide',
  params: challengeParams,
  body: maySay,
  response: challengeSchema,
  summary: 'The answer settles the challenge.',
})

export const withdrawChallenge = defineEndpoint({
  method: 'post',
  path: `${challengePath}/withdraw`,
  access: 'reviews.decide',
  params: challengeParams,
  body: maySay,
  response: challengeSchema,
  summary: 'The customer withdraws the challenge.',
})
