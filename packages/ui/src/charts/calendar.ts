import { formatDate } from '../format'

const dayLength = 86_400_000
/** Months between two labelled ticks, finest first. */
const monthSteps = [1, 2, 3, 6, 12, 24, 60, 120]

/** Number of the day a date falls on, counted from 1 Jan 1970; reads the first ten characters of ISO 8601 text. */
export const dayNumber = (iso: string): number => Date.parse(`${iso.slice(0, 10)}T00:00:00Z`) / dayLength

/** The date of a day number, as ISO 8601. */
export const dayIso = (day: number): string =>
  new Date(Math.round(day) * dayLength).toISOString().slice(0, 10)

export interface CalendarTick {
  day: number
  label?: string
}

/**
 * Firsts of months from `from` to `to` (day numbers), of which at most `most` carry a label such as "Mar 2026".
 * Labelled months fall on the year's grid: every second, third, sixth or twelfth month from January.
 */
export function calendarTicks(from: number, to: number, most: number): CalendarTick[] {
  const start = new Date(from * dayLength)
  const first = start.getUTCFullYear() * 12 + start.getUTCMonth() + (start.getUTCDate() > 1 ? 1 : 0)
  const months: { month: number; day: number }[] = []
  for (let month = first; ; month += 1) {
    const day = Date.UTC(Math.floor(month / 12), month % 12, 1) / dayLength
    if (day > to) break
    months.push({ month, day })
  }
  const step =
    monthSteps.find((size) => months.filter(({ month }) => month % size === 0).length <= most) ?? 240
  return months
    .filter(({ month }) => step <= 12 || month % 12 === 0)
    .map(({ month, day }) =>
      month % step === 0 ? { day, label: formatDate(dayIso(day)).replace(/^1 /, '') } : { day },
    )
}
