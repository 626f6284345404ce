import canonicalize from 'canonicalize'
import { z } from 'zod'
import { contentOf, summaryOf, type JudgedClause, type SubmissionContent } from './submission-content'

export const clauseProblems = [
  /** The frozen text names a clause whose evaluation is not there. */
  'missing',
  /** An evaluation is there that the frozen text does not name. */
  'not-in-text',
  'input-altered',
  'output-altered',
  'verdict-altered',
  'engine-unavailable',
  'engine-altered',
  'recomputed-differs',
] as const
export type ClauseProblem = (typeof clauseProblems)[number]

export const differenceSchema = z.object({
  /** Path of the first field that differs, such as `study.equivalence.interval.lower`; empty for the whole. */
  path: z.string(),
  /** Both values as JSON; null where one side has no such field. */
  stored: z.string().nullable(),
  recomputed: z.string().nullable(),
})
export type Difference = z.output<typeof differenceSchema>

const clauseCheckSchema = z.object({
  clauseKey: z.string(),
  equal: z.boolean(),
  problem: z.enum(clauseProblems).nullable(),
  difference: differenceSchema.nullable(),
  engineVersion: z.string(),
  engineSha256: z.string(),
  outputSha256: z.string(),
  recomputedSha256: z.string().nullable(),
})
export type ClauseCheck = z.output<typeof clauseCheckSchema>

export const submissionCheckSchema = z.object({
  /** Everything below is equal. */
  equal: z.boolean(),
  /** The frozen text is canonical and has the hash it is stored under. */
  text: z.object({ equal: z.boolean(), stored: z.string(), recomputed: z.string() }),
  /** Each signature names that hash. */
  signatures: z.array(z.object({ meaning: z.string(), equal: z.boolean() })),
  /** The readings of each study have the hash that the frozen text names. */
  data: z.array(
    z.object({ study: z.string(), equal: z.boolean(), stored: z.string(), recomputed: z.string() }),
  ),
  clauses: z.array(clauseCheckSchema),
  /** A correction names the text that it takes the place of; null for the first text, or where that was not given. */
  corrects: z.object({ equal: z.boolean(), stored: z.string(), recomputed: z.string() }).nullable(),
  /** Verdict and counts that lists show are those of the frozen text; null where they were not given. */
  listed: z.object({ equal: z.boolean(), difference: differenceSchema.nullable() }).nullable(),
})
export type SubmissionCheck = z.output<typeof submissionCheckSchema>

export interface CheckedEvaluation {
  clauseKey: string
  inputText: string
  outputText: string
  outputSha256: string
  engineVersion: string
  engineSha256: string
  /** The verdict stored beside the output, where there is one. */
  verdict?: string
}

/** The engine that an evaluation names could not be had, or is not the one with that hash. */
export class EngineProblem extends Error {
  constructor(readonly problem: 'engine-unavailable' | 'engine-altered') {
    super(problem)
    this.name = 'EngineProblem'
  }
}

/** SHA-256 of a text in UTF-8, as 64 hex digits; the same in Node and in the browser. */
export async function sha256Of(text: string): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(text))
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('')
}

type Json = null | boolean | number | string | Json[] | { [key: string]: Json }

const isObject = (value: Json | undefined): value is { [key: string]: Json } =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

function walk(a: Json | undefined, b: Json | undefined, path: string): Difference | null {
  if (Array.isArray(a) && Array.isArray(b)) {
    for (let at = 0; at < Math.max(a.length, b.length); at += 1) {
      const found = walk(a[at], b[at], `${path}[${at}]`)
      if (found) return found
    }
    return null
  }
  if (isObject(a) && isObject(b)) {
    for (const key of [...new Set([...Object.keys(a), ...Object.keys(b)])].sort()) {
      const found = walk(a[key], b[key], path ? `${path}.${key}` : key)
      if (found) return found
    }
    return null
  }
  if (a !== undefined && b !== undefined && JSON.stringify(a) === JSON.stringify(b)) return null
  const write = (value: Json | undefined) => (value === undefined ? null : JSON.stringify(value))
  return { path, stored: write(a), recomputed: write(b) }
}

const parse = (text: string): Json | undefined => {
  try {
    return JSON.parse(text) as Json
  } catch {
    return undefined
  }
}

/** The first field in which two JSON texts differ, in the order of their keys; null for the same bytes. */
export function firstDifference(stored: string, recomputed: string): Difference | null {
  if (stored === recomputed) return null
  const [a, b] = [parse(stored), parse(recomputed)]
  const found = a === undefined || b === undefined ? null : walk(a, b, '')
  // The same values in other bytes: an order of keys or a spelling of numbers that is not canonical.
  return found ?? { path: '', stored, recomputed }
}

async function checkClause(
  clause: JudgedClause,
  evaluation: CheckedEvaluation | undefined,
  recompute: Recompute,
): Promise<ClauseCheck> {
  const base = {
    clauseKey: clause.clauseKey,
    engineVersion: clause.engineVersion,
    engineSha256: clause.engineSha256,
    outputSha256: clause.outputSha256,
  }
  if (!evaluation)
    return { ...base, equal: false, problem: 'missing', difference: null, recomputedSha256: null }
  let recomputed: string
  try {
    // The engine is the one that the signed text names, whatever the row beside it says.
    recomputed = await recompute({ ...evaluation, engineSha256: clause.engineSha256 })
  } catch (error) {
    const problem = error instanceof EngineProblem ? error.problem : 'engine-unavailable'
    // What was altered shows by its hash, with or without the engine.
    const found = (await alteredOf(clause, evaluation, null)) ?? { problem, difference: null }
    return { ...base, equal: false, ...found, recomputedSha256: null }
  }
  const recomputedSha256 = await sha256Of(recomputed)
  const found = await problemOf(clause, evaluation, recomputed)
  const { problem = null, difference = null } = found ?? {}
  return { ...base, equal: problem === null, problem, difference, recomputedSha256 }
}

interface Found {
  problem: ClauseProblem
  difference: Difference | null
}

const differs = (path: string, stored: string, recomputed: string): Difference => ({
  path,
  stored: JSON.stringify(stored),
  recomputed: JSON.stringify(recomputed),
})

/** Whether input or output are no longer those that the signed text names; `difference` tells more where it is known. */
async function alteredOf(
  clause: JudgedClause,
  evaluation: CheckedEvaluation,
  difference: Difference | null,
): Promise<Found | null> {
  const found = (problem: ClauseProblem, fallback: Difference): Found => ({
    problem,
    difference: difference ?? fallback,
  })
  const inputSha256 = await sha256Of(evaluation.inputText)
  if (inputSha256 !== clause.inputSha256)
    return found('input-altered', differs('inputSha256', clause.inputSha256, inputSha256))
  const outputSha256 = await sha256Of(evaluation.outputText)
  for (const hash of [outputSha256, evaluation.outputSha256])
    if (hash !== clause.outputSha256)
      return found('output-altered', differs('outputSha256', hash, clause.outputSha256))
  return evaluation.engineSha256 === clause.engineSha256
    ? null
    : found('engine-altered', differs('engineSha256', evaluation.engineSha256, clause.engineSha256))
}

async function problemOf(
  clause: JudgedClause,
  evaluation: CheckedEvaluation,
  recomputed: string,
): Promise<Found | null> {
  const difference = firstDifference(evaluation.outputText, recomputed)
  const altered = await alteredOf(clause, evaluation, difference)
  if (altered) return altered
  if (difference) return { problem: 'recomputed-differs', difference }
  const output = parse(recomputed)
  const verdict = isObject(output) && typeof output.verdict === 'string' ? output.verdict : ''
  for (const stored of [clause.verdict, evaluation.verdict ?? clause.verdict])
    if (stored !== verdict)
      return { problem: 'verdict-altered', difference: differs('verdict', stored, verdict) }
  return null
}

/** Computes the canonical output text of an evaluation's input on the engine it names, or throws `EngineProblem`. */
export type Recompute = (evaluation: CheckedEvaluation) => Promise<string>

/**
 * Checks everything a submission froze: the hash of its text, what each signature names, the hashes of the
 * readings, and every clause computed again. The server and the reviewer's browser run this same function, each
 * with its own way to the engine.
 */
export async function checkSubmission(
  submission: {
    text: string
    sha256: string
    signatures: readonly { meaning: string; sha256: string }[]
    evaluations: readonly CheckedEvaluation[]
    /** The text of the revision before this one; given where there is one. */
    previousText?: string | undefined
    /** What lists show of it; given where it is stored beside the text. */
    listed?: { verdict: string | null; clausesMet: number | null; clausesTotal: number | null }
  },
  recompute: Recompute,
): Promise<SubmissionCheck> {
  const content = contentOf(submission.text)
  const recomputed = await sha256Of(submission.text)
  const canonical = content !== null && canonicalize(JSON.parse(submission.text)) === submission.text
  const text = { equal: canonical && recomputed === submission.sha256, stored: submission.sha256, recomputed }
  const signatures = submission.signatures.map(({ meaning, sha256 }) => ({
    meaning,
    equal: sha256 === recomputed,
  }))
  const data = await Promise.all(
    (content?.studies ?? []).map(async ({ code, data: { readings, sha256 } }) => {
      const again = await sha256Of(canonicalize(readings) ?? '')
      return { study: code, equal: again === sha256, stored: sha256, recomputed: again }
    }),
  )
  const named: JudgedClause[] = [...(content?.clauses ?? []), ...(content?.advisory ?? [])]
  const clauses: ClauseCheck[] = []
  for (const clause of named) {
    const evaluation = submission.evaluations.find((each) => each.clauseKey === clause.clauseKey)
    clauses.push(await checkClause(clause, evaluation, recompute))
  }
  clauses.push(...strangers(named, submission.evaluations))
  const listed = submission.listed && content ? checkListed(submission.listed, content) : null
  const corrects = await checkPrevious(content, submission.previousText)
  const parts = [
    text,
    ...signatures,
    ...data,
    ...clauses,
    ...(listed ? [listed] : []),
    ...(corrects ? [corrects] : []),
  ]
  const equal = parts.every((each) => each.equal)
  return { equal, text, signatures, data, clauses, corrects, listed }
}

/** A first text corrects nothing; every later one names the hash of the one before. */
async function checkPrevious(
  content: SubmissionContent | null,
  previousText: string | undefined,
): Promise<SubmissionCheck['corrects']> {
  const stored = content?.corrects?.sha256 ?? ''
  if (previousText === undefined && stored === '') return null
  const recomputed = previousText === undefined ? '' : await sha256Of(previousText)
  return { equal: stored === recomputed, stored, recomputed }
}

function checkListed(stored: object, content: SubmissionContent): NonNullable<SubmissionCheck['listed']> {
  const difference = firstDifference(canonicalize(stored) ?? '', canonicalize(summaryOf(content)) ?? '')
  return { equal: difference === null, difference }
}

const strangers = (
  clauses: readonly JudgedClause[],
  evaluations: readonly CheckedEvaluation[],
): ClauseCheck[] =>
  evaluations
    .filter((each) => !clauses.some((clause) => clause.clauseKey === each.clauseKey))
    .map(({ clauseKey, engineVersion, engineSha256, outputSha256 }) => ({
      clauseKey,
      engineVersion,
      engineSha256,
      outputSha256,
      equal: false,
      problem: 'not-in-text',
      difference: null,
      recomputedSha256: null,
    }))
