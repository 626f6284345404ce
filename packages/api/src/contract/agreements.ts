import { clauseTypes, parseClause, problemCodes, type Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { problemsOfClause, repeatedClauses } from './agreement-check'
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
  sideSchema,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { agreementMoveNames, agreementVersionStates } from './moves/agreement-version'

const hash = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a SHA-256 hash.')
const state = z.enum(agreementVersionStates)
const party = z.object({ id: uuid, name: z.string() })

/** A clause as stored: it was checked when it was entered. */
export const clauseSchema = z.custom<Clause>(
  (value) => typeof value === 'object' && value !== null && 'type' in value && 'parameters' in value,
)

/** A clause as sent: every field wrong with it is named. */
const enteredClause = z
  .custom<Clause>((value) => typeof value === 'object' && value !== null, 'This is not a clause.')
  .transform((value, context): Clause => {
    const problems = problemsOfClause(value)
    for (const { path, message } of problems)
      context.addIssue({ code: 'custom', path: path ? path.split('.') : [], message })
    return problems.length > 0 ? z.NEVER : parseClause(value)
  })

/** The clauses of a proposal; at most one for each subject and measure. */
const enteredClauses = z
  .array(enteredClause)
  .max(clauseTypes.length * 4, 'These are more clauses than there are subjects.')
  .superRefine((clauses, context) => {
    for (const place of repeatedClauses(clauses))
      context.addIssue({
        code: 'custom',
        path: [place],
        message: 'Another clause here judges the same thing. Keep one of the two.',
      })
  })

export const scopeKinds = ['relationship', 'part', 'characteristic'] as const
export type ScopeKind = (typeof scopeKinds)[number]

/** What an agreement covers, named as people name it. */
export const agreementScopeSchema = z.object({
  kind: z.enum(scopeKinds),
  partId: uuid.nullable(),
  partNumber: z.string().nullable(),
  partName: z.string().nullable(),
  characteristicId: uuid.nullable(),
  characteristicNumber: z.number().int().nullable(),
  characteristicName: z.string().nullable(),
  /** The revision to which the one characteristic belongs. */
  revision: z.string().nullable(),
})
export type AgreementScope = z.output<typeof agreementScopeSchema>

const inForceSchema = z.object({ versionId: uuid, number: z.number().int(), effectiveOn: calendarDate })

export const agreementRowSchema = z.object({
  id: uuid,
  /** Null until the first proposal is sent: a draft of one's own side. */
  number: z.number().int().nullable(),
  relationshipId: uuid,
  other: party,
  scope: agreementScopeSchema,
  /** The version in which something happens: the open one, else one's own draft, else the last one sent. */
  newest: z.object({
    versionId: uuid,
    number: z.number().int().nullable(),
    state,
    /** The side whose proposal stands, and how many rounds there were. */
    proposedBy: sideSchema,
    rounds: z.number().int(),
    effectiveOn: calendarDate,
    changedAt: instant,
  }),
  /** Sides that have to act: one for an answer, one or both for signatures, none where nothing waits. */
  waitsOn: z.array(sideSchema),
  inForce: inForceSchema.nullable(),
})
export type AgreementRow = z.output<typeof agreementRowSchema>

export const agreementSorts = ['changed', 'number', 'part', 'other', 'effective'] as const

export const listAgreements = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/agreements',
  access: 'agreements.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(agreementSorts, '-changed'),
    relationshipId: uuid.optional(),
    /** Agreements for this part number or one of its characteristics. */
    partId: uuid.optional(),
    /** State of the newest version; `in-force` finds every agreement that has a version in force. */
    state: state.optional(),
    waitsOn: sideSchema.optional(),
  }),
  response: pageOf(agreementRowSchema),
  summary: 'Agreements of this side and its own drafts, searched by part, characteristic and partner.',
})

const warningSchema = z.object({
  clause: z.number().int(),
  code: z.enum(problemCodes),
  path: z.string(),
  message: z.string(),
  characteristicIds: z.array(uuid),
})
const flagSchema = z.object({
  clause: z.number().int(),
  code: z.enum(['zero-difference', 'point-estimate']),
  characteristicIds: z.array(uuid),
})

/** One side's complete proposal; `draft` ones are seen by their own side alone. */
export const agreementRoundSchema = z.object({
  id: uuid,
  number: z.number().int(),
  side: sideSchema,
  state: z.enum(['draft', 'sent', 'accepted', 'answered', 'withdrawn']),
  clauses: z.array(clauseSchema),
  effectiveOn: calendarDate,
  comment: z.string(),
  /** Null where the person may not be named to the reader any more. */
  by: z.string().nullable(),
  createdAt: instant,
  sentAt: instant.nullable(),
  /** The version to send back when a draft is changed. */
  rowVersion: z.number().int(),
  /** Clauses that cannot be computed for characteristics of the scope as they stand now. */
  warnings: z.array(warningSchema),
  /** Clauses to look at twice, because they would apply to characteristics of class safety. */
  flags: z.array(flagSchema),
})
export type AgreementRound = z.output<typeof agreementRoundSchema>

/** Why a move that state and role allow cannot be made now. */
export const agreementHindranceSchema = z.object({
  move: z.enum(agreementMoveNames),
  code: z.enum([
    'no-clauses',
    'clauses-cannot-be-agreed',
    'effective-date-past',
    'negotiation-open',
    'limits-changed',
    'own-side-has-signed',
  ]),
})
export type AgreementHindrance = z.output<typeof agreementHindranceSchema>

export const agreementVersionSchema = z.object({
  id: uuid,
  /** Null for a draft. */
  number: z.number().int().nullable(),
  state,
  begunBy: sideSchema,
  /** From agreement on: first day in force, the canonical text, and its SHA-256. */
  effectiveOn: calendarDate.nullable(),
  text: z.string().nullable(),
  sha256: hash.nullable(),
  createdAt: instant,
  agreedAt: instant.nullable(),
  signedAt: instant.nullable(),
  withdrawnAt: instant.nullable(),
  withdrawnBy: sideSchema.nullable(),
  withdrawnReason: z.string().nullable(),
  /** The version to send back with every move that is not about a draft. */
  rowVersion: z.number().int(),
  waitsOn: z.array(sideSchema),
  /** Moves that this person may make now; those listed under hindrances are allowed, but refused for the reason. */
  moves: z.array(z.enum(agreementMoveNames)),
  hindrances: z.array(agreementHindranceSchema),
  /** In the order they were made; an unsent answer of one's own side is the last, with state `draft`. */
  rounds: z.array(agreementRoundSchema),
  signatures: z.array(
    z.object({ side: sideSchema, name: z.string().nullable(), sha256: hash, signedAt: instant }),
  ),
})
export type AgreementVersion = z.output<typeof agreementVersionSchema>

/** A characteristic in scope as it stands now: what consequences are computed from. */
export const scopedCharacteristicSchema = z.object({
  characteristicId: uuid,
  partId: uuid,
  partNumber: z.string(),
  revision: z.string(),
  number: z.number().int(),
  name: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  class: characteristicClass,
  processStandardDeviation: z.string().nullable(),
})
export type ScopedCharacteristic = z.output<typeof scopedCharacteristicSchema>

export const agreementSchema = z.object({
  id: uuid,
  number: z.number().int().nullable(),
  relationshipId: uuid,
  scope: agreementScopeSchema,
  supplier: party,
  customer: party,
  timeZone: z.string(),
  /** Today in the relationship's time zone, by which dates are judged. */
  today: calendarDate,
  inForce: inForceSchema.nullable(),
  /** Whether a new version may be begun for this scope: none is open, and this side has no draft. */
  mayBegin: z.boolean(),
  /** The newest first; a draft of one's own side before those that were sent. */
  versions: z.array(agreementVersionSchema),
  /** Active characteristics of the current revisions in scope. */
  characteristics: z.array(scopedCharacteristicSchema),
})
export type Agreement = z.output<typeof agreementSchema>

/** The signed text, RFC 8785, in the form `evenrule.agreement/1`. */
export const agreementTextSchema = z.object({
  format: z.literal('evenrule.agreement/1'),
  agreement: z.number().int(),
  version: z.number().int(),
  supplier: party,
  customer: party,
  timeZone: z.string(),
  scope: agreementScopeSchema,
  /** With their limits, where the scope is narrower than the relationship. */
  characteristics: z.array(scopedCharacteristicSchema),
  clauses: z.array(clauseSchema),
  effectiveOn: calendarDate,
})
export type AgreementText = z.output<typeof agreementTextSchema>

const round = {
  clauses: enteredClauses,
  /** First day in force, in the relationship's time zone. */
  effectiveOn: calendarDate,
  comment: paragraph().default(''),
  /** Send it to the other side at once; otherwise it stays a draft that only one's own side sees. */
  send: z.boolean().default(false),
}
const inVersion = '/organisations/:organisationId/agreements/:agreementId/versions/:versionId'
const versionParams = paramsWith('agreementId', 'versionId')

export const readAgreement = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/agreements/:agreementId',
  access: 'agreements.read',
  params: paramsWith('agreementId'),
  response: agreementSchema,
  summary: 'One agreement with every version, round and signature this side may see.',
})

export const beginVersion = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/agreements',
  access: 'agreements.propose',
  params: organisationParams,
  body: z.object({
    relationshipId: uuid,
    /** Neither: the whole relationship. */
    partId: uuid.nullable().default(null),
    /** One characteristic; its part follows from it. */
    characteristicId: uuid.nullable().default(null),
    ...round,
  }),
  response: agreementSchema,
  summary: 'Begins a version for a scope: the first of a new agreement, or the next of the one there is.',
})

export const saveDraft = defineEndpoint({
  method: 'put',
  path: `${inVersion}/draft`,
  access: 'agreements.propose',
  params: versionParams,
  /** `expectedVersion` is that of the draft round. */
  body: z.object({ ...round, expectedVersion }),
  response: agreementSchema,
  summary: 'Changes this side’s unsent proposal or answer, and sends it where asked to.',
})

export const sendDraft = defineEndpoint({
  method: 'post',
  path: `${inVersion}/draft/send`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ expectedVersion }),
  response: agreementSchema,
  summary: 'Sends this side’s draft as it stands. The answer may name another agreement of the same scope.',
})

export const discardDraft = defineEndpoint({
  method: 'post',
  path: `${inVersion}/draft/discard`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ expectedVersion }),
  /** Null where nothing is left of the agreement. */
  response: z.object({ agreementId: uuid.nullable() }),
  summary: 'Discards this side’s unsent proposal or answer.',
})

export const answerRound = defineEndpoint({
  method: 'post',
  path: `${inVersion}/answer`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ ...round, expectedVersion }),
  response: agreementSchema,
  summary: 'Answers the other side’s proposal with a changed one, kept as a draft or sent at once.',
})

export const acceptRound = defineEndpoint({
  method: 'post',
  path: `${inVersion}/accept`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ expectedVersion }),
  response: agreementSchema,
  summary: 'Accepts the other side’s proposal: its text is fixed and waits for both signatures.',
})

export const withdrawVersion = defineEndpoint({
  method: 'post',
  path: `${inVersion}/withdraw`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ expectedVersion, reason: paragraph().min(1, 'Say why.') }),
  response: agreementSchema,
  summary: 'Ends a negotiation that both sides have not signed, with the reason.',
})

export const signVersion = defineEndpoint({
  method: 'post',
  path: `${inVersion}/sign`,
  access: 'agreements.sign',
  params: versionParams,
  /** `sha256` is the hash of the text the signer saw. */
  body: z.object({ expectedVersion, sha256: hash }),
  response: agreementSchema,
  fresh: true,
  summary: 'Signs the agreed text for one’s own side; with both signatures it is binding.',
})

/** One clause that applies, with the signed version it comes from. */
export const criterionSchema = z.object({
  clauseKey: z.string(),
  clause: clauseSchema,
  agreementId: uuid,
  agreementNumber: z.number().int(),
  versionId: uuid,
  versionNumber: z.number().int(),
  versionSha256: hash,
  scope: z.enum(scopeKinds),
})
export type Criterion = z.output<typeof criterionSchema>

export const readCriteria = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/tasks/:taskId/criteria',
  access: 'agreements.read',
  params: paramsWith('taskId'),
  query: z.object({
    /** Without it: today in the relationship's time zone. */
    on: calendarDate.optional(),
  }),
  response: z.object({
    on: calendarDate,
    /** First day since which criteria are in force without a gap; attempts count from it. */
    since: calendarDate.nullable(),
    criteria: z.array(criterionSchema),
  }),
  summary: 'The clauses in force for a measuring task on a day, the narrower scope’s before the wider’s.',
})
