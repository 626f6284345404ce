import { z } from 'zod'
import { agreementScopeSchema, scopedCharacteristicSchema } from './agreements-content'
import { partySchema } from './frozen'
import { agreementStateSchema, agreementVersionSchema } from './agreements-rounds'
import {
  calendarDate,
  instant,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  sideSchema,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'

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
