import type { Verdict } from '@evenrule/metrology'
import { z } from 'zod'
import { byHandVerdicts } from './by-hand-verdicts'
import { calendarDate, instant, uuid } from './common'
import { clauseSchema, frozenCharacteristicSchema, hashSchema, partySchema, scopeKinds } from './frozen'
import { resolvedTermsSchema } from './terms'

export const verdictSchema = z.enum([
  'meets',
  'meets-with-conditions',
  'falls-short',
  'not-shown',
] as const satisfies readonly Verdict[])

const calibrationSchema = z
  .object({ certificateNumber: z.string(), calibratedOn: calendarDate, dueOn: calendarDate })
  .nullable()

const frozenStudySchema = z.object({
  code: z.string(),
  kind: z.literal('bias'),
  attempt: z.number().int(),
  registeredAt: instant,
  registeredBeforehand: z.boolean(),
  plannedReadings: z.number().int(),
  unit: z.string(),
  measuredAs: z.enum(['value', 'deviation']),
  /** The gauge as it stood at registration; its resolution is the one that clauses judge. */
  gauge: z.object({ code: z.string(), name: z.string(), resolution: z.string(), unit: z.string() }),
  standard: z.object({
    code: z.string(),
    name: z.string(),
    certifiedValue: z.string(),
    unit: z.string(),
    expandedUncertainty: z.string().nullable(),
    coverageFactor: z.string(),
  }),
  calibration: z.object({ gauge: calibrationSchema, standard: calibrationSchema }),
  data: z.object({
    revision: z.number().int(),
    /** Why readings that were judged before were replaced; null for the first. */
    reason: z.string().nullable(),
    source: z.enum(['typed', 'pasted', 'uploaded']),
    collectedOn: calendarDate,
    /** Code of the person who took the readings; the name stays with the supplier. */
    appraiser: z.string(),
    /** Each reading as it was entered, in the study's unit. */
    readings: z.array(z.string()),
    /** Rows of the file that held no number where a reading was expected, left out by the supplier. */
    leftOut: z.array(z.object({ row: z.number().int(), column: z.string(), text: z.string() })),
    /** SHA-256 of the canonical JSON of `readings`. */
    sha256: hashSchema,
    /** SHA-256 of the file they were read from, where there is one. */
    fileSha256: hashSchema.nullable(),
  }),
})
export type FrozenStudy = z.output<typeof frozenStudySchema>

/** How a clause was judged: on which study, with what result, by which engine. */
const judgedFields = {
  clauseKey: z.string(),
  clause: clauseSchema,
  /** Code of the study it is judged on; null where none answers it. */
  study: z.string().nullable(),
  verdict: verdictSchema,
  inputSha256: hashSchema,
  outputSha256: hashSchema,
  engineVersion: z.string(),
  engineSha256: hashSchema,
}
const frozenClauseSchema = z.object({
  ...judgedFields,
  agreementNumber: z.number().int(),
  versionNumber: z.number().int(),
  versionId: uuid,
  scope: z.enum(scopeKinds),
})
export type FrozenClauseResult = z.output<typeof frozenClauseSchema>

/** A clause of the customer's house terms: judged for information where no criteria are agreed. */
const advisoryClauseSchema = z.object(judgedFields)
export type AdvisoryClauseResult = z.output<typeof advisoryClauseSchema>
/** What both kinds have in common. */
export type JudgedClause = AdvisoryClauseResult

export const fileRoleSchema = z.enum(['readings', 'gauge-certificate', 'standard-certificate', 'document'])
export type FileRole = z.output<typeof fileRoleSchema>

/** Everything a submission freezes at signing; the signatures name the SHA-256 of its canonical JSON. */
export const submissionContentSchema = z.object({
  format: z.literal('evenrule.submission/1'),
  number: z.number().int(),
  /** Counts the signed texts of the submission, from one; a correction adds one. */
  revision: z.number().int(),
  /** Of a correction: the text it takes the place of, and the challenge it answers. */
  corrects: z.object({ sha256: hashSchema, challenge: z.number().int() }).nullable(),
  /** Whether signed criteria applied on the day; `none`: an approver of each side decides. */
  criteria: z.enum(['agreed', 'none']),
  /** The calendar day, in the relationship's time zone, whose criteria it answers. */
  criteriaOn: calendarDate,
  relationship: z.object({ id: uuid, supplier: partySchema, customer: partySchema, timeZone: z.string() }),
  characteristic: frozenCharacteristicSchema,
  part: z.object({ id: uuid, name: z.string() }),
  task: z.object({
    id: uuid,
    gaugeCode: z.string(),
    gaugeName: z.string(),
    /** As it stood at the registration of the newest study, in the gauge's unit. */
    gaugeResolution: z.string(),
    gaugeUnit: z.string(),
    site: z.string().nullable(),
    processStep: z.string().nullable(),
  }),
  agreements: z.array(
    z.object({
      agreementNumber: z.number().int(),
      versionNumber: z.number().int(),
      versionId: uuid,
      scope: z.enum(scopeKinds),
      effectiveOn: calendarDate,
      sha256: hashSchema,
    }),
  ),
  clauses: z.array(frozenClauseSchema),
  /** The terms that the agreements set for the day, or the defaults. */
  terms: resolvedTermsSchema,
  /** The customer's house terms, judged for information only; null and empty where criteria are agreed. */
  houseTerms: z.object({ id: uuid, number: z.number().int(), sha256: hashSchema }).nullable(),
  advisory: z.array(advisoryClauseSchema),
  /** Clauses that were judged by hand, each on a document among the files. */
  byHand: z.array(
    z.object({
      clauseKey: z.string(),
      verdict: z.enum(byHandVerdicts),
      reason: z.string(),
      document: z.object({ name: z.string(), sha256: hashSchema }),
    }),
  ),
  /** The customer's open requests that it answers. */
  requests: z.array(z.object({ id: uuid, number: z.number().int() })),
  studies: z.array(frozenStudySchema),
  /** The day from which attempts count: the first on which criteria for this scope were in force. */
  attemptsSince: calendarDate.nullable(),
  /** Every study registered on the task since then, abandoned ones included. */
  attempts: z.array(
    z.object({
      code: z.string(),
      registeredAt: instant,
      registeredBeforehand: z.boolean(),
      state: z.enum(['registered', 'collecting', 'computed', 'abandoned']),
      collectedOn: calendarDate.nullable(),
      abandonReason: z.string().nullable(),
    }),
  ),
  files: z.array(
    z.object({
      role: fileRoleSchema,
      name: z.string(),
      contentType: z.string(),
      size: z.number().int(),
      sha256: hashSchema,
    }),
  ),
})
export type SubmissionContent = z.output<typeof submissionContentSchema>

/** The content of a frozen text; null where it is no such text any more. */
export function contentOf(text: string): SubmissionContent | null {
  try {
    return submissionContentSchema.safeParse(JSON.parse(text)).data ?? null
  } catch {
    return null
  }
}

/** One evaluation as stored: the canonical texts are the original. */
export const evaluationSchema = z.object({
  clauseKey: z.string(),
  /** Of a clause of house terms, judged for information. */
  advisory: z.boolean(),
  inputText: z.string(),
  outputText: z.string(),
  outputSha256: hashSchema,
  engineVersion: z.string(),
  engineSha256: hashSchema,
})
export type SubmissionEvaluation = z.output<typeof evaluationSchema>

/**
 * The verdict of a whole submission: it meets only where every clause does; one that falls short decides, then
 * one that is not shown. Without clauses nothing is shown.
 */
export function overallVerdict(verdicts: readonly Verdict[]): Verdict {
  for (const verdict of ['falls-short', 'not-shown', 'meets-with-conditions'] as const)
    if (verdicts.includes(verdict)) return verdict
  return verdicts.length ? 'meets' : 'not-shown'
}

export const isMet = (verdict: Verdict): boolean => verdict === 'meets' || verdict === 'meets-with-conditions'

/** The verdict of the whole and how many clauses are met, from the clauses of the frozen text. */
export function summaryOf({ clauses }: Pick<SubmissionContent, 'clauses'>): {
  verdict: Verdict
  clausesMet: number
  clausesTotal: number
} {
  return {
    verdict: overallVerdict(clauses.map(({ verdict }) => verdict)),
    clausesMet: clauses.filter(({ verdict }) => isMet(verdict)).length,
    clausesTotal: clauses.length,
  }
}
