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
import { challengeReasons, challengeTargetSchema, isReasonOf } from './challenge-targets'
import { defineEndpoint } from './define'
import { attachmentIds, attachmentSchema } from './files'
import { challengeStates, type ChallengeMoveName } from './moves/challenge'
import { whatIfTextSchema } from './what-if'

export * from './challenge-targets'

const words = paragraph().min(1, 'Say it in words.')

/** How the supplier answers: in words, by files, by a corrected revision, or by asking for another criterion. */
export const answerKinds = ['words', 'evidence', 'correction', 'criterion'] as const
export type AnswerKind = (typeof answerKinds)[number]

/** What a message did to the challenge it stands under. */
export const messageMoves = [
  'open',
  'answer',
  'correct',
  'reply',
  'settle',
  'withdraw',
  'propose-unresolved',
  'agree-unresolved',
  'decline-unresolved',
] as const satisfies readonly ChallengeMoveName[]

export type MessageMove = (typeof messageMoves)[number]

export const challengeMessageSchema = z.object({
  id: uuid,
  side: sideSchema,
  name: z.string().nullable(),
  move: z.enum(messageMoves),
  /** Of an answer. */
  answerKind: z.enum(answerKinds).nullable(),
  /** May be empty where the move says everything. */
  text: z.string(),
  files: z.array(attachmentSchema),
  /** The revision of the submission that an answer by correction points to. */
  revision: z.number().int().nullable(),
  /** The proposal that an answer by "change the criterion" points to. */
  proposal: z.object({ agreementId: uuid, versionId: uuid }).nullable(),
  /** A what-if that is quoted, as `whatIfOf` reads it: an argument, never a verdict. */
  whatIf: z.string().nullable(),
  createdAt: instant,
})

export const challengeSchema = z.object({
  id: uuid,
  number: z.number().int(),
  target: challengeTargetSchema,
  reasonKind: z.enum(challengeReasons),
  /** The revision of the submission that it names things in. */
  revision: z.number().int(),
  /** The day until which an answer is asked for, in the relationship's time zone. */
  dueOn: calendarDate,
  /** The day is over and the supplier has not answered. */
  overdue: z.boolean(),
  state: z.enum(challengeStates),
  openedAt: instant,
  openedBy: z.string().nullable(),
  /** Where both sides leave it unresolved: the laboratory that is to find out, if they name one. */
  laboratory: z.string().nullable(),
  closedAt: instant.nullable(),
  closedBy: z.string().nullable(),
  rowVersion: z.number().int(),
  messages: z.array(challengeMessageSchema),
})
export type Challenge = z.output<typeof challengeSchema>

const base = '/organisations/:organisationId/submissions/:submissionId'
const params = paramsWith('submissionId')
const challengePath = `${base}/challenges/:challengeId`
const challengeParams = paramsWith('submissionId', 'challengeId')

const fileIds = attachmentIds.default([])
const whatIf = whatIfTextSchema.nullable().default(null)
const say = z.object({ expectedVersion, text: words, fileIds, whatIf })
const maySay = z.object({ expectedVersion, text: paragraph().default('') })

export const openChallenge = defineEndpoint({
  method: 'post',
  path: `${base}/challenges`,
  access: 'reviews.decide',
  params,
  body: z
    .object({
      expectedVersion,
      target: challengeTargetSchema,
      reasonKind: z.enum(challengeReasons, 'Choose a reason.'),
      text: words,
      dueOn: calendarDate,
      fileIds,
      whatIf,
    })
    .superRefine(({ target, reasonKind }, context) => {
      if (!isReasonOf(target.kind, reasonKind))
        context.addIssue({
          code: 'custom',
          path: ['reasonKind'],
          message: 'Choose one of the reasons for this kind of challenge.',
        })
    }),
  response: challengeSchema,
  summary: 'Challenges one named thing in a submission, with a reason and the day an answer is asked for.',
})

export const answerChallenge = defineEndpoint({
  method: 'post',
  path: `${challengePath}/answer`,
  access: 'reviews.answer',
  params: challengeParams,
  body: say.extend({
    kind: z.enum(answerKinds).default('words'),
    /** For `criterion`: the version of an agreement that this side has proposed with the challenge as its case. */
    versionId: uuid.nullable().default(null),
  }),
  response: challengeSchema,
  summary:
    "The supplier's answer: words, files, a revision that was corrected already, or another criterion that it proposed.",
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
  summary: 'The answer settles the challenge: by evidence, or by correction where it was one.',
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

export const proposeUnresolved = defineEndpoint({
  method: 'post',
  path: `${challengePath}/propose-unresolved`,
  access: 'reviews.approve',
  params: challengeParams,
  body: z.object({ expectedVersion, text: words, laboratory: line(200).nullable().default(null) }),
  response: challengeSchema,
  summary: "The customer's approver proposes to leave the challenge unresolved, or to a laboratory.",
})

export const agreeUnresolved = defineEndpoint({
  method: 'post',
  path: `${challengePath}/agree-unresolved`,
  access: 'submissions.sign',
  params: challengeParams,
  body: maySay,
  response: challengeSchema,
  summary: "The supplier's approver agrees to leave the challenge unresolved.",
})

export const declineUnresolved = defineEndpoint({
  method: 'post',
  path: `${challengePath}/decline-unresolved`,
  access: 'submissions.sign',
  params: challengeParams,
  body: z.object({ expectedVersion, text: words }),
  response: challengeSchema,
  summary: "The supplier's approver does not agree to leave the challenge unresolved.",
})
