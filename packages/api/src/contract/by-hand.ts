import { z } from 'zod'
import { byHandVerdicts } from './by-hand-verdicts'
import { expectedVersion, organisationParams, paragraph, uuid } from './common'
import { defineEndpoint } from './define'
import { clauseSchema } from './frozen'
import { movedSchema } from './moved'

export * from './by-hand-verdicts'

/** A judgement by hand as a draft holds it. */
export const byHandSchema = z.object({
  clauseKey: z.string(),
  verdict: z.enum(byHandVerdicts),
  reason: z.string(),
  document: z.object({ id: uuid, name: z.string(), size: z.number().int(), sha256: z.string() }),
})
export type ByHand = z.output<typeof byHandSchema>

/** A clause in force that asks for a judgement by hand, and what was entered so far. */
export const byHandAskedSchema = z.object({
  clauseKey: z.string(),
  clause: clauseSchema,
  judged: byHandSchema.nullable(),
})

const path = '/organisations/:organisationId/submissions/:submissionId/by-hand/:clauseKey'
/** The key of the clause stands in the address percent-encoded. */
const params = organisationParams.extend({ submissionId: uuid, clauseKey: z.string().min(1).max(200) })

export const judgeByHand = defineEndpoint({
  method: 'put',
  path,
  access: 'submissions.prepare',
  params,
  body: z.object({
    expectedVersion,
    verdict: z.enum(byHandVerdicts, 'Choose a verdict.'),
    reason: paragraph().min(1, 'Say what the document shows.'),
    /** The document, uploaded before with `files.uploadAttachment`. */
    fileId: uuid,
  }),
  response: movedSchema,
  summary: 'Judges a clause of a draft by hand on an attached document, with the reason.',
})

export const clearByHand = defineEndpoint({
  method: 'delete',
  path,
  access: 'submissions.prepare',
  params,
  body: z.object({ expectedVersion }),
  response: movedSchema,
  summary: 'Takes back a judgement by hand from a draft.',
})
