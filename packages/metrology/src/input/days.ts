import { InvalidInput } from './invalid-input'

const lengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31]

/**
 * Checks an ISO 8601 day (2026-10-14) and returns it. Days in this form sort as text; no clock or time zone is
 * involved, which `Date` would bring in.
 */
export function asDay(value: string, path: string): string {
  const [, year, month, day] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(value)?.map(Number) ?? []
  if (year !== undefined && month !== undefined && day !== undefined) {
    const leap = (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0
    const length = month === 2 && leap ? 29 : lengths[month - 1]
    if (length !== undefined && day >= 1 && day <= length) return value
  }
  throw new InvalidInput('not-a-day', `Write a day as 2026-10-14; “${value}” is none.`, path)
}
