import { canonicalText, parseClause, reasonCodes, type Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { hashSchema } from './frozen'
import { verdictSchema } from './submission-content'

/** Readings a quote may leave out; as many as a challenge may name. */
export const mostLeftOut = 1000
/** Longest quote, in characters of its canonical JSON. */
export const longestQuote = 20_000

/** A number of the computation, or a day. */
const figure = z.union([z.number(), z.string().max(40)])
const ends = z.object({ lower: figure.nullable(), upper: figure.nullable() })
const limits = z.object({ lower: z.number().nullable(), upper: z.number().nullable() })

/** Clauses are read by the computation itself, so that what is shown later can always be put into words. */
const clauseSchema = z.custom<Clause>((value) => {
  try {
    parseClause(value)
    return true
  } catch {
    return false
  }
}, 'This is no clause.')

/** What one clause came to, before or after the change: the figures of the computation, no more. */
export const whatIfOutcomeSchema = z.object({
  clause: clauseSchema,
  verdict: verdictSchema,
  figure: figure.nullable(),
  interval: ends.nullable(),
  limits: ends.nullable(),
  quantity: z.enum(['value', 'share', 'count', 'date', 'ratio']),
  reason: z
    .object({ code: z.enum(reasonCodes) })
    .catchall(z.union([z.number(), z.string().max(200), z.boolean(), z.null()])),
  /** Of the readings it rests on; null where it rests on none. */
  readings: z.number().int().nullable(),
  bias: z.number().nullable(),
  standardDeviation: z.number().nullable(),
})
export type WhatIfOutcome = z.output<typeof whatIfOutcomeSchema>

/**
 * A what-if as it is quoted in a challenge: what was changed and what the figures were before and after. It is an
 * argument, never a verdict: nothing is judged by it, and whoever reads it can compute it again.
 */
export const whatIfQuoteSchema = z.object({
  format: z.literal('evenrule.what-if/1'),
  /** SHA-256 of the submission's frozen text that it was tried on. */
  submissionSha256: hashSchema,
  /** Code of the study whose readings it is about, and the SHA-256 of those readings. */
  study: z.string().max(60),
  dataSha256: hashSchema,
  /** The characteristic's unit; reference value and limits are in it. */
  unit: z.string().max(20),
  changed: z.object({
    /** Zero-based places in the frozen readings, ascending. */
    leftOut: z.array(z.number().int().min(0)).max(mostLeftOut),
    referenceValue: z.object({ before: z.number(), after: z.number() }).nullable(),
    tolerance: z.object({ before: limits, after: limits }).nullable(),
    clauses: z
      .array(z.object({ clauseKey: z.string().max(200), before: clauseSchema, after: clauseSchema }))
      .max(50),
  }),
  results: z
    .array(
      z.object({
        clauseKey: z.string().max(200),
        before: whatIfOutcomeSchema,
        after: whatIfOutcomeSchema,
      }),
    )
    .min(1)
    .max(50),
  /** The engine that computed it: the one the submission's own evaluations name. */
  engineVersion: z.string().max(40),
  engineSha256: hashSchema,
})
export type WhatIfQuote = z.output<typeof whatIfQuoteSchema>

/** The canonical text of a quote, as it is sent and stored. */
export const whatIfText = (quote: WhatIfQuote): string => canonicalText(quote)

/** A stored quote; null where the text is none any more. */
export function whatIfOf(text: string): WhatIfQuote | null {
  try {
    return whatIfQuoteSchema.safeParse(JSON.parse(text)).data ?? null
  } catch {
    return null
  }
}

/** A quote in a request's body: canonical JSON text of the schema above. */
export const whatIfTextSchema = z
  .string()
  .max(longestQuote, 'This what-if is too long to be quoted; leave out fewer readings.')
  .refine((text) => {
    const quote = whatIfOf(text)
    return quote !== null && whatIfText(quote) === text
  }, 'This is no what-if made here.')
