import { canonicalText, evaluate, isError, type ClauseInput, type ClauseOutput } from '@evenrule/metrology'
import type { ClauseResult } from '../results'
import type { WhatIfBase, WhatIfResult } from './base'
import type { WhatIfChanges } from './changes'

/** One clause before and after the change; `after` is null where nothing about it is different. */
export interface Supposed {
  before: WhatIfResult
  after: ClauseResult | null
  /** What kept it from being computed. */
  failure: string | null
}

/** The input of one clause with the changes that touch it; the input itself where none does. */
export function supposedInput(
  { study, clauseKey, input }: WhatIfResult,
  changes: WhatIfChanges,
): ClauseInput {
  const clause = changes.clauses.get(clauseKey) ?? input.clause
  const { data } = input
  const mine = data && study === changes.study
  const left = new Set(changes.leftOut)
  const changedData =
    mine && (left.size > 0 || changes.reference !== null)
      ? {
          ...data,
          readings: data.readings.filter((_, at) => !left.has(at)),
          reference:
            changes.reference === null ? data.reference : { ...data.reference, value: changes.reference },
        }
      : data
  if (clause === input.clause && changedData === data && changes.tolerance === null) return input
  return {
    ...input,
    clause,
    ...(changes.tolerance && { tolerance: changes.tolerance }),
    ...(changedData && { data: changedData }),
  }
}

/** Every clause of the base as it would come out under the changes, computed here and nowhere kept. */
export function suppose(base: WhatIfBase, changes: WhatIfChanges): Supposed[] {
  return base.results.map((before) => {
    const input = supposedInput(before, changes)
    if (input === before.input) return { before, after: null, failure: null }
    const output = evaluate(input)
    if (isError(output)) return { before, after: null, failure: output.error.message }
    return {
      before,
      after: { ...before, clause: input.clause, input, output: output as ClauseOutput },
      failure: null,
    }
  })
}

const figures = ({ clause, output }: ClauseResult): string =>
  canonicalText([clause, output.verdict, output.figure, output.interval, output.limits])

/** Whether a clause comes out differently in anything a reader sees. */
export const comesOutDifferently = ({ before, after }: Supposed): boolean =>
  after !== null && figures(before) !== figures(after)
