/** In which order the numbers of a day stand where its form alone does not tell: 03/04/2026. */
import { cut } from './words'
export type DayOrder = 'day-first' | 'month-first' | 'unknown'

const iso = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})(?:[T ]00:00(?::00(?:\.0+)?)?Z?)?$/
const dotted = /^(\d{1,2})\.\s?(\d{1,2})\.\s?(\d{4})$/
const slashed = /^(\d{1,2})[/-](\d{1,2})[/-](\d{4})$/
const inWords = /^(\d{1,2})[. ]+(\p{L}+)[. ]+(\d{4})$/u

/** Beginnings of the months' names in English, German, French, Spanish and Italian, without accents. */
const months = [
  'jan|ene|gen',
  'feb|fev',
  'mar',
  'apr|avr|abr',
  'may|mai|mag',
  'jun|juin|giu',
  'jul|juil|lug',
  'aug|aou|ago',
  'sep|set',
  'oct|okt|ott',
  'nov',
  'dec|dez|dic',
].map((names) => new RegExp(`^(${names})`))

const example = 'Write the day as 2026-10-14.'

/** The order that the days of a column show between them: one number above 12 settles it for all. */
export function orderOfDays(cells: readonly string[]): DayOrder {
  let order: DayOrder = 'unknown'
  for (const cell of cells) {
    const [, first, second] = slashed.exec(cell.trim()) ?? []
    if (Number(first) > 12) order = 'day-first'
    else if (Number(second) > 12 && order === 'unknown') order = 'month-first'
  }
  return order
}

/** A cell as a calendar day, or what is wrong with it and how to mend it. */
export function readDay(cell: string, order: DayOrder): { value: string } | { message: string } {
  const text = cell.trim()
  const [, year, month, day] = iso.exec(text) ?? []
  if (year) return dayOf(text, year, month, day)
  const [, dayOfDots, monthOfDots, yearOfDots] = dotted.exec(text) ?? []
  if (yearOfDots) return dayOf(text, yearOfDots, monthOfDots, dayOfDots)
  const [, dayOfWords, name = '', yearOfWords] = inWords.exec(text) ?? []
  if (yearOfWords) {
    const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase()
    const at = months.findIndex((month) => month.test(plain))
    return at < 0
      ? { message: `“${text}” names no month. ${example}` }
      : dayOf(text, yearOfWords, `${at + 1}`, dayOfWords)
  }
  const [, first, second, yearOfSlashes] = slashed.exec(text) ?? []
  if (yearOfSlashes) {
    const same = first === second
    if (order === 'unknown' && !same)
      return {
        message: `“${text}” can mean two days, and no other day in this column settles which. ${example}`,
      }
    return order === 'month-first'
      ? dayOf(text, yearOfSlashes, first, second)
      : dayOf(text, yearOfSlashes, second, first)
  }
  return { message: `“${cut(text, 40)}” is no day with a year of four digits. ${example}` }
}

function dayOf(text: string, year = '', month = '', day = ''): { value: string } | { message: string } {
  const value = `${year}-${month.padStart(2, '0')}-${day.padStart(2, '0')}`
  const date = new Date(`${value}T00:00:00Z`)
  const exists = !Number.isNaN(date.getTime()) && date.toISOString().slice(0, 10) === value
  return exists ? { value } : { message: `There is no day “${text}” in the calendar. ${example}` }
}
