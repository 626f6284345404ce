/** The calendar day a number of days later (earlier when negative); days are texts such as `2026-11-02`. */
export function addDays(day: string, days: number): string {
  const date = new Date(`${day}T00:00:00Z`)
  date.setUTCDate(date.getUTCDate() + days)
  return date.toISOString().slice(0, 10)
}

/** The same day some months later, or the last day of that month where it has no such day. */
export function addMonths(day: string, months: number): string {
  const first = new Date(`${day.slice(0, 8)}01T00:00:00Z`)
  first.setUTCMonth(first.getUTCMonth() + months)
  const last = new Date(Date.UTC(first.getUTCFullYear(), first.getUTCMonth() + 1, 0)).getUTCDate()
  first.setUTCDate(Math.min(Number(day.slice(8)), last))
  return first.toISOString().slice(0, 10)
}

/** The later of two days. */
export const laterDay = (a: string, b: string): string => (a > b ? a : b)
