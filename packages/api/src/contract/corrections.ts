import { z } from 'zod'
import { challengeSchema } from './challenges'
import { expectedVersion, paragraph, paramsWith, uuid } from './common'
import { defineEndpoint } from './define'
import { hashSchema } from './frozen'
import { evaluationSchema, verdictSchema } from './submission-content'

/** What signing a correction now would freeze as the next revision. */
export const correctionSchema = z.object({
  revision: z.number().int(),
  text: z.string(),
  sha256: hashSchema,
  verdict: verdictSchema,
  clausesMet: z.number().int(),
  clausesTotal: z.number().int(),
  evaluations: z.array(evaluationSchema),
  /** The submission's studies, so that the apps can lead to where their readings are corrected. */
  studies: z.array(z.object({ studyId: uuid, code: z.string(), corrected: z.boolean() })),
  /** Why the reader could not sign it. */
  hindrances: z.array(z.enum(['nothing-corrected', 'took-the-readings', 'not-an-approver'])),
})
export type Correction = z.output<typeof correctionSchema>

const base = '/organisations/:organisationId/submissions/:submissionId'
const challengePath = `${base}/challenges/:challengeId`
const challengeParams = paramsWith('submissionId', 'challengeId')

export const readCorrection = defineEndpoint({
  method: 'get',
  path: `${challengePath}/correction`,
  access: 'submissions.prepare',
  params: challengeParams,
  response: correctionSchema,
  summary: 'What the corrected readings of the submission would freeze as its next revision; stores nothing.',
})

export const askForCorrection = defineEndpoint({
  method: 'post',
  path: `${challengePath}/correction/ask`,
  access: 'reviews.answer',
  params: challengeParams,
  body: z.object({ expectedVersion, note: paragraph().default('') }),
  response: challengeSchema,
  summary: 'Tells the approvers of the supplier that a correction waits for their signature.',
})

export const signCorrection = defineEndpoint({
  method: 'post',
  path: `${challengePath}/correction`,
  access: 'submissions.sign',
  params: challengeParams,
  body: z.object({
    expectedVersion,
    sha256: hashSchema,
    text: paragraph().min(1, 'Say in words what was corrected.'),
  }),
  response: challengeSchema,
  fresh: true,
  summary:
    'Signs the corrected content as a new revision and answers the challenge by it; earlier ones stay.',
})
