export { addDays } from '../contract/days'

/** The calendar day, such as `2026-11-02`, on which an instant falls in a time zone (IANA name). */
export function dayIn(timeZone: string, instant: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).formatToParts(new Date(instant))
  const read = (type: Intl.DateTimeFormatPartTypes) => parts.find((part) => part.type === type)?.value ?? ''
  return `${read('year')}-${read('month')}-${read('day')}`
}

/** Calendar days from one day to a later one (negative where it is an earlier one). */
export const daysBetween = (from: string, to: string): number =>
  Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000)

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']

/** A calendar day in words for messages, such as 2 Nov 2026. */
export const dayInWords = (day: string): string =>
  `${Number(day.slice(8, 10))} ${months[Number(day.slice(5, 7)) - 1] ?? ''} ${day.slice(0, 4)}`
