import {
  canonicalText,
  clauseDescriptors,
  clauseProblems,
  clauseTypes,
  type Clause,
  type ClauseInput,
  type ClauseType,
  type Tolerance,
} from '@evenrule/metrology'
import { draftOf, readDraftParameters, type ClauseDraft } from '../../clauses/clauseDraft'
import { parseNumber } from '../../format'
import { numberProblemWords } from '../../strings/problems'
import { whatIfWords as words } from '../../strings/whatIf'
import type { WhatIfBase, WhatIfResult } from './base'

/** A clause as typed in place of the agreed one. */
export interface TypedClause {
  type: ClauseType
  parameters: ClauseDraft
}

/** A what-if as typed; what equals the submitted is no change. */
export interface TypedWhatIf {
  study: string
  /** Zero-based places in the readings of the study. */
  leftOut: number[]
  reference: string
  lower: string
  upper: string
  clauses: Record<string, TypedClause>
}

/** What is changed, read; null or empty where it is as submitted. In the characteristic's unit. */
export interface WhatIfChanges {
  study: string
  leftOut: readonly number[]
  reference: number | null
  tolerance: Tolerance | null
  clauses: ReadonlyMap<string, Clause>
}

const onStudy = (base: WhatIfBase, study: string): WhatIfResult | undefined =>
  base.results.find((result) => result.study === study && result.input.data)

const numberText = (value: number | undefined): string => (value === undefined ? '' : String(value))

/** A what-if in which nothing is changed yet. */
export function unchanged(base: WhatIfBase, study = base.studies[0]?.code ?? ''): TypedWhatIf {
  const { tolerance } = base.results[0]?.input ?? {}
  return {
    study,
    leftOut: [],
    reference: numberText(onStudy(base, study)?.input.data?.reference.value),
    lower: numberText(tolerance?.lower),
    upper: numberText(tolerance?.upper),
    clauses: {},
  }
}

/** Types that may stand in for a clause: those of its subject that are judged on the same kind of study. */
export function substitutes({ type }: Clause): ClauseType[] {
  const { subject, studyKind } = clauseDescriptors[type]
  const judgesReadings = (each: ClauseType) =>
    clauseDescriptors[each].subject === subject && clauseDescriptors[each].studyKind === studyKind
  return studyKind === null ? [type] : clauseTypes.filter(judgesReadings)
}

/** A clause offered for typing: with its own parameters, or with the usual ones of another type. */
export const typedClause = (type: ClauseType, unit: string, parameters?: object): TypedClause => ({
  type,
  parameters: draftOf(clauseDescriptors[type].fields, { unit, parameters }),
})

/** The path of a field of a typed clause. */
export const clausePath = (clauseKey: string, field: string): string => `clauses.${clauseKey}.${field}`

function readClause(
  typed: TypedClause,
  input: ClauseInput,
): { clause?: Clause; problems: Record<string, string> } {
  const read = readDraftParameters(clauseDescriptors[typed.type].fields, typed.parameters)
  if (read.problems) return { problems: read.problems }
  // The fields of a type, read by their descriptors, are the parameters of that type.
  const clause = { type: typed.type, parameters: read.parameters } as unknown as Clause
  const problems = clauseProblems(clause, input).map(({ path, message }) => {
    const [, field = ''] = path.split('.')
    return [field, message] as const
  })
  return problems.length ? { problems: Object.fromEntries(problems) } : { clause, problems: {} }
}

const sameNumber = (text: string, value: number | undefined): boolean =>
  text.trim() === '' ? value === undefined : parseNumber(text).value === value

/** What a typed what-if changes, and what is wrong with it by field. A field that cannot be read changes nothing. */
export function readChanges(
  base: WhatIfBase,
  typed: TypedWhatIf,
): { changes: WhatIfChanges; problems: Record<string, string> } {
  const problems: Record<string, string> = {}
  const number = (field: 'reference' | 'lower' | 'upper', optional: boolean): number | undefined => {
    if (optional && typed[field].trim() === '') return undefined
    const { value, problem } = parseNumber(typed[field])
    if (problem) problems[field] = numberProblemWords[problem]
    return value ?? undefined
  }
  const from = onStudy(base, typed.study)?.input
  const { tolerance } = base.results[0]?.input ?? {}
  const changes = {
    study: typed.study,
    leftOut: typed.leftOut,
    reference: null as number | null,
    tolerance: null as Tolerance | null,
    clauses: new Map<string, Clause>(),
  }
  if (from?.data) {
    if (typed.leftOut.length >= from.data.readings.length) {
      problems.leftOut = words.allLeftOut
      changes.leftOut = []
    }
    if (!sameNumber(typed.reference, from.data.reference.value))
      changes.reference = number('reference', false) ?? null
  }
  if (!sameNumber(typed.lower, tolerance?.lower) || !sameNumber(typed.upper, tolerance?.upper)) {
    const [lower, upper] = [number('lower', true), number('upper', true)]
    if (lower !== undefined && upper !== undefined && lower >= upper) problems.upper = words.limitsCrossed
    if (!problems.lower && !problems.upper)
      changes.tolerance = {
        ...(lower === undefined ? {} : { lower }),
        ...(upper === undefined ? {} : { upper }),
      }
  }
  for (const result of base.results) {
    const own = typed.clauses[result.clauseKey]
    if (!own) continue
    const read = readClause(own, {
      ...result.input,
      ...(changes.tolerance && { tolerance: changes.tolerance }),
    })
    for (const [field, message] of Object.entries(read.problems))
      problems[clausePath(result.clauseKey, field)] = message
    if (read.clause && canonicalText(read.clause) !== canonicalText(result.clause))
      changes.clauses.set(result.clauseKey, read.clause)
  }
  return { changes, problems }
}

/** Whether anything differs from what was submitted. */
export const changesAnything = ({ leftOut, reference, tolerance, clauses }: WhatIfChanges): boolean =>
  leftOut.length > 0 || reference !== null || tolerance !== null || clauses.size > 0
