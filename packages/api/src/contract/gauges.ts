import { z } from 'zod'
import { calibrationNow, calibrationStanding } from './calibrations'
import {
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  positiveDecimalText,
  sortBy,
  unitSchema,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { archivedFilter } from './parts'

export const gaugeSchema = z.object({
  id: uuid,
  code: z.string(),
  name: z.string(),
  /** Smallest difference it shows, decimal text in `unit`. */
  resolution: z.string(),
  unit: z.string(),
  site: z.string().nullable(),
  calibration: calibrationNow,
  /** Active measuring tasks it serves. */
  tasks: z.number().int(),
  createdAt: instant,
  archivedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type Gauge = z.output<typeof gaugeSchema>

export const listGauges = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/gauges',
  access: 'gauges.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['code', 'name', 'dueOn', 'site', 'createdAt']),
    calibration: calibrationStanding.optional(),
    archived: archivedFilter,
  }),
  response: pageOf(gaugeSchema),
  summary: 'Gauges, searched by code and name, with the calibration that counts today.',
})

export const readGauge = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/gauges/:gaugeId',
  access: 'gauges.read',
  params: paramsWith('gaugeId'),
  response: gaugeSchema,
  summary: 'One gauge.',
})

const entered = {
  code: line(40),
  name: line(),
  resolution: positiveDecimalText,
  unit: unitSchema,
  /** Name of the site where it stands; a name that is not known yet becomes a site of the organisation. */
  site: line(80).nullable().default(null),
}

export const createGauge = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges',
  access: 'gauges.change',
  params: organisationParams,
  body: z.object(entered),
  response: gaugeSchema,
  summary: 'Registers a gauge.',
})

export const changeGauge = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/gauges/:gaugeId',
  access: 'gauges.change',
  params: paramsWith('gaugeId'),
  body: z.object({ ...entered, expectedVersion }),
  response: gaugeSchema,
  summary: 'Changes a gauge; studies keep what they were registered with.',
})

const versionOnly = z.object({ expectedVersion })

export const archiveGauge = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges/:gaugeId/archive',
  access: 'gauges.change',
  params: paramsWith('gaugeId'),
  body: versionOnly,
  response: gaugeSchema,
  summary: 'Takes a gauge out of use; it must serve no active measuring task.',
})

export const restoreGauge = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges/:gaugeId/restore',
  access: 'gauges.change',
  params: paramsWith('gaugeId'),
  body: versionOnly,
  response: gaugeSchema,
  summary: 'Brings an archived gauge back.',
})

export const listSites = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/sites',
  access: 'organisation.read',
  params: organisationParams,
  query: pageQuery.extend({ sort: sortBy(['name']) }),
  response: pageOf(z.object({ id: uuid, name: z.string() })),
  summary: 'Sites of this organisation.',
})
