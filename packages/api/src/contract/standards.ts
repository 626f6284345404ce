import { z } from 'zod'
import { calibrationNow, calibrationStanding } from './calibrations'
import {
  decimalText,
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

export const standardSchema = z.object({
  id: uuid,
  code: z.string(),
  name: z.string(),
  /** Decimal text in `unit`, like the expanded uncertainty. */
  certifiedValue: z.string(),
  unit: z.string(),
  expandedUncertainty: z.string().nullable(),
  /** Null where no uncertainty is stated. */
  coverageFactor: z.string().nullable(),
  calibration: calibrationNow,
  createdAt: instant,
  archivedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type ReferenceStandard = z.output<typeof standardSchema>

export const listStandards = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/standards',
  access: 'gauges.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['code', 'name', 'dueOn', 'createdAt']),
    calibration: calibrationStanding.optional(),
    archived: archivedFilter,
  }),
  response: pageOf(standardSchema),
  summary: 'Reference standards, searched by code and name, with the calibration that counts today.',
})

export const readStandard = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/standards/:standardId',
  access: 'gauges.read',
  params: paramsWith('standardId'),
  response: standardSchema,
  summary: 'One reference standard.',
})

const entered = z.object({
  code: line(40),
  name: line(),
  certifiedValue: decimalText,
  unit: unitSchema,
  expandedUncertainty: positiveDecimalText.nullable().default(null),
  coverageFactor: positiveDecimalText.nullable().default(null),
})

/** An expanded uncertainty means nothing without its coverage factor, and the factor nothing without it. */
const withFactor = <
  T extends z.ZodType<{ expandedUncertainty: string | null; coverageFactor: string | null }>,
>(
  schema: T,
) =>
  schema.superRefine(({ expandedUncertainty, coverageFactor }, context) => {
    if (expandedUncertainty !== null && coverageFactor === null)
      context.addIssue({
        code: 'custom',
        path: ['coverageFactor'],
        message: 'Enter the coverage factor k from the certificate. If it states none, ask the laboratory.',
      })
    if (expandedUncertainty === null && coverageFactor !== null)
      context.addIssue({
        code: 'custom',
        path: ['expandedUncertainty'],
        message: 'Enter the expanded uncertainty this coverage factor belongs to, or leave both empty.',
      })
    if (coverageFactor !== null && (Number(coverageFactor) < 1 || Number(coverageFactor) > 10))
      context.addIssue({
        code: 'custom',
        path: ['coverageFactor'],
        message: 'Enter a coverage factor from 1 to 10; most certificates state 2.',
      })
  })

export const createStandard = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/standards',
  access: 'gauges.change',
  params: organisationParams,
  body: withFactor(entered),
  response: standardSchema,
  summary: 'Registers a reference standard.',
})

export const changeStandard = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/standards/:standardId',
  access: 'gauges.change',
  params: paramsWith('standardId'),
  body: withFactor(entered.extend({ expectedVersion })),
  response: standardSchema,
  summary: 'Changes a reference standard; studies keep the values they were computed with.',
})

const versionOnly = z.object({ expectedVersion })

export const archiveStandard = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/standards/:standardId/archive',
  access: 'gauges.change',
  params: paramsWith('standardId'),
  body: versionOnly,
  response: standardSchema,
  summary: 'Takes a reference standard out of use.',
})

export const restoreStandard = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/standards/:standardId/restore',
  access: 'gauges.change',
  params: paramsWith('standardId'),
  body: versionOnly,
  response: standardSchema,
  summary: 'Brings an archived reference standard back.',
})
