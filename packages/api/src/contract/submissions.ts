import { z } from 'zod'
import {
  calendarDate,
  expectedVersion,
  instant,
  organisationParams,
  pageOf,
  pageQuery,
  paragraph,
  paramsWith,
  sideSchema,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { byHandAskedSchema } from './by-hand'
import { hashSchema } from './frozen'
import { movedSchema } from './moved'
import { submissionStates } from './moves/submission'
import { challengeSchema, decisionSchema } from './reviews'
import { standingSchema, standingStates } from './standing'
import { evaluationSchema, fileRoleSchema, verdictSchema } from './submission-content'
import { submissionCheckSchema } from './submission-check'

export * from './by-hand'
export * from './data-difference'
export * from './submission-content'

const words = paragraph().min(1, 'Say why.')
const state = z.enum(submissionStates)

export const submissionRowSchema = z.object({
  id: uuid,
  /** Null until it is signed. */
  number: z.number().int().nullable(),
  state,
  /** Calendar days in this state, in the relationship's time zone. */
  ageDays: z.number().int(),
  /** Whose step is next; null where nothing waits. */
  waitsOn: sideSchema.nullable(),
  taskId: uuid,
  gaugeCode: z.string(),
  gaugeName: z.string(),
  partId: uuid,
  partNumber: z.string(),
  revision: z.string(),
  characteristicNumber: z.number().int(),
  characteristicName: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  safety: z.boolean(),
  /** The organisation on the other side. */
  other: z.object({ id: uuid, name: z.string() }),
  verdict: verdictSchema.nullable(),
  /** Null while it is not signed; `none`: no criteria are agreed, an approver of each side decides. */
  criteria: z.enum(['agreed', 'none']).nullable(),
  clausesMet: z.number().int().nullable(),
  clausesTotal: z.number().int().nullable(),
  /** How an accepted one stands today; null for others. */
  standing: standingSchema.nullable(),
  createdAt: instant,
  submittedAt: instant.nullable(),
})
export type SubmissionRow = z.output<typeof submissionRowSchema>

/** Columns a list may be sorted by. */
export const submissionSorts = [
  'age',
  'number',
  'submitted',
  'gauge',
  'part',
  'other',
  'state',
  'verdict',
  'clauses',
] as const
export type SubmissionSort = (typeof submissionSorts)[number]
const sortSchema = z.enum(submissionSorts.flatMap((sort) => [sort, `-${sort}`] as const)).optional()

export const submissionQuery = pageQuery.extend({
  sort: sortSchema,
  state: state.optional(),
  /** What waits for one side's next step. */
  waitsOn: sideSchema.optional(),
  verdict: verdictSchema.optional(),
  safety: z.enum(['true', 'false']).optional(),
  criteria: z.enum(['agreed', 'none']).optional(),
  /** Accepted ones that stand so today. */
  standing: z.enum(standingStates).optional(),
  taskId: uuid.optional(),
  partId: uuid.optional(),
  relationshipId: uuid.optional(),
})
export type SubmissionQuery = z.output<typeof submissionQuery>

export const listSubmissions = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/submissions',
  access: 'submissions.read',
  params: organisationParams,
  query: submissionQuery,
  response: pageOf(submissionRowSchema),
  summary: 'Submissions of this organisation on its side; the customer sees those that are signed.',
})

/** Why a move that the state and the role allow is still not this person's to make. */
export const hindranceSchema = z.object({
  move: z.enum([
    'send-for-signature',
    'sign',
    'accept',
    'accept-with-conditions',
    'refuse',
    'confirm',
    'agree-one-off',
  ]),
  code: z.enum([
    'nothing-to-judge',
    'task-archived',
    'needs-approver',
    'took-the-readings',
    'same-person',
    'challenge-open',
    'challenge-unsettled',
    'newer-accepted',
  ]),
})
export type Hindrance = z.output<typeof hindranceSchema>

export const signatureMeanings = [
  'submits',
  'corrects',
  'accepts',
  'accepts-with-conditions',
  'refuses',
  'second-person',
  'agrees-one-off',
] as const
export type SignatureMeaning = (typeof signatureMeanings)[number]

export const submissionSchema = z.object({
  id: uuid,
  number: z.number().int().nullable(),
  state,
  rowVersion: z.number().int(),
  ageDays: z.number().int(),
  /** Today in the relationship's time zone, from which the days left of due dates count. */
  today: calendarDate,
  relationshipId: uuid,
  taskId: uuid,
  partId: uuid,
  characteristicId: uuid,
  safety: z.boolean(),
  verdict: verdictSchema,
  clausesMet: z.number().int(),
  clausesTotal: z.number().int(),
  criteria: z.enum(['agreed', 'none']),
  /** How an accepted one stands today; null for others. */
  standing: standingSchema.nullable(),
  createdAt: instant,
  sentForSignatureAt: instant.nullable(),
  submittedAt: instant.nullable(),
  decidedAt: instant.nullable(),
  withdrawalReason: z.string().nullable(),
  supersededBy: z.object({ id: uuid, number: z.number().int() }).nullable(),
  /** The revision that is shown, and every one there is, the first first; before signing only what would be frozen. */
  revision: z.number().int(),
  revisions: z.array(
    z.object({
      revision: z.number().int(),
      sha256: hashSchema,
      frozenAt: instant,
      verdict: verdictSchema,
      clausesMet: z.number().int(),
      clausesTotal: z.number().int(),
      /** Number of the challenge that it answers; null for the first. */
      challenge: z.number().int().nullable(),
    }),
  ),
  /**
   * The frozen content as canonical JSON and its SHA-256; before signing, what signing today would freeze. Read it
   * with `submissionContentSchema`.
   */
  text: z.string(),
  sha256: hashSchema,
  evaluations: z.array(evaluationSchema),
  files: z.array(
    z.object({
      /** Null before signing: the file then belongs to the supplier alone. */
      id: uuid.nullable(),
      /** Before signing the supplier's own file, to open with `files.downloadFile`; null afterwards. */
      ownFileId: uuid.nullable(),
      role: fileRoleSchema,
      name: z.string(),
      contentType: z.string(),
      size: z.number().int(),
      sha256: hashSchema,
    }),
  ),
  signatures: z.array(
    z.object({
      side: sideSchema,
      name: z.string().nullable(),
      meaning: z.enum(signatureMeanings),
      sha256: hashSchema,
      /** The revision whose text it stands under. */
      revision: z.number().int(),
      signedAt: instant,
    }),
  ),
  decisions: z.array(decisionSchema),
  challenges: z.array(challengeSchema),
  /** Between engineers and approvers, before signing; empty for the customer. */
  notes: z.array(z.object({ id: uuid, name: z.string().nullable(), text: z.string(), createdAt: instant })),
  /** Studies to choose from while it is a draft; empty otherwise. */
  choices: z.array(
    z.object({
      studyId: uuid,
      code: z.string(),
      registeredAt: instant,
      collectedOn: calendarDate.nullable(),
      readings: z.number().int(),
      chosen: z.boolean(),
    }),
  ),
  /** Clauses that ask for a judgement by hand, while it is a draft; empty otherwise and for the customer. */
  byHand: z.array(byHandAskedSchema),
  hindrances: z.array(hindranceSchema),
})
export type Submission = z.output<typeof submissionSchema>

const base = '/organisations/:organisationId/submissions/:submissionId'
const params = paramsWith('submissionId')

export const readSubmission = defineEndpoint({
  method: 'get',
  path: base,
  access: 'submissions.read',
  params,
  query: z.object({
    /** An earlier signed text to read instead of the newest. */
    revision: z.coerce.number().int().min(1).max(1_000_000).optional(),
  }),
  response: submissionSchema,
  summary: 'One submission with everything frozen in it, its signatures, decisions and challenges.',
})

export const prepareSubmission = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/submissions',
  access: 'submissions.prepare',
  params: organisationParams,
  body: z.object({
    taskId: uuid,
    /** Which studies count; without it the newest computed one. */
    studyIds: z.array(uuid).max(10).optional(),
  }),
  response: movedSchema,
  summary: 'Prepares a submission for one measuring task from its studies.',
})

export const chooseStudies = defineEndpoint({
  method: 'put',
  path: `${base}/studies`,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion, studyIds: z.array(uuid).max(10) }),
  response: movedSchema,
  summary: 'Which studies a draft rests on.',
})

export const sendForSignature = defineEndpoint({
  method: 'post',
  path: `${base}/send-for-signature`,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion, note: paragraph().default('') }),
  response: movedSchema,
  summary: 'Hands a draft to those who may sign it.',
})

export const returnSubmission = defineEndpoint({
  method: 'post',
  path: `${base}/return`,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion, note: words }),
  response: movedSchema,
  summary: 'Returns a submission that waits for signature to its draft, with a note.',
})

export const signSubmission = defineEndpoint({
  method: 'post',
  path: `${base}/sign`,
  access: 'submissions.sign',
  params,
  body: z.object({ expectedVersion, sha256: hashSchema }),
  response: movedSchema,
  fresh: true,
  summary: 'Signs and submits: everything is frozen, and the customer sees it.',
})

export const discardSubmission = defineEndpoint({
  method: 'post',
  path: `${base}/discard`,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion }),
  response: movedSchema,
  summary: 'Discards a submission that was not signed.',
})

export const withdrawSubmission = defineEndpoint({
  method: 'post',
  path: `${base}/withdraw`,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion, reason: words }),
  response: movedSchema,
  summary: 'Takes back a submission that is not decided yet, with the reason.',
})

export const verifySubmission = defineEndpoint({
  method: 'get',
  path: `${base}/verify`,
  access: 'submissions.read',
  params,
  response: submissionCheckSchema.extend({
    /** The newest revision is checked above; `equal` there is about all of them. */
    revision: z.number().int(),
    /** The signed texts before it, the first first. */
    earlier: z.array(submissionCheckSchema.extend({ revision: z.number().int() })),
  }),
  summary:
    'Recomputes every clause of every revision on the engine it names and compares everything frozen byte for byte.',
})

export const downloadSubmissionFile = defineEndpoint({
  method: 'get',
  path: `${base}/files/:fileId`,
  access: 'submissions.read',
  params: paramsWith('submissionId', 'fileId'),
  summary: 'A file of a submission, byte for byte, as an attachment.',
})
