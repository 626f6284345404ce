import {
  canonicalText,
  clauseDescriptor,
  clauseKey,
  type Clause,
  type FieldDescriptor,
} from '@evenrule/metrology'
import type { RoundContent } from './agreements-content'
import { termFields, type TermField, type Terms, type TermValue } from './terms'

export type ContentChange = 'same' | 'changed' | 'added' | 'removed'

export interface ParameterChange {
  field: FieldDescriptor
  before: unknown
  after: unknown
}

/** One row of two sets of clauses side by side. */
export interface ClauseDifference {
  /** Subject and measure, by which the two were matched. */
  key: string
  before: Clause | null
  after: Clause | null
  change: ContentChange
  /** What differs between two clauses of one type, in the order of the form. */
  parameters: ParameterChange[]
}

export interface TermDifference {
  field: TermField
  before: TermValue
  after: TermValue
  change: ContentChange
}

/** Everything in which two proposals differ, and what is the same in both. */
export interface RoundDifferences {
  clauses: ClauseDifference[]
  terms: TermDifference[]
  effectiveOn: { before: string; after: string; change: 'same' | 'changed' }
  /** Nothing differs. */
  same: boolean
}

const equal = (a: unknown, b: unknown): boolean =>
  a === undefined || b === undefined ? a === b : canonicalText(a) === canonicalText(b)

/** The parameters in which two clauses of one type differ; none for clauses of different types. */
export function parameterChanges(before: Clause, after: Clause): ParameterChange[] {
  if (before.type !== after.type) return []
  const [old, now] = [before.parameters, after.parameters] as unknown as Record<string, unknown>[]
  return clauseDescriptor(after).fields.flatMap((field) => {
    const values = { before: old?.[field.name], after: now?.[field.name] }
    return equal(values.before, values.after) ? [] : [{ field, ...values }]
  })
}

function changeOf(before: Clause | null, after: Clause | null): ContentChange {
  if (!before) return 'added'
  if (!after) return 'removed'
  return equal(before, after) ? 'same' : 'changed'
}

/**
 * Two sets of clauses row by row, matched by what they are about: the zero-difference test of one stands beside the
 * equivalence of the other. In the order of the earlier set, then what the later one adds.
 */
export function compareClauses(before: readonly Clause[], after: readonly Clause[]): ClauseDifference[] {
  const rows = new Map<string, { before: Clause | null; after: Clause | null }>()
  for (const clause of before) rows.set(clauseKey(clause), { before: clause, after: null })
  for (const clause of after) {
    const key = clauseKey(clause)
    rows.set(key, { before: rows.get(key)?.before ?? null, after: clause })
  }
  return [...rows].map(([key, pair]) => ({
    key,
    ...pair,
    change: changeOf(pair.before, pair.after),
    parameters: pair.before && pair.after ? parameterChanges(pair.before, pair.after) : [],
  }))
}

/** Two sets of terms field by field. */
export const compareTerms = (before: Terms, after: Terms): TermDifference[] =>
  termFields.map((field) => ({
    field,
    before: before[field],
    after: after[field],
    change:
      before[field] === after[field]
        ? 'same'
        : before[field] === null
          ? 'added'
          : after[field] === null
            ? 'removed'
            : 'changed',
  }))

/** The differences between any two rounds, marked to the parameter. */
export function differences(before: RoundContent, after: RoundContent): RoundDifferences {
  const clauses = compareClauses(before.clauses, after.clauses)
  const terms = compareTerms(before.terms, after.terms)
  const dates = { before: before.effectiveOn, after: after.effectiveOn }
  const effectiveOn = { ...dates, change: dates.before === dates.after ? 'same' : 'changed' } as const
  const same = [...clauses, ...terms, effectiveOn].every(({ change }) => change === 'same')
  return { clauses, terms, effectiveOn, same }
}

/** How many rows of a comparison changed in which way. */
export function countChanges(rows: readonly { change: ContentChange }[]): Record<ContentChange, number> {
  const counts = { same: 0, changed: 0, added: 0, removed: 0 }
  for (const { change } of rows) counts[change] += 1
  return counts
}
