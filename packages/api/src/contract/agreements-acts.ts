import { z } from 'zod'
import { clauseKeySchema, enteredClauses } from './agreements-content'
import { hashSchema } from './frozen'
import { agreementSchema } from './agreements-read'
import { aboutSchema, caseSchema } from './agreements-rounds'
import { calendarDate, expectedVersion, organisationParams, paragraph, paramsWith, uuid } from './common'
import { defineEndpoint } from './define'
import { enteredTerms } from './terms'

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
    /** The challenge that asks for it now; without it the one attached to the draft stays. */
    caseOf: caseSchema.optional(),
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
