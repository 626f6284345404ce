import { z } from 'zod'
import { agreementScopeSchema, clauseKeySchema } from './agreements-content'
import { clauseSchema, hashSchema, scopeKinds } from './frozen'
import { agreementStateSchema } from './agreements-rounds'
import { calendarDate, paramsWith, sideSchema, uuid } from './common'
import { defineEndpoint } from './define'
import { termFields } from './terms'

/** One clause that applies, with the signed version it comes from. */
export const criterionSchema = z.object({
  clauseKey: clauseKeySchema,
  clause: clauseSchema,
  agreementId: uuid,
  agreementNumber: z.number().int(),
  versionId: uuid,
  versionNumber: z.number().int(),
  versionSha256: hashSchema,
  /** First day of the version in force. */
  effectiveOn: calendarDate,
  scope: z.enum(scopeKinds),
})
export type Criterion = z.output<typeof criterionSchema>

const onADay = z.object({
  /** Without it: today in the relationship's time zone. */
  on: calendarDate.optional(),
})

export const readCriteria = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/tasks/:taskId/criteria',
  access: 'agreements.read',
  params: paramsWith('taskId'),
  query: onADay,
  response: z.object({
    on: calendarDate,
    /** First day since which criteria are in force without a gap; attempts count from it. */
    since: calendarDate.nullable(),
    criteria: z.array(criterionSchema),
  }),
  summary: 'The clauses in force for a measuring task on a day, the narrower scope’s before the wider’s.',
})

/** A version that says something, signed or not. */
export const criterionSourceSchema = z.object({
  agreementId: uuid,
  agreementNumber: z.number().int(),
  versionId: uuid,
  versionNumber: z.number().int(),
  /** As it is today. */
  state: agreementStateSchema,
  scope: agreementScopeSchema,
  effectiveOn: calendarDate,
})
export type CriterionSource = z.output<typeof criterionSourceSchema>

/** The version that has the last word, named as people name it. */
const bySchema = z.object({
  agreementNumber: z.number().int(),
  versionNumber: z.number().int(),
  scope: z.enum(scopeKinds),
})
/** Why something that an agreement says does not count on the day. */
export const whyNotSchema = z.discriminatedUnion('code', [
  /** A narrower scope says something else about it. */
  z.object({ code: z.literal('wider-scope'), by: bySchema }),
  /** A narrower scope says that the clause does not apply. */
  z.object({ code: z.literal('does-not-apply'), by: bySchema, reason: z.string() }),
  z.object({ code: z.literal('not-yet-in-force'), effectiveOn: calendarDate }),
  /** A later version of the same agreement is in force. */
  z.object({ code: z.literal('superseded'), by: bySchema, since: calendarDate }),
  /** `signedBy`: the side, if any, that has signed. */
  z.object({
    code: z.literal('not-signed'),
    state: z.enum(['proposed', 'countered', 'agreed', 'lapsed', 'withdrawn']),
    signedBy: z.array(sideSchema),
  }),
  z.object({ code: z.literal('other-part') }),
  z.object({ code: z.literal('other-characteristic') }),
])
export type WhyNot = z.output<typeof whyNotSchema>

const termValue = z.union([z.number(), z.string(), z.boolean()]).nullable()

export const explainedClauseSchema = z.object({
  clauseKey: clauseKeySchema,
  /** What counts; null where nothing that counts says anything. */
  winner: z.object({ clause: clauseSchema, source: criterionSourceSchema }).nullable(),
  /** False where the winner says that the clause does not apply, or where there is none. */
  applies: z.boolean(),
  others: z.array(z.object({ clause: clauseSchema, source: criterionSourceSchema, why: whyNotSchema })),
})
export type ExplainedClause = z.output<typeof explainedClauseSchema>

export const explainedTermSchema = z.object({
  field: z.enum(termFields as [(typeof termFields)[number], ...(typeof termFields)[number][]]),
  value: termValue,
  /** Null where the default counts. */
  source: criterionSourceSchema.nullable(),
  others: z.array(z.object({ value: termValue, source: criterionSourceSchema, why: whyNotSchema })),
})
export type ExplainedTerm = z.output<typeof explainedTermSchema>

/** Of agreements for other parts and characteristics only so many are named. */
export const namedElsewhere = 20

export const explainCriteria = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/tasks/:taskId/criteria/why',
  access: 'agreements.read',
  params: paramsWith('taskId'),
  query: onADay,
  response: z.object({
    on: calendarDate,
    today: calendarDate,
    since: calendarDate.nullable(),
    relationshipId: uuid,
    partId: uuid,
    characteristicId: uuid,
    /** Every subject and measure that any agreement says something about, in the order of the catalogue. */
    clauses: z.array(explainedClauseSchema),
    terms: z.array(explainedTermSchema),
    /** Agreements in force on the day for other parts or characteristics, and how many of them are named above. */
    elsewhere: z.object({ total: z.number().int(), named: z.number().int() }),
  }),
  summary: 'What applies to a measuring task on a day, and why everything else does not.',
})
