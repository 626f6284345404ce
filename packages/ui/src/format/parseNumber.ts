/** Why a text is not a number; wording in strings (`numberProblemWords`). */
export type NumberProblem = 'empty' | 'not-a-number' | 'ambiguous' | 'too-large'

export type ParsedNumber =
  { value: number; text: string; problem: null } | { value: null; text: string; problem: NumberProblem }

/** Spaces of every width, as spreadsheets and our own output put them into numbers. */
const spaces = /[\s\u00A0\u2000-\u200A\u202F]/g
const plain = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i

/**
 * Reads a number typed with comma or point; the text stays as entered beside the value. The single comma or
 * point is the decimal sign, so "1,234" is 1.234; both in one number ("1.234,5") is refused as ambiguous rather
 * than guessed. A true minus, a plus, thin spaces between groups and an exponent are understood.
 */
export function parseNumber(text: string): ParsedNumber {
  const fail = (problem: NumberProblem): ParsedNumber => ({ value: null, text, problem })
  const bare = text.replace(spaces, '').replace(/[\u2212\u2013]/, '-')
  if (bare === '') return fail('empty')
  if (/^[+-]?[\d.,]+$/.test(bare) && (bare.match(/[.,]/g)?.length ?? 0) > 1) return fail('ambiguous')
  const decimal = bare.replace(',', '.')
  if (!plain.test(decimal)) return fail('not-a-number')
  const value = Number(decimal)
  return Number.isFinite(value) ? { value, text, problem: null } : fail('too-large')
}
