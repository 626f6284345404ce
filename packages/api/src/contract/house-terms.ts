import { z } from 'zod'
import { enteredClauses } from './agreements-content'
import { clauseSchema, hashSchema, partySchema } from './frozen'
import {
  calendarDate,
  expectedVersion,
  instant,
  organisationParams,
  pageOf,
  pageQuery,
  paragraph,
  paramsWith,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { houseTermsMoveNames, houseTermsStates } from './moves/house-terms'
import { enteredTerms, termsSchema } from './terms'

export const houseTermsRowSchema = z.object({
  id: uuid,
  customer: partySchema,
  /** Counts the published versions of this customer; null for a draft. */
  number: z.number().int().nullable(),
  state: z.enum(houseTermsStates),
  /** The published version with the highest number: the one that is offered now. */
  current: z.boolean(),
  clauseCount: z.number().int(),
  /** Why they are as they are, or what is new in them. */
  words: z.string(),
  savedAt: instant,
  publishedAt: instant.nullable(),
})
export type HouseTermsRow = z.output<typeof houseTermsRowSchema>

export const houseTermsSchema = houseTermsRowSchema.extend({
  clauses: z.array(clauseSchema),
  terms: termsSchema,
  /** Who wrote or published it; null where the person may not be named to the reader. */
  by: z.string().nullable(),
  /** Hash of the canonical text of clauses, terms and number; null for a draft. */
  sha256: hashSchema.nullable(),
  rowVersion: z.number().int(),
  /** Moves that this person may make now. */
  moves: z.array(z.enum(houseTermsMoveNames)),
})
export type HouseTerms = z.output<typeof houseTermsSchema>

const content = {
  clauses: enteredClauses,
  terms: enteredTerms,
  words: paragraph().default(''),
}

export const listHouseTerms = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/house-terms',
  access: 'house-terms.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['number', 'publishedAt', 'customer'], '-number'),
    /** For a supplier: those of this relationship's customer alone. */
    relationshipId: uuid.optional(),
    /** `current` leaves out drafts and earlier versions. */
    show: z.enum(['all', 'current']).default('all'),
  }),
  response: pageOf(houseTermsRowSchema),
  summary:
    'A customer’s own house terms, its draft first; for a supplier the published ones of its customers.',
})

export const readHouseTerms = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/house-terms/:houseTermsId',
  access: 'house-terms.read',
  params: paramsWith('houseTermsId'),
  response: houseTermsSchema,
  summary: 'One version of house terms with its clauses and terms.',
})

export const beginHouseTerms = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/house-terms',
  access: 'house-terms.change',
  params: organisationParams,
  body: z.object(content),
  response: houseTermsSchema,
  summary: 'Begins a draft of the next version; there is one at a time.',
})

export const saveHouseTerms = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/house-terms/:houseTermsId',
  access: 'house-terms.change',
  params: paramsWith('houseTermsId'),
  /** A refusal `changed-meanwhile` carries, as `current`, the draft as somebody else saved it. */
  body: z.object({ ...content, expectedVersion }),
  response: houseTermsSchema,
  summary: 'Changes the draft of house terms.',
})

export const publishHouseTerms = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/house-terms/:houseTermsId/publish',
  access: 'house-terms.change',
  params: paramsWith('houseTermsId'),
  body: z.object({ expectedVersion }),
  response: houseTermsSchema,
  summary: 'Publishes the draft under the next number: every supplier of this customer may read it.',
})

export const discardHouseTerms = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/house-terms/:houseTermsId/discard',
  access: 'house-terms.change',
  params: paramsWith('houseTermsId'),
  body: z.object({ expectedVersion }),
  response: z.object({ discarded: z.literal(true) }),
  summary: 'Discards the draft of house terms.',
})

/** What a refusal `changed-meanwhile` carries as `current`; null where the draft was discarded. */
export const houseTermsConflictSchema = z.object({ draft: houseTermsSchema.nullable() })
export type HouseTermsConflict = z.output<typeof houseTermsConflictSchema>

export const offerRefusals = [
  'negotiation-open',
  'draft-exists',
  'clauses-cannot-be-agreed',
  'not-found',
] as const

export const offerHouseTerms = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/house-terms/:houseTermsId/offer',
  access: 'agreements.propose',
  params: paramsWith('houseTermsId'),
  body: z.object({
    relationshipIds: z.array(uuid).min(1, 'Choose the suppliers.').max(100),
    /** First day in force, in each relationship's time zone. */
    effectiveOn: calendarDate,
    comment: paragraph().default(''),
  }),
  response: z.object({
    offered: z.array(z.object({ relationshipId: uuid, agreementId: uuid, versionId: uuid })),
    /** Relationships in which nothing was proposed, each with the reason. */
    refused: z.array(z.object({ relationshipId: uuid, code: z.enum(offerRefusals) })),
  }),
  summary:
    'Proposes a published version to suppliers, for the whole relationship, as a round of its own in each.',
})
