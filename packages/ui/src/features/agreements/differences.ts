import {
  clauseDescriptor,
  clauseKey,
  type Clause,
  type ClauseType,
  type FieldDescriptor,
  type Subject,
} from '@evenrule/metrology'
import { subjectOf } from '../../strings/clauses'

export type ClauseChange = 'same' | 'changed' | 'added' | 'removed'

export interface ParameterChange {
  field: FieldDescriptor
  before: unknown
  after: unknown
}

/** One row of two sets of clauses side by side. */
export interface ClauseDifference {
  key: string
  subject: Subject
  before: Clause | null
  after: Clause | null
  change: ClauseChange
  /** What differs between two clauses of one type, in the order of the form. */
  parameters: ParameterChange[]
}

/** The decisive subject first; within a subject the order of the catalogue. */
const subjectOrder: readonly Subject[] = ['bias', 'resolution', 'calibration', 'design']

/** Clauses in the order in which the room names subjects. */
export const bySubject = <C extends { type: ClauseType }>(clauses: readonly C[]): C[] =>
  [...clauses].sort(
    (a, b) => subjectOrder.indexOf(subjectOf[a.type]) - subjectOrder.indexOf(subjectOf[b.type]),
  )

const typeOf = ({ before, after }: Pick<ClauseDifference, 'before' | 'after'>): ClauseType =>
  (after ?? before)!.type

const equal = (a: unknown, b: unknown): boolean => canonical(a) === canonical(b)

/** JSON with the keys of objects in order, so that two spellings of one margin are the same. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, each: unknown) =>
    typeof each === 'object' && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).sort(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  )
}

/** The parameters in which two clauses of one type differ; none for clauses of different types. */
export function parameterChanges(before: Clause, after: Clause): ParameterChange[] {
  if (before.type !== after.type) return []
  const [old, now] = [before.parameters, after.parameters] as unknown as Record<string, unknown>[]
  return clauseDescriptor(after).fields.flatMap((field) => {
    const values = { before: old?.[field.name], after: now?.[field.name] }
    return equal(values.before, values.after) ? [] : [{ field, ...values }]
  })
}

function changeOf(before: Clause | null, after: Clause | null): ClauseChange {
  if (!before) return 'added'
  if (!after) return 'removed'
  return before.type === after.type && parameterChanges(before, after).length === 0 ? 'same' : 'changed'
}

/**
 * Two sets of clauses row by row, matched by what they are about: the zero-difference test of one stands beside the
 * equivalence of the other.
 */
export function compareClauses(before: readonly Clause[], after: readonly Clause[]): ClauseDifference[] {
  const rows = new Map<string, { before: Clause | null; after: Clause | null }>()
  for (const clause of before) rows.set(clauseKey(clause), { before: clause, after: null })
  for (const clause of after) {
    const key = clauseKey(clause)
    rows.set(key, { before: rows.get(key)?.before ?? null, after: clause })
  }
  const place = (row: ClauseDifference) => subjectOrder.indexOf(row.subject)
  return [...rows]
    .map(([key, pair]) => ({
      key,
      subject: subjectOf[typeOf(pair)],
      ...pair,
      change: changeOf(pair.before, pair.after),
      parameters: pair.before && pair.after ? parameterChanges(pair.before, pair.after) : [],
    }))
    .sort((a, b) => place(a) - place(b) || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0))
}

/** How many rows of a comparison changed in which way. */
export const countChanges = (rows: readonly ClauseDifference[]): Record<ClauseChange, number> =>
  rows.reduce((counts, { change }) => ({ ...counts, [change]: counts[change] + 1 }), {
    same: 0,
    changed: 0,
    added: 0,
    removed: 0,
  })
