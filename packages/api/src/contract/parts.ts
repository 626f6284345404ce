import { z } from 'zod'
import {
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'

/** Which of active and archived rows a list shows. */
export const archivedFilter = z.enum(['active', 'archived', 'all']).default('active')

export const partNumber = line(60)
export const revisionLabel = line(20)

export const revisionSchema = z.object({
  id: uuid,
  label: z.string(),
  sequence: z.number().int(),
  createdAt: instant,
})
export type Revision = z.output<typeof revisionSchema>

export const partSchema = z.object({
  id: uuid,
  relationshipId: uuid,
  supplierName: z.string(),
  customerName: z.string(),
  /** The customer's part number. */
  number: z.string(),
  /** The supplier's own number for it. */
  supplierNumber: z.string().nullable(),
  name: z.string(),
  /** The revision with the highest sequence. */
  currentRevision: revisionSchema,
  /** Active characteristics of the current revision, and those that wait for the customer's confirmation. */
  characteristics: z.number().int(),
  unconfirmed: z.number().int(),
  createdAt: instant,
  archivedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type Part = z.output<typeof partSchema>

export const partSorts = ['number', 'name', 'supplierNumber', 'partner', 'createdAt'] as const

export const listParts = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/parts',
  access: 'parts.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(partSorts),
    relationshipId: uuid.optional(),
    archived: archivedFilter,
  }),
  response: pageOf(partSchema),
  summary: 'Part numbers of this side, searched by number, own number and name.',
})

export const readPart = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/parts/:partId',
  access: 'parts.read',
  params: paramsWith('partId'),
  response: partSchema,
  summary: 'One part number.',
})

export const createPart = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts',
  access: 'parts.change',
  params: organisationParams,
  body: z.object({
    relationshipId: uuid,
    number: partNumber,
    supplierNumber: partNumber.nullable().default(null),
    name: line(),
    /** Label of the first revision. */
    revision: revisionLabel,
  }),
  response: partSchema,
  summary: 'Enters a part number with its first revision.',
})

export const changePart = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/parts/:partId',
  access: 'parts.change',
  params: paramsWith('partId'),
  body: z.object({
    number: partNumber,
    supplierNumber: partNumber.nullable(),
    name: line(),
    expectedVersion,
  }),
  response: partSchema,
  summary: 'Changes the number and name of a part. Its revisions and characteristics stay.',
})

const versionOnly = z.object({ expectedVersion })

export const archivePart = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/archive',
  access: 'parts.change',
  params: paramsWith('partId'),
  body: versionOnly,
  response: partSchema,
  summary: 'Takes a part number out of the lists; nothing is lost.',
})

export const restorePart = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/restore',
  access: 'parts.change',
  params: paramsWith('partId'),
  body: versionOnly,
  response: partSchema,
  summary: 'Brings an archived part number back.',
})

export const listRevisions = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/parts/:partId/revisions',
  access: 'parts.read',
  params: paramsWith('partId'),
  query: pageQuery.extend({ sort: sortBy(['sequence', 'label'], '-sequence') }),
  response: pageOf(revisionSchema),
  summary: 'Revisions of a part, the current one first.',
})

export const addRevision = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/revisions',
  access: 'parts.change',
  params: paramsWith('partId'),
  body: z.object({
    label: revisionLabel,
    /** Copy the active characteristics of the current revision into the new one. */
    copyCharacteristics: z.boolean(),
    /** The part's version: two people adding a revision at once would copy different things. */
    expectedVersion,
  }),
  response: partSchema,
  summary: 'Adds a revision, which becomes the current one. Limits agreed for the old one stay with it.',
})
