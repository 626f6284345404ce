import { settleCodes } from '@evenrule/metrology'
import { z } from 'zod'
import { calendarDate, instant, organisationParams, pageOf, pageQuery, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import { fileSchema } from './files'
import { readAsSchema } from './readings'
import { criterionSchema } from './agreements-applies'
import { frozenCharacteristicSchema, hashSchema } from './frozen'
import { measuredAs, studiesPath, studyParams, studyPath, studyState } from './study-parts'
import { verdictSchema } from './submission-content'

const verdictCounts = z.record(verdictSchema, z.number().int())

export const studyRowSchema = z.object({
  id: uuid,
  code: z.string(),
  kind: z.literal('bias'),
  state: studyState,
  gaugeId: uuid,
  gaugeCode: z.string(),
  gaugeName: z.string(),
  standardCode: z.string(),
  registeredAt: instant,
  registeredBeforehand: z.boolean(),
  collectedOn: calendarDate.nullable(),
  plannedReadings: z.number().int(),
  /** Readings kept so far. */
  readings: z.number().int(),
  tasks: z.array(
    z.object({
      taskId: uuid,
      attempt: z.number().int(),
      partNumber: z.string(),
      revision: z.string(),
      characteristicNumber: z.number().int(),
      characteristicName: z.string(),
      customerName: z.string(),
    }),
  ),
  /** How many clauses have which verdict; null until the study is computed. */
  verdicts: verdictCounts.nullable(),
})
export type StudyListed = z.output<typeof studyRowSchema>

export const listStudies = defineEndpoint({
  method: 'get',
  path: studiesPath,
  access: 'studies.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['registeredAt', 'code', 'state', 'gauge', 'collectedOn'], '-registeredAt'),
    state: studyState.optional(),
    gaugeId: uuid.optional(),
    taskId: uuid.optional(),
  }),
  response: pageOf(studyRowSchema),
  summary: 'Studies of this organisation, searched by code, gauge, part and characteristic.',
})

const calibrationOnDay = z.object({
  calibratedOn: calendarDate,
  dueOn: calendarDate,
  certificateNumber: z.string(),
  fileId: uuid.nullable(),
})

const person = z.object({
  id: uuid,
  /** Null where the person has been erased. */
  name: z.string().nullable(),
})

const revisionSchema = z.object({
  id: uuid,
  revision: z.number().int(),
  source: z.enum(['typed', 'pasted', 'uploaded']),
  complete: z.boolean(),
  reason: z.string().nullable(),
  file: fileSchema.nullable(),
  readAs: readAsSchema,
  /** Each reading as it was entered, and as a number; both in the study's unit, as measured. */
  texts: z.array(z.string()),
  values: z.array(z.number()),
  leftOut: z.array(z.object({ row: z.number().int(), column: z.string(), text: z.string() })),
  appraiser: z.string(),
  takenBy: z.array(person),
  collectedOn: calendarDate,
  /** SHA-256 of the canonical JSON of `texts`. */
  sha256: hashSchema,
  createdAt: instant,
  createdBy: person,
})
export type StudyRevision = z.output<typeof revisionSchema>

const evaluationSchema = z.object({
  taskId: uuid,
  clauseKey: z.string(),
  verdict: verdictSchema,
  /** Canonical JSON; read them as ClauseInput and ClauseOutput of the computation. */
  inputText: z.string(),
  outputText: z.string(),
  outputSha256: hashSchema,
  engineVersion: z.string(),
  engineSha256: hashSchema,
  /** What would likely settle a clause that is not shown. */
  settling: z
    .object({
      reason: z.enum(settleCodes),
      readings: z.number().int().nullable(),
      chance: z.number().nullable(),
    })
    .nullable(),
})

export const studySchema = z.object({
  id: uuid,
  code: z.string(),
  kind: z.literal('bias'),
  state: studyState,
  rowVersion: z.number().int(),
  gauge: z.object({
    id: uuid,
    code: z.string(),
    name: z.string(),
    resolution: z.string(),
    unit: z.string(),
  }),
  /** With the values the newest readings were stored with; before that, with those of today. */
  standard: z.object({
    id: uuid,
    code: z.string(),
    name: z.string(),
    certifiedValue: z.string(),
    unit: z.string(),
    expandedUncertainty: z.string().nullable(),
    coverageFactor: z.string().nullable(),
  }),
  unit: z.string(),
  measuredAs,
  plannedReadings: z.number().int(),
  plan: z.object({ bias: z.string(), standardDeviation: z.string(), chance: z.number() }).nullable(),
  registeredAt: instant,
  registeredBy: person,
  registeredBeforehand: z.boolean(),
  collectedOn: calendarDate.nullable(),
  abandonedAt: instant.nullable(),
  abandonReason: z.string().nullable(),
  slots: z.array(z.string()),
  /** The order to take the readings in, with the position or time of each where there are some. */
  runSheet: z.array(z.object({ number: z.number().int(), slot: z.string().nullable() })),
  tasks: z.array(
    z.object({
      taskId: uuid,
      relationshipId: uuid,
      customerName: z.string(),
      partId: uuid,
      site: z.string().nullable(),
      processStep: z.string().nullable(),
      attempt: z.number().int(),
      characteristic: frozenCharacteristicSchema,
      /** Clauses in force on the day of registration. */
      criteria: z.array(criterionSchema),
      /** Estimates where no clause was in force, as JSON of a BiasOutput; null otherwise: evaluations hold them. */
      figuresText: z.string().nullable(),
      /** Every study registered on this task, the newest first; this one included. */
      attempts: z.array(
        z.object({
          studyId: uuid,
          code: z.string(),
          attempt: z.number().int(),
          state: studyState,
          registeredAt: instant,
          registeredBeforehand: z.boolean(),
          collectedOn: calendarDate.nullable(),
          abandonReason: z.string().nullable(),
        }),
      ),
    }),
  ),
  /** On the day the newest readings were taken; null where there are none yet or no calibration. */
  calibration: z.object({ gauge: calibrationOnDay.nullable(), standard: calibrationOnDay.nullable() }),
  /** Revisions of the readings, the newest first. */
  data: z.array(revisionSchema),
  /** The revision that `evaluations` are of: the newest complete one. */
  evaluatedDataId: uuid.nullable(),
  evaluations: z.array(evaluationSchema),
})
export type Study = z.output<typeof studySchema>

export const readStudy = defineEndpoint({
  method: 'get',
  path: studyPath,
  access: 'studies.read',
  params: studyParams,
  response: studySchema,
  summary: 'One study with criteria, run sheet, readings and the evaluation of every clause.',
})
