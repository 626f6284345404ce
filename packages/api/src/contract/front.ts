import { z } from 'zod'
import { organisationParams } from './common'
import { defineEndpoint } from './define'

const count = z.number().int().min(0)

export const readCounts = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/front/counts',
  access: 'front.read',
  params: organisationParams,
  response: z.object({
    /** Rows of this side's front page. */
    waiting: count,
    /** Agreements that wait for this side's answer or signature. */
    agreements: count,
    /** Messages this person has not read. */
    messages: count,
  }),
  summary: 'What waits for this side, in numbers, for the navigation.',
})
