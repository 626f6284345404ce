import { z } from 'zod'
import { calendarDate, instant, line, pageOf, pageQuery, paragraph, paramsWith, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import { fileSchema, largestFile } from './files'

/** How a calibration stands on a day; derived from its due date, never stored. */
export const calibrationStandings = ['none', 'in-date', 'due-soon', 'overdue'] as const
export const calibrationStanding = z.enum(calibrationStandings)
export type CalibrationStanding = z.output<typeof calibrationStanding>

/** From this many days before it is due, a calibration is due soon. */
export const dueSoonDays = 30

/** How the calibration that counts on a day stands on it. The due day itself is still in date. */
export function standingOn(dueOn: string | null, day: string): CalibrationStanding {
  if (dueOn === null) return 'none'
  const left = (Date.parse(dueOn) - Date.parse(day)) / 86_400_000
  if (left < 0) return 'overdue'
  return left <= dueSoonDays ? 'due-soon' : 'in-date'
}

export const calibrationSchema = z.object({
  id: uuid,
  certificateNumber: z.string(),
  laboratory: z.string().nullable(),
  calibratedOn: calendarDate,
  dueOn: calendarDate,
  foundWithinLimits: z.boolean(),
  certificate: fileSchema.nullable(),
  createdAt: instant,
})
export type Calibration = z.output<typeof calibrationSchema>

/** The calibration that counts today, in lists and on pages. */
export const calibrationNow = z.object({
  standing: calibrationStanding,
  calibratedOn: calendarDate.nullable(),
  dueOn: calendarDate.nullable(),
  foundWithinLimits: z.boolean().nullable(),
})

const listQuery = pageQuery.extend({ sort: sortBy(['calibratedOn', 'dueOn'], '-calibratedOn') })
const body = z
  .object({
    certificateNumber: line(80),
    laboratory: line(120).nullable().default(null),
    calibratedOn: calendarDate,
    dueOn: calendarDate,
    foundWithinLimits: z.boolean(),
    /** Where it was found out of limits: what was found, as the customers concerned read it. */
    words: paragraph(2000).default(''),
  })
  .superRefine(({ calibratedOn, dueOn }, context) => {
    if (dueOn < calibratedOn)
      context.addIssue({
        code: 'custom',
        path: ['dueOn'],
        message: 'Enter a due day on or after the day of the calibration.',
      })
  })

export const listGaugeCalibrations = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/gauges/:gaugeId/calibrations',
  access: 'gauges.read',
  params: paramsWith('gaugeId'),
  query: listQuery,
  response: pageOf(calibrationSchema),
  summary: 'Calibrations of a gauge, the latest first.',
})

export const addGaugeCalibration = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges/:gaugeId/calibrations',
  access: 'gauges.change',
  params: paramsWith('gaugeId'),
  body,
  upload: { maximumBytes: largestFile },
  response: calibrationSchema,
  summary: 'Enters a calibration of a gauge, with its certificate as PDF, PNG or JPEG where there is one.',
})

export const listStandardCalibrations = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/standards/:standardId/calibrations',
  access: 'gauges.read',
  params: paramsWith('standardId'),
  query: listQuery,
  response: pageOf(calibrationSchema),
  summary: 'Calibrations of a reference standard, the latest first.',
})

export const addStandardCalibration = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/standards/:standardId/calibrations',
  access: 'gauges.change',
  params: paramsWith('standardId'),
  body,
  upload: { maximumBytes: largestFile },
  response: calibrationSchema,
  summary: 'Enters a calibration of a reference standard, with its certificate where there is one.',
})

export const attachGaugeCertificate = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges/:gaugeId/calibrations/:calibrationId/certificate',
  access: 'gauges.change',
  params: paramsWith('gaugeId', 'calibrationId'),
  body: z.object({}),
  upload: { maximumBytes: largestFile },
  response: calibrationSchema,
  summary: 'Adds the certificate to a calibration of a gauge that was entered without one.',
})

export const attachStandardCertificate = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/standards/:standardId/calibrations/:calibrationId/certificate',
  access: 'gauges.change',
  params: paramsWith('standardId', 'calibrationId'),
  body: z.object({}),
  upload: { maximumBytes: largestFile },
  response: calibrationSchema,
  summary: 'Adds the certificate to a calibration of a reference standard that was entered without one.',
})
