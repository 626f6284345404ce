import type { whatIf } from '@evenrule/api/contract'
import { longestQuote, whatIfQuoteSchema, whatIfText } from '@evenrule/api/contract/what-if'
import { canonicalText, type ClauseInput, type ClauseOutput } from '@evenrule/metrology'
import type { WhatIfBase, WhatIfResult } from './base'
import type { WhatIfChanges } from './changes'
import { supposedInput } from './suppose'

export type WhatIfQuote = whatIf.WhatIfQuote
type Outcome = whatIf.WhatIfOutcome
/** Runs an input on the engine with a hash; the answer is canonical text. */
export type RunOn = (inputText: string, engineSha256: string) => Promise<string>

/** Why a what-if cannot be quoted. */
export class QuoteProblem extends Error {
  constructor(readonly reason: 'not-computed' | 'too-long') {
    super(reason)
  }
}

/** What is quoted of an output of the computation. */
export const outcomeOf = ({ clause }: ClauseInput, output: ClauseOutput): Outcome => ({
  clause,
  verdict: output.verdict,
  figure: output.figure,
  interval: output.interval,
  limits: output.limits,
  quantity: output.quantity,
  reason: output.reason,
  readings: output.study?.n ?? null,
  bias: output.study?.bias ?? null,
  standardDeviation: output.study?.standardDeviation ?? null,
})

/** Computes one clause on the engine of the submission, before the change and after it. */
async function outcomes(base: WhatIfBase, result: WhatIfResult, changes: WhatIfChanges, run: RunOn) {
  const on = async (input: ClauseInput): Promise<Outcome> => {
    const text = await run(canonicalText(input), base.engine?.sha256 ?? '')
    const output = JSON.parse(text) as ClauseOutput | { error: unknown }
    if ('error' in output) throw new QuoteProblem('not-computed')
    return outcomeOf(input, output)
  }
  const input = supposedInput(result, changes)
  return {
    clauseKey: result.clauseKey,
    before: await on(result.input),
    after: await on(input),
    touched: input !== result.input,
  }
}

const ends = (limits: { lower?: number; upper?: number } = {}) => ({
  lower: limits.lower ?? null,
  upper: limits.upper ?? null,
})

/** What is changed, with what it was before. */
export function changedOf(base: WhatIfBase, changes: WhatIfChanges): WhatIfQuote['changed'] {
  const from = base.results.find(({ study, input }) => study === changes.study && input.data)?.input
  return {
    leftOut: [...changes.leftOut],
    referenceValue:
      changes.reference === null || !from?.data
        ? null
        : { before: from.data.reference.value, after: changes.reference },
    tolerance:
      changes.tolerance === null
        ? null
        : { before: ends(base.results[0]?.input.tolerance), after: ends(changes.tolerance) },
    clauses: base.results.flatMap(({ clauseKey, clause }) => {
      const after = changes.clauses.get(clauseKey)
      return after ? [{ clauseKey, before: clause, after }] : []
    }),
  }
}

/**
 * A what-if made ready to be quoted in a challenge: both sides of the comparison computed on the very engine that the
 * submission names, so that nothing but the change makes the difference. Clauses that come out the same are left
 * out, unless all do.
 */
export async function quoteOf(
  base: WhatIfBase,
  changes: WhatIfChanges,
  run: RunOn,
): Promise<{ quote: WhatIfQuote; text: string }> {
  const study = base.studies.find(({ code }) => code === changes.study) ?? base.studies[0]
  if (!base.submissionSha256 || !base.engine || !study) throw new QuoteProblem('not-computed')
  const all = await Promise.all(base.results.map((result) => outcomes(base, result, changes, run)))
  const touched = all.filter((each) => each.touched)
  const different = touched.filter(({ before, after }) => canonicalText(before) !== canonicalText(after))
  const quote: WhatIfQuote = {
    format: 'evenrule.what-if/1',
    submissionSha256: base.submissionSha256,
    study: study.code,
    dataSha256: study.dataSha256,
    unit: base.results[0]?.input.unit ?? '',
    changed: changedOf(base, changes),
    results: (different.length ? different : touched).map(({ clauseKey, before, after }) => ({
      clauseKey,
      before,
      after,
    })),
    engineVersion: base.engine.version,
    engineSha256: base.engine.sha256,
  }
  const text = whatIfText(quote)
  if (text.length > longestQuote || quote.changed.leftOut.length > 1000) throw new QuoteProblem('too-long')
  if (!whatIfQuoteSchema.safeParse(quote).success) throw new QuoteProblem('not-computed')
  return { quote, text }
}

/** The clause a quote is most about: the one exchanged, else the first that would come out differently. */
export function clauseOf(quote: WhatIfQuote): string | null {
  const [exchanged] = quote.changed.clauses
  const different = quote.results.find(({ before, after }) => before.verdict !== after.verdict)
  return exchanged?.clauseKey ?? different?.clauseKey ?? quote.results[0]?.clauseKey ?? null
}
