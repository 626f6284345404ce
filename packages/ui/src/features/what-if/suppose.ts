import {
  canonicalText,
  evaluate,
  isError,
  whatIfInput,
  type ClauseInput,
  type ClauseOutput,
} from '@evenrule/metrology'
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
  const clause = changes.clauses.get(clauseKey)
  const { tolerance } = changes
  const mine = input.data && study === changes.study
  const leftOut = mine ? changes.leftOut : []
  const referenceValue = mine ? changes.reference : null
  if (!clause && !tolerance && leftOut.length === 0 && referenceValue === null) return input
  return whatIfInput(input, {
    leftOut,
    ...(referenceValue !== null && { referenceValue }),
    ...(tolerance && { tolerance }),
    ...(clause && { clause }),
  })
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
