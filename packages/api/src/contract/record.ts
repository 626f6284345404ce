import { z } from 'zod'
import {
  calendarDate,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  sideSchema,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'

/** What an event can be about. */
export const recordSubjects = [
  'agreement-version',
  'study',
  'submission',
  'challenge',
  'request',
  'house-terms',
  'part',
  'characteristic',
  'measuring-task',
  'gauge',
  'reference-standard',
  'import',
  'member',
  'organisation',
  'invitation',
  'relationship',
] as const
export type RecordSubject = (typeof recordSubjects)[number]
const recordSubject = z.enum(recordSubjects, 'Choose one of the subjects of the record.')

const hash = z.string().regex(/^[0-9a-f]{64}$/, 'A hash is 64 characters, 0 to 9 and a to f.')

export const recordEventSchema = z.object({
  /** The chain it stands in: the relationship's id, or the organisation's own for its journal. */
  chainId: uuid,
  sequence: z.number().int(),
  at: instant,
  /** Past tense, dotted: `submission.signed`. */
  type: z.string(),
  actor: z.object({
    personId: uuid.nullable(),
    /** Null where the person may not be named (erased, or no member of either side any more). */
    name: z.string().nullable(),
    organisationId: uuid.nullable(),
    organisation: z.string().nullable(),
    side: sideSchema.nullable(),
  }),
  subject: z.object({
    type: recordSubject,
    id: uuid,
    /** What people call it; null where it is not, or no longer, this organisation's to see. */
    label: z.string().nullable(),
    /** The id of what has a page: a characteristic's part, a version's agreement, a challenge's submission. */
    pageId: uuid.nullable(),
  }),
  taskId: uuid.nullable(),
  data: z.record(z.string(), z.unknown()),
  /** The event as canonical JSON; `hash` is the SHA-256 of exactly these characters. */
  text: z.string(),
  previousHash: z.string(),
  hash: z.string(),
})
export type RecordEvent = z.output<typeof recordEventSchema>

export const listEvents = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/record',
  access: 'record.read',
  params: organisationParams,
  query: pageQuery.omit({ search: true }).extend({
    sort: sortBy(['at'], '-at'),
    /** A relationship, or the organisation itself for its journal; without it every chain of this side. */
    chainId: uuid.optional(),
    type: z.string().max(80).optional(),
    subjectType: recordSubject.optional(),
    subjectId: uuid.optional(),
    taskId: uuid.optional(),
    personId: uuid.optional(),
    /** Events that name this clause, such as `bias/mean`. */
    clauseKey: line(200).optional(),
    /** First and last calendar day, in this organisation's time zone. */
    from: calendarDate.optional(),
    to: calendarDate.optional(),
  }),
  response: pageOf(recordEventSchema),
  summary: 'Events that this organisation may see on this side, the latest first.',
})

export const listRecordChoices = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/record/choices',
  access: 'record.read',
  params: organisationParams,
  query: z.object({ chainId: uuid.optional() }),
  response: z.object({
    people: z.array(z.object({ id: uuid, name: z.string().nullable(), organisation: z.string().nullable() })),
    tasks: z.array(z.object({ id: uuid, label: z.string() })),
    clauseKeys: z.array(z.string()),
  }),
  summary: 'Whom, which measuring tasks and which clauses the events of a chain name, to filter by.',
})

/** How the record can be broken at an event. */
export const recordFaults = [
  'missing',
  'text-changed',
  'misplaced',
  'link-broken',
  'columns-changed',
  /** The event is whole, but what it froze (a signed text, an evaluation) is no longer what it names. */
  'frozen-changed',
  'added',
  'end-changed',
  'end-missing',
] as const
export type RecordFault = (typeof recordFaults)[number]

export const recordCheckSchema = z.object({
  chainId: uuid,
  /** Events that follow from each other without a fault, counted from the first. */
  sound: z.number().int(),
  /** The last of them. */
  last: z.object({ sequence: z.number().int(), at: instant, hash: z.string() }).nullable(),
  /** The first event at which the chain is broken; null for one that is whole. */
  broken: z
    .object({ sequence: z.number().int(), fault: z.enum(recordFaults), type: z.string().nullable() })
    .nullable(),
  /** The event whose hash was asked for; null where the chain holds none of it (or none was asked for). */
  known: z.object({ sequence: z.number().int(), at: instant }).nullable(),
})
export type RecordCheck = z.output<typeof recordCheckSchema>

export const verifyRecord = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/record/:chainId/check',
  access: 'record.read',
  params: paramsWith('chainId'),
  query: z.object({
    /** A hash that somebody kept: whoever rewrote the whole chain since then cannot have it. */
    hash: hash.optional(),
  }),
  response: recordCheckSchema,
  summary: 'Recomputes a chain from its first event and names the first at which it is broken.',
})
