import { z } from 'zod'
import { calendarDate, instant, pageOf, pageQuery, paragraph, paramsWith, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import { fileSchema, largestFile } from './files'
import { gaugeEventKinds } from './standing'

export { gaugeEventKinds, type GaugeEventKind } from './standing'

const kind = z.enum(gaugeEventKinds, 'Choose what happened to the gauge.')

export const gaugeEventSchema = z.object({
  id: uuid,
  kind,
  happenedOn: calendarDate,
  words: z.string(),
  /** Day of the last calibration that found it within limits before that; null where there is none. */
  lastGoodOn: calendarDate.nullable(),
  /** Certificate number of the calibration that found it; null where it was reported otherwise. */
  certificateNumber: z.string().nullable(),
  file: fileSchema.nullable(),
  /** Acceptances it suspended when it was reported, and how many stay as agreed. */
  suspended: z.number().int(),
  stays: z.number().int(),
  reportedBy: z.string().nullable(),
  createdAt: instant,
})
export type GaugeEvent = z.output<typeof gaugeEventSchema>

export const listGaugeEvents = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/gauges/:gaugeId/events',
  access: 'gauges.read',
  params: paramsWith('gaugeId'),
  query: pageQuery.extend({ sort: sortBy(['happenedOn', 'createdAt'], '-happenedOn') }),
  response: pageOf(gaugeEventSchema),
  summary: 'What happened to a gauge, the latest first.',
})

/** What an event would do, before it is reported. */
export const eventEffectSchema = z.object({
  /** Day of the last good calibration before that day; null where there is none. */
  lastGoodOn: calendarDate.nullable(),
  /** Whether the event reaches back to it. */
  reachesBack: z.boolean(),
  suspended: z.number().int(),
  stays: z.number().int(),
  /** Submissions under review whose customers are told as well. */
  underReview: z.number().int(),
  acceptances: z.array(
    z.object({
      submissionId: uuid,
      number: z.number().int(),
      customer: z.string(),
      partNumber: z.string(),
      characteristicNumber: z.number().int(),
      characteristicName: z.string(),
      effect: z.enum(['suspended', 'stays']),
    }),
  ),
})
export type EventEffect = z.output<typeof eventEffectSchema>

const effectQuery = z.object({ kind, happenedOn: calendarDate })

export const previewGaugeEvent = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/gauges/:gaugeId/events/effect',
  access: 'gauges.read',
  params: paramsWith('gaugeId'),
  query: effectQuery,
  response: eventEffectSchema,
  summary: 'Which acceptances an event of a gauge would suspend, before it is reported.',
})

export const previewStandardEvent = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/standards/:standardId/events/effect',
  access: 'gauges.read',
  params: paramsWith('standardId'),
  query: effectQuery,
  response: eventEffectSchema,
  summary: 'Which acceptances a reference standard found out of limits would suspend.',
})

export const reportGaugeEvent = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/gauges/:gaugeId/events',
  access: 'gauges.change',
  params: paramsWith('gaugeId'),
  body: z.object({
    kind,
    happenedOn: calendarDate,
    /** The customers concerned read these words. */
    words: paragraph(2000).min(1, 'Say in a few words what happened.'),
  }),
  upload: { maximumBytes: largestFile },
  response: gaugeEventSchema,
  summary:
    'Reports a gauge out of limits, repaired, moved or changed; acceptances are suspended as agreed and both sides told.',
})
