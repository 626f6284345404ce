import { z } from 'zod'
import { characteristicSchema } from './characteristics'
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
import { archivedFilter } from './parts'
import { proofStates } from './proof'

export const taskSchema = z.object({
  id: uuid,
  relationshipId: uuid,
  supplierName: z.string(),
  customerName: z.string(),
  partId: uuid,
  partNumber: z.string(),
  partName: z.string(),
  revision: z.string(),
  /** Whether the characteristic belongs to the part's current revision. */
  currentRevision: z.boolean(),
  characteristicId: uuid,
  characteristic: characteristicSchema.pick({
    number: true,
    name: true,
    nominal: true,
    lowerLimit: true,
    upperLimit: true,
    unit: true,
    class: true,
    confirmedByCustomer: true,
  }),
  /** The supplier's own gauge; null for the customer, who sees code and name alone. */
  gaugeId: uuid.nullable(),
  gaugeCode: z.string(),
  gaugeName: z.string(),
  site: z.string().nullable(),
  processStep: z.string().nullable(),
  proof: z.enum(proofStates),
  createdAt: instant,
  archivedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type MeasuringTask = z.output<typeof taskSchema>

export const listTasks = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/tasks',
  access: 'tasks.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['part', 'characteristic', 'gauge', 'createdAt']),
    relationshipId: uuid.optional(),
    partId: uuid.optional(),
    revisionId: uuid.optional(),
    characteristicId: uuid.optional(),
    /** For the supplier alone, whose gauges they are. */
    gaugeId: uuid.optional(),
    archived: archivedFilter,
  }),
  response: pageOf(taskSchema),
  summary: 'Measuring tasks of this side, searched by part, characteristic and gauge.',
})

export const readTask = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/tasks/:taskId',
  access: 'tasks.read',
  params: paramsWith('taskId'),
  response: taskSchema,
  summary: 'One measuring task.',
})

const place = {
  /** Where the gauge stands, as both sides name it. */
  site: line(80).nullable().default(null),
  processStep: line(80).nullable().default(null),
}

export const createTask = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/tasks',
  access: 'tasks.change',
  params: organisationParams,
  body: z.object({ characteristicId: uuid, gaugeId: uuid, ...place }),
  response: taskSchema,
  summary: 'Says which gauge measures a characteristic, where and at which process step.',
})

export const takeOverTasks = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/tasks/take-over',
  access: 'tasks.change',
  params: paramsWith('partId'),
  response: z.object({ taken: z.number().int(), left: z.number().int() }),
  summary:
    'Sets up the measuring tasks of the revision before the current one anew, by the numbers of the characteristics.',
})

export const changeTask = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/tasks/:taskId',
  access: 'tasks.change',
  params: paramsWith('taskId'),
  body: z.object({ ...place, expectedVersion }),
  response: taskSchema,
  summary: 'Changes site and process step. Another gauge is another task.',
})

const versionOnly = z.object({ expectedVersion })

export const archiveTask = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/tasks/:taskId/archive',
  access: 'tasks.change',
  params: paramsWith('taskId'),
  body: versionOnly,
  response: taskSchema,
  summary: 'Ends a measuring task; what was proved for it stays in the record.',
})

export const restoreTask = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/tasks/:taskId/restore',
  access: 'tasks.change',
  params: paramsWith('taskId'),
  body: versionOnly,
  response: taskSchema,
  summary: 'Takes an ended measuring task up again.',
})
