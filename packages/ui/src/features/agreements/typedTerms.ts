import { noExpiry, noTerms, termFields, type TermField, type Terms } from '@evenrule/api/contract'
import { parseNumber } from '../../format'
import { termWords as words } from '../../strings/terms'

/** Terms as typed: the text of each field, empty where nothing is said. */
export type TypedTerms = Record<TermField, string>

export const typedTerms = (terms: Terms = noTerms): TypedTerms =>
  Object.fromEntries(
    termFields.map((field) => [field, terms[field] === null ? '' : String(terms[field])]),
  ) as TypedTerms

const isMonths = (value: number | null): value is number =>
  value !== null && Number.isInteger(value) && value >= 1 && value <= 120

/** What the typed terms say, and what is wrong with them by path in the form. */
export function readTerms(typed: TypedTerms): { terms: Terms; problems: Record<string, string> } {
  const text = typed.validityMonths.trim()
  const endless = text === noExpiry
  const months = text && !endless ? (parseNumber(text).value ?? null) : null
  const choice = <V extends string>(value: string) => (value === '' ? null : (value as V))
  return {
    terms: {
      validityMonths: endless ? noExpiry : isMonths(months) ? months : null,
      calibrationOverdue: choice(typed.calibrationOverdue),
      outOfLimits: choice(typed.outOfLimits),
      repaired: choice(typed.repaired),
      moved: choice(typed.moved),
      changed: choice(typed.changed),
      readingsTakerMaySign: typed.readingsTakerMaySign === '' ? null : typed.readingsTakerMaySign === 'true',
    },
    problems: text && !endless && !isMonths(months) ? { 'terms.validityMonths': words.monthsProblem } : {},
  }
}
