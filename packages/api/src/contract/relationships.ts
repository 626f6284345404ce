import { z } from 'zod'
import { instant, organisationParams, pageOf, pageQuery, sortBy, uuid } from './common'
import { defineEndpoint } from './define'

export const relationshipSchema = z.object({
  id: uuid,
  /** The organisation on the other side. */
  partner: z.object({ id: uuid, name: z.string() }),
  /** Calendar dates of agreements and calibrations are judged here. */
  timeZone: z.string(),
  /** The number under which the customer keeps this supplier. */
  supplierNumber: z.string().nullable(),
  createdAt: instant,
})
export type Relationship = z.output<typeof relationshipSchema>

export const listRelationships = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/relationships',
  access: 'relationships.read',
  params: organisationParams,
  query: pageQuery.extend({ sort: sortBy(['partner', 'createdAt']) }),
  response: pageOf(relationshipSchema),
  summary: 'The customers, or the suppliers, of this organisation on its side.',
})
