import type { Clause, ReadingsNeeded } from './clauses'
import type { Characteristic, StudyKind } from './facts'
import type { Truth } from './rules'

/** One column of a study's data; `reading` columns hold what the gauge showed. */
export interface StudyColumn {
  name: string
  role: 'reading'
  kind: 'number'
  required: boolean
}

/** One figure of a study's result: where it stands in the output and what it is. */
export interface StudyFigure {
  name: string
  path: readonly string[]
  quantity: 'value' | 'share' | 'count' | 'ratio'
}

/** Readings needed for all clauses together and for each. */
export interface StudyPlan {
  /** Least readings for every clause at the wanted chance; null where a clause has none. */
  readings: number | null
  byClause: ({ clauseKey: string } & ReadingsNeeded)[]
}

/** Everything forms, uploads, plans and result pages need to know of one kind of study. */
export interface StudyKindDescriptor<K extends StudyKind = StudyKind> {
  kind: K
  columns: readonly StudyColumn[]
  figures: readonly StudyFigure[]
  /** Fewest and most readings one study may hold. */
  fewestReadings: number
  mostReadings: number
  plan(clauses: readonly Clause[], characteristic: Characteristic, truth: Truth, power: number): StudyPlan
}
