import { settleCodes, type Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { characteristicClass } from './characteristics'
import {
  calendarDate,
  decimalText,
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paragraph,
  paramsWith,
  positiveDecimalText,
  sortBy,
  unitSchema,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { fileSchema } from './files'
import { studyStates } from './moves/study'
import {
  appraiserCode,
  largestReadingsFile,
  mostReadings,
  readAsSchema,
  readingsInput,
  readingsPreviewSchema,
  separators,
} from './readings'
import { verdictSchema } from './submission-content'

export * from './readings'

const hash = z.string().regex(/^[0-9a-f]{64}$/)
const state = z.enum(studyStates)
const measuredAs = z.enum(['value', 'deviation'], 'Choose value or deviation.')
const base = '/organisations/:organisationId/studies'
const one = `${base}/:studyId`
const params = paramsWith('studyId')

/** A clause as it was in force when the study was registered, with the agreement it comes from. */
const frozenClauseSchema = z.object({
  clauseKey: z.string(),
  clause: z.custom<Clause>(
    (value) => typeof value === 'object' && value !== null && 'type' in value && 'parameters' in value,
  ),
  agreementId: uuid,
  agreementNumber: z.number().int(),
  versionId: uuid,
  versionNumber: z.number().int(),
  versionSha256: z.string(),
  scope: z.enum(['relationship', 'part', 'characteristic']),
})

const characteristicSchema = z.object({
  characteristicId: uuid,
  partNumber: z.string(),
  revision: z.string(),
  number: z.number().int(),
  name: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  class: characteristicClass,
  processStandardDeviation: z.string().nullable(),
})

const planSchema = z.object({
  /** True bias and spread that are assumed, in the unit of the readings. */
  bias: decimalText,
  standardDeviation: positiveDecimalText,
  /** The wanted chance to meet every clause. */
  chance: z
    .number('Enter a chance, such as 0.9.')
    .min(0.01, 'Enter a chance from 0.01 to 0.999.')
    .max(0.999, 'Enter a chance from 0.01 to 0.999.'),
})

const taskIds = z
  .array(uuid)
  .min(1, 'Choose at least one measuring task.')
  .max(20, 'One study serves at most 20 measuring tasks.')

export const planReasons = [
  'size-found',
  'minimum',
  'any-size',
  'no-size-suffices',
  'size-does-not-help',
  /** Judged on something that the number of readings does not touch: resolution, calibration. */
  'not-about-size',
] as const
export type PlanReason = (typeof planReasons)[number]

export const studyPlanSchema = z.object({
  /** Least readings for every clause of every task; null where a clause has none, or none asks for a number. */
  readings: z.number().int().nullable(),
  fewestReadings: z.number().int(),
  mostReadings: z.number().int(),
  tasks: z.array(
    z.object({
      taskId: uuid,
      readings: z.number().int().nullable(),
      characteristic: characteristicSchema,
      /** Registered on this task so far since criteria came into force; a new study is one more. */
      attempts: z.number().int(),
      clauses: z.array(
        frozenClauseSchema.extend({
          readings: z.number().int().nullable(),
          chance: z.number().nullable(),
          reason: z.enum(planReasons),
        }),
      ),
    }),
  ),
})
export type StudyPlanned = z.output<typeof studyPlanSchema>

export const planStudy = defineEndpoint({
  method: 'post',
  path: `${base}/plan`,
  access: 'studies.read',
  params: organisationParams,
  body: planSchema.extend({ taskIds, unit: unitSchema }),
  response: studyPlanSchema,
  summary: 'How many readings give the wanted chance to meet the clauses in force; nothing is stored.',
})

const verdictCounts = z.record(verdictSchema, z.number().int())

export const studyRowSchema = z.object({
  id: uuid,
  code: z.string(),
  kind: z.literal('bias'),
  state,
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
  path: base,
  access: 'studies.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['registeredAt', 'code', 'state', 'gauge', 'collectedOn'], '-registeredAt'),
    state: state.optional(),
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
  sha256: hash,
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
  outputSha256: hash,
  engineVersion: z.string(),
  engineSha256: hash,
  /** What would likely settle a clause that is not shown. */
  settling: z
    .object({
      reason: z.enum(settleCodes),
      readings: z.number().int().nullable(),
      chance: z.number().nullable(),
    })
    .nullable(),
})
export type StudyEvaluation = z.output<typeof evaluationSchema>

export const studySchema = z.object({
  id: uuid,
  code: z.string(),
  kind: z.literal('bias'),
  state,
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
      characteristic: characteristicSchema,
      /** Clauses in force on the day of registration. */
      criteria: z.array(frozenClauseSchema),
      /** Estimates where no clause was in force, as JSON of a BiasOutput; null otherwise: evaluations hold them. */
      figuresText: z.string().nullable(),
      /** Every study registered on this task, the newest first; this one included. */
      attempts: z.array(
        z.object({
          studyId: uuid,
          code: z.string(),
          attempt: z.number().int(),
          state,
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
  path: one,
  access: 'studies.read',
  params,
  response: studySchema,
  summary: 'One study with criteria, run sheet, readings and the evaluation of every clause.',
})

export const registerStudy = defineEndpoint({
  method: 'post',
  path: base,
  access: 'studies.change',
  params: organisationParams,
  body: z.object({
    code: line(40),
    taskIds,
    standardId: uuid,
    plannedReadings: z
      .number('Enter a whole number of readings.')
      .int('Enter a whole number of readings.')
      .min(2, 'Plan at least 2 readings; one says nothing about the spread.')
      .max(mostReadings, 'One study holds at most 100,000 readings.'),
    plan: planSchema.nullable().default(null),
    unit: unitSchema,
    measuredAs,
    /** Positions or times among which the run sheet deals the readings. */
    slots: z.array(line(40)).max(200, 'Name at most 200 positions or times.').default([]),
    /** False for readings taken before the study came to be registered here; the other side is told. */
    registeredBeforehand: z.boolean().default(true),
  }),
  response: studySchema,
  summary: 'Registers a study before its first reading: criteria and limits of every task are frozen.',
})

export const downloadRunSheet = defineEndpoint({
  method: 'get',
  path: `${one}/run-sheet.csv`,
  access: 'studies.read',
  params,
  query: z.object({ separator: z.enum(separators).exclude(['none']).default('comma') }),
  summary: 'The randomised run sheet as CSV, with an empty column to fill in and upload again.',
})

export const previewReadings = defineEndpoint({
  method: 'post',
  path: `${one}/readings/preview`,
  access: 'studies.change',
  params,
  body: readingsInput.extend({
    /** As when storing: the readings follow those kept so far. */
    append: z.boolean().default(false),
  }),
  upload: { maximumBytes: largestReadingsFile },
  response: readingsPreviewSchema,
  summary: 'Reads typed, pasted or uploaded readings and names every cell that is wrong; nothing is stored.',
})

export const storeReadings = defineEndpoint({
  method: 'post',
  path: `${one}/readings`,
  access: 'studies.change',
  params,
  body: readingsInput.extend({
    expectedVersion,
    /** These readings follow those kept so far; otherwise they are all of them. */
    append: z.boolean().default(false),
    /** True computes the study; false keeps the readings while more will follow. */
    complete: z.boolean(),
    /** Leaves out rows without a number; they are named in the study. */
    leaveOutBadRows: z.boolean().default(false),
    collectedOn: calendarDate,
    appraiser: appraiserCode,
    /** Members who took the readings, and may not sign the submission. */
    takenBy: z
      .array(uuid)
      .min(1, 'Say who took the readings: they may not sign the submission.')
      .max(20, 'Name at most 20 people.'),
    /** Why readings of a computed study are replaced. */
    reason: paragraph(1000).nullable().default(null),
  }),
  upload: { maximumBytes: largestReadingsFile },
  response: studySchema,
  summary: 'Stores readings as a revision of their own, the file byte for byte, and computes every clause.',
})

export const downloadReadings = defineEndpoint({
  method: 'get',
  path: `${one}/readings/:revision/file`,
  access: 'studies.read',
  params: params.extend({ revision: z.coerce.number().int().min(1) }),
  summary: 'The file a revision of the readings was uploaded as, byte for byte.',
})

export const abandonStudy = defineEndpoint({
  method: 'post',
  path: `${one}/abandon`,
  access: 'studies.change',
  params,
  body: z.object({ expectedVersion, reason: paragraph(1000).min(1, 'Say why it is abandoned.') }),
  response: studySchema,
  summary: 'Abandons a study that is not computed. It still counts as an attempt, with the reason.',
})
