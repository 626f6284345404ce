import { z } from 'zod'
import {
  agreementScopeSchema,
  clauseKeySchema,
  enteredClauses,
  hashSchema,
  partySchema,
  scopedCharacteristicSchema,
} from './agreements-content'
import { aboutSchema, agreementStateSchema, agreementVersionSchema, caseSchema } from './agreements-rounds'
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
import { enteredTerms } from './terms'

export * from './agreements-applies'
export * from './agreements-content'
export * from './agreements-rounds'

const inForceSchema = z.object({ versionId: uuid, number: z.number().int(), effectiveOn: calendarDate })

export const agreementRowSchema = z.object({
  id: uuid,
  /** Null until the first proposal is sent: a draft of one's own side. */
  number: z.number().int().nullable(),
  relationshipId: uuid,
  other: partySchema,
  scope: agreementScopeSchema,
  /** The version in which something happens: the open one, else one's own draft, else the last one sent. */
  newest: z.object({
    versionId: uuid,
    number: z.number().int().nullable(),
    state: agreementStateSchema,
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
    state: agreementStateSchema.optional(),
    waitsOn: sideSchema.optional(),
  }),
  response: pageOf(agreementRowSchema),
  summary: 'Agreements of this side and its own drafts, searched by part, characteristic and partner.',
})

export const agreementSchema = z.object({
  id: uuid,
  number: z.number().int().nullable(),
  relationshipId: uuid,
  scope: agreementScopeSchema,
  supplier: partySchema,
  customer: partySchema,
  timeZone: z.string(),
  /** Today in the relationship's time zone, by which dates are judged. */
  today: calendarDate,
  inForce: inForceSchema.nullable(),
  /** Whether a new version may be begun for this scope: none is open, and this side has no draft. */
  mayBegin: z.boolean(),
  /** The newest first; a draft of one's own side before those that were sent. */
  versions: z.array(agreementVersionSchema),
  /** The first of the active characteristics of the current revisions in scope; `listScoped` pages through all. */
  characteristics: z.array(scopedCharacteristicSchema),
  characteristicsTotal: z.number().int(),
})
export type Agreement = z.output<typeof agreementSchema>

/** An agreement brings so many of its characteristics along. */
export const characteristicsPerAgreement = 50

const round = {
  clauses: enteredClauses,
  terms: enteredTerms,
  /** First day in force, in the relationship's time zone. */
  effectiveOn: calendarDate,
  comment: paragraph().default(''),
  /** Send it to the other side at once; otherwise it stays a draft that only one's own side sees. */
  send: z.boolean().default(false),
}
const caseOf = caseSchema.nullable().default(null)
const inVersion = '/organisations/:organisationId/agreements/:agreementId/versions/:versionId'
const versionParams = paramsWith('agreementId', 'versionId')

export const readAgreement = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/agreements/:agreementId',
  access: 'agreements.read',
  params: paramsWith('agreementId'),
  response: agreementSchema,
  summary: 'One agreement with every version, round, comment, mark and signature this side may see.',
})

export const listScoped = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/agreements/:agreementId/characteristics',
  access: 'agreements.read',
  params: paramsWith('agreementId'),
  query: pageQuery.extend({ sort: sortBy(['part', 'number', 'name', 'class']) }),
  response: pageOf(scopedCharacteristicSchema),
  summary: 'Active characteristics of the current revisions that an agreement covers.',
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
    /** The published house terms of the relationship's customer from which it was begun. */
    houseTermsId: uuid.nullable().default(null),
    caseOf,
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
  body: z.object({
    ...round,
    /** That of the draft round. A refusal `changed-meanwhile` carries what somebody else saved. */
    expectedVersion,
    /** The round its writer has before them; without it the draft goes on answering the one it was begun for. */
    answersRound: z.number().int().min(1).optional(),
  }),
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
  body: z.object({ ...round, caseOf, expectedVersion }),
  response: agreementSchema,
  summary: 'Answers the other side’s proposal with a changed one, kept as a draft or sent at once.',
})

export const withdrawClauses = defineEndpoint({
  method: 'post',
  path: `${inVersion}/withdraw-clauses`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({
    expectedVersion,
    clauseKeys: z.array(clauseKeySchema).min(1, 'Choose the clauses to take out.').max(40),
    words: paragraph().min(1, 'Say why.'),
  }),
  response: agreementSchema,
  summary:
    'Takes clauses out of this side’s standing proposal before the other side answers: a new round of it.',
})

export const commentOnRound = defineEndpoint({
  method: 'post',
  path: `${inVersion}/comments`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({
    /** Number of a round that was sent. */
    round: z.number().int().min(1),
    about: aboutSchema,
    text: paragraph().min(1, 'Write the comment.'),
  }),
  response: agreementSchema,
  summary:
    'Says something about one clause, the terms or the date of a round; both sides read it, nobody changes it.',
})

export const markAccepted = defineEndpoint({
  method: 'post',
  path: `${inVersion}/marks`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({
    /** The standing round, as the reader saw it. */
    round: z.number().int().min(1),
    items: z
      .array(z.object({ about: aboutSchema, sha256: hashSchema }))
      .min(1, 'Choose what to accept.')
      .max(60),
    /** False takes a mark back. */
    accepted: z.boolean().default(true),
  }),
  response: agreementSchema,
  summary: 'Marks single things of the other side’s standing proposal as accepted, or takes such marks back.',
})

export const acceptRound = defineEndpoint({
  method: 'post',
  path: `${inVersion}/accept`,
  access: 'agreements.propose',
  params: versionParams,
  body: z.object({ expectedVersion }),
  response: agreementSchema,
  summary: 'Accepts the whole of the other side’s proposal: its text is fixed and waits for both signatures.',
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
  body: z.object({ expectedVersion, sha256: hashSchema }),
  response: agreementSchema,
  fresh: true,
  summary: 'Signs the agreed text for one’s own side; with both signatures it is binding.',
})
