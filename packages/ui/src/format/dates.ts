import { noFigure } from './numbers'

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']
const dayLength = 86_400_000
const dayOnly = /^(\d{4})-(\d{2})-(\d{2})$/

interface Parts {
  year: number
  month: number
  day: number
  hour: number
  minute: number
}

/** The calendar in a time zone (the viewer's without one); a bare day "2026-10-14" is the same everywhere. */
function partsOf(iso: string | Date, timeZone?: string): Parts | undefined {
  const bare = typeof iso === 'string' ? dayOnly.exec(iso) : null
  const date = bare ? new Date(`${iso as string}T00:00:00Z`) : new Date(iso)
  if (Number.isNaN(date.getTime())) return undefined
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: bare ? 'UTC' : timeZone,
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    hourCycle: 'h23',
  }).formatToParts(date)
  const read = (type: Intl.DateTimeFormatPartTypes) =>
    Number(parts.find((part) => part.type === type)?.value ?? 0)
  return {
    year: read('year'),
    month: read('month'),
    day: read('day'),
    hour: read('hour'),
    minute: read('minute'),
  }
}

/** "14 Oct 2026". Days are read as they stand, moments in the time zone given or the viewer's. */
export function formatDate(iso: string | Date | null | undefined, timeZone?: string): string {
  const parts = iso ? partsOf(iso, timeZone) : undefined
  return parts ? `${parts.day} ${months[parts.month - 1]} ${parts.year}` : noFigure
}

/** "14 Oct 2026, 09:05". */
export function formatDateTime(iso: string | Date | null | undefined, timeZone?: string): string {
  const parts = iso ? partsOf(iso, timeZone) : undefined
  const two = (value: number) => String(value).padStart(2, '0')
  return parts && iso
    ? `${formatDate(iso, timeZone)}, ${two(parts.hour)}:${two(parts.minute)}`
    : formatDate(null)
}

/** Whole calendar days from one day to another, in the time zone; negative when the second is earlier. */
export function daysBetween(from: string | Date, to: string | Date, timeZone?: string): number | undefined {
  const [a, b] = [partsOf(from, timeZone), partsOf(to, timeZone)]
  if (!a || !b) return undefined
  return Math.round((Date.UTC(b.year, b.month - 1, b.day) - Date.UTC(a.year, a.month - 1, a.day)) / dayLength)
}

/** How long something has waited: "today", "1 day", "6 days". */
export function formatAge(
  iso: string | Date | null | undefined,
  { now = new Date(), timeZone }: { now?: Date; timeZone?: string } = {},
): string {
  const days = iso ? daysBetween(iso, now, timeZone) : undefined
  if (days === undefined) return noFigure
  if (days <= 0) return 'today'
  return days === 1 ? '1 day' : `${days} days`
}

/** How far a due day is: "in 12 days", "today", "3 days overdue". */
export function formatDue(
  iso: string | Date | null | undefined,
  { now = new Date(), timeZone }: { now?: Date; timeZone?: string } = {},
): string {
  const days = iso ? daysBetween(now, iso, timeZone) : undefined
  if (days === undefined) return noFigure
  if (days === 0) return 'today'
  const length = Math.abs(days) === 1 ? '1 day' : `${Math.abs(days)} days`
  return days > 0 ? `in ${length}` : `${length} overdue`
}
