import type { Clause, ClauseInput, ClauseOutput } from '@evenrule/metrology'
import type { CriteriaScope } from '../../strings/results'

/** The agreement a clause was taken from. */
export interface ResultSource {
  agreementNumber: number
  versionNumber: number
  scope: CriteriaScope
}

/** One computed clause, as server and browser compute it, with where the clause was agreed. */
export interface ClauseResult {
  clauseKey: string
  clause: Clause
  input: ClauseInput
  output: ClauseOutput
  source: ResultSource | null
}

/** A stored evaluation, whose canonical texts are the original, made ready to be shown. */
export function resultOf(
  evaluation: { clauseKey: string; inputText: string; outputText: string },
  source: ResultSource | null,
): ClauseResult {
  const input = JSON.parse(evaluation.inputText) as ClauseInput
  const output = JSON.parse(evaluation.outputText) as ClauseOutput
  return { clauseKey: evaluation.clauseKey, clause: input.clause, input, output, source }
}
