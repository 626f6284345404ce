import { z } from 'zod'
import { calendarDate, instant, pageOf, pageQuery, paragraph, paramsWith, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import {
  equipmentKinds,
  gaugeEventKinds,
  limitsComparisons,
  standingSchema,
  standingStates,
} from './standing'

/** One thing that happened to the standing of a submission since it was signed, as both sides read it. */
export const standingEntrySchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('calibration'),
    on: calendarDate,
    of: z.enum(equipmentKinds),
    code: z.string(),
    dueOn: calendarDate,
    enteredAt: instant,
  }),
  z.object({
    kind: z.literal('gauge-event'),
    on: calendarDate,
    of: z.enum(equipmentKinds),
    code: z.string(),
    event: z.enum(gaugeEventKinds),
    inDoubtSince: calendarDate.nullable(),
    words: z.string(),
    enteredAt: instant,
  }),
  z.object({
    kind: z.literal('reinstated'),
    on: calendarDate,
    words: z.string(),
    by: z.string().nullable(),
    enteredAt: instant,
  }),
  z.object({
    kind: z.literal('carried-over'),
    on: calendarDate,
    revision: z.string(),
    by: z.string().nullable(),
    enteredAt: instant,
  }),
])
export type StandingEntry = z.output<typeof standingEntrySchema>

export const readStanding = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/submissions/:submissionId/standing',
  access: 'submissions.read',
  params: paramsWith('submissionId'),
  response: z.object({
    /** Null while it is not accepted. */
    standing: standingSchema.nullable(),
    entries: z.array(standingEntrySchema),
    /** Whether this person may reinstate it now. */
    mayReinstate: z.boolean(),
  }),
  summary: 'How an acceptance stands today, and what happened to it, the latest first.',
})

export const reinstate = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/submissions/:submissionId/reinstate',
  access: 'reviews.approve',
  params: paramsWith('submissionId'),
  body: z.object({ words: paragraph(2000).min(1, 'Say why it stands again.') }),
  response: z.object({ standing: standingSchema }),
  fresh: true,
  summary: 'The customer’s approver lets a suspended acceptance stand again, with the reason.',
})

/** An acceptance of an earlier revision of a part, and how its limits compare with the current revision. */
export const carryOverSchema = z.object({
  submissionId: uuid,
  number: z.number().int(),
  revision: z.string(),
  characteristicNumber: z.number().int(),
  characteristicName: z.string(),
  gaugeCode: z.string(),
  gaugeName: z.string(),
  site: z.string().nullable(),
  processStep: z.string().nullable(),
  limits: z.enum(limitsComparisons),
  /** Of the current revision; null where it has none of that number. */
  characteristicId: uuid.nullable(),
  /** How it stands today apart from the newer revisions: a suspended one stays so when it is carried over. */
  standing: z.enum(standingStates),
  carriedOverOn: calendarDate.nullable(),
  carriedOverBy: z.string().nullable(),
})
export type CarryOver = z.output<typeof carryOverSchema>

export const listCarryOvers = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/parts/:partId/carry-overs',
  access: 'parts.read',
  params: paramsWith('partId'),
  query: pageQuery.omit({ search: true }).extend({ sort: sortBy(['characteristic', 'number']) }),
  response: pageOf(carryOverSchema),
  summary:
    'Acceptances of earlier revisions of a part, and which of them may be carried over to the current one.',
})

export const carryOver = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/carry-overs',
  access: 'reviews.approve',
  params: paramsWith('partId'),
  body: z.object({
    /** The revision that the person had before them; a newer one since then is refused. */
    revisionId: uuid,
    submissionIds: z.array(uuid).min(1, 'Choose at least one acceptance.').max(200),
  }),
  response: z.object({ carried: z.number().int() }),
  fresh: true,
  summary:
    'The customer’s approver carries acceptances of unchanged characteristics over to the current revision.',
})
