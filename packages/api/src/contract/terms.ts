import { z } from 'zod'

/** Said of the validity: an acceptance does not expire. */
export const noExpiry = 'no-expiry'

const stopsOrStays = z.enum(['suspended', 'stays']).nullable()

/**
 * What an agreement says beside its clauses: how long an acceptance holds, what stops it, and who may sign. A field
 * that is null is not said there; the wider scope's counts then, and where none says it, the default.
 */
export const termsSchema = z.object({
  /** Months for which an acceptance holds; `no-expiry` says against a wider scope that it has no time limit. */
  validityMonths: z
    .union(
      [
        z.literal(noExpiry),
        z
          .number()
          .int('Enter whole months.')
          .min(1, 'Enter 1 month or more.')
          .max(120, 'Enter 120 months or fewer.'),
      ],
      `Enter whole months from 1 to 120, or "${noExpiry}".`,
    )
    .nullable(),
  /** What becomes of an acceptance while the calibration of gauge or standard is overdue. */
  calibrationOverdue: z.enum(['on-hold', 'stays']).nullable(),
  /** What becomes of it when the gauge is found out of limits, repaired, moved, or its software or fixture changed. */
  outOfLimits: stopsOrStays,
  repaired: stopsOrStays,
  moved: stopsOrStays,
  changed: stopsOrStays,
  /** Whether who took the readings may sign the submission too. */
  readingsTakerMaySign: z.boolean().nullable(),
})
export type Terms = z.output<typeof termsSchema>
export type TermField = keyof Terms
export type TermValue = Terms[TermField]

/** In the order of forms and of differences. */
export const termFields = Object.keys(termsSchema.shape) as readonly TermField[]

/** Terms that say nothing. */
export const noTerms: Terms = {
  validityMonths: null,
  calibrationOverdue: null,
  outOfLimits: null,
  repaired: null,
  moved: null,
  changed: null,
  readingsTakerMaySign: null,
}

/** Terms with nothing left open; `validityMonths` null: the acceptance does not expire. */
export const resolvedTermsSchema = z.object({
  validityMonths: z.number().int().nullable(),
  calibrationOverdue: z.enum(['on-hold', 'stays']),
  outOfLimits: z.enum(['suspended', 'stays']),
  repaired: z.enum(['suspended', 'stays']),
  moved: z.enum(['suspended', 'stays']),
  changed: z.enum(['suspended', 'stays']),
  readingsTakerMaySign: z.boolean(),
})
export type ResolvedTerms = z.output<typeof resolvedTermsSchema>

/** Terms as sent: what is left out is not said. */
export const enteredTerms = termsSchema
  .partial()
  .default({})
  .transform((terms): Terms => ({ ...noTerms, ...terms }))

/** What counts where no agreement says anything. */
export const defaultTerms: ResolvedTerms = {
  validityMonths: null,
  calibrationOverdue: 'on-hold',
  outOfLimits: 'suspended',
  repaired: 'suspended',
  moved: 'stays',
  changed: 'suspended',
  readingsTakerMaySign: false,
}

export const saysNothing = (terms: Terms): boolean => termFields.every((field) => terms[field] === null)

/** Some terms with where they come from. */
export interface TermLayer<Source> {
  terms: Terms
  source: Source
}

export interface ResolvedTerm<Source> {
  field: TermField
  value: ResolvedTerms[TermField]
  /** Null where the default counts. */
  source: Source | null
}

/** The terms that count, field by field: the first layer that says something, the narrowest scope's first. */
export function resolveTerms<Source>(layers: readonly TermLayer<Source>[]): {
  values: ResolvedTerms
  from: ResolvedTerm<Source>[]
} {
  const from = termFields.map((field): ResolvedTerm<Source> => {
    const said = layers.find(({ terms }) => terms[field] !== null)
    const value = said?.terms[field]
    return said && value != null
      ? { field, value: value === noExpiry ? null : value, source: said.source }
      : { field, value: defaultTerms[field], source: null }
  })
  const values = Object.fromEntries(from.map(({ field, value }) => [field, value]))
  return { values: resolvedTermsSchema.parse(values), from }
}
