import type { Separator } from '../../../contract/tables'
import { asWritten } from '../numbers'
import type { SeparatorNote } from '../table'

export interface Separated {
  separator: Separator
  note: SeparatorNote | null
}

const note = (code: SeparatorNote['code'], message: string): SeparatorNote => ({ code, message })

const asDecimal = note(
  'comma-read-as-decimal',
  'Each line holds one comma, which was read as the decimal mark of one number. If it separates two columns, choose comma as the separator.',
)
const asSeparator = note(
  'comma-read-as-separator',
  'The comma was read as the separator between columns. If it marks decimals, choose “none” as the separator.',
)
const outsideQuotes = (line: string): string => line.replace(/"[^"]*"/g, '""')
/** One number with a decimal comma, and perhaps a unit after it. */
const oneDecimal = /^\s*[+\-\u2212\u2013]?\d*,\d+(e[+-]?\d{1,3})?[^\d,]*$/i
const first = (line: string): string => line.split(',')[0] ?? ''

/** The separator of a text: the one that stands in most lines. Commas may mark decimals instead. */
export function detectSeparator(text: string): Separated {
  const lines = text
    .split('\n', 400)
    .filter((line) => line.trim() !== '')
    .slice(0, 200)
  const inMost = (character: string): boolean =>
    lines.filter((line) => outsideQuotes(line).includes(character)).length * 2 >= lines.length
  const plain = (separator: Separator): Separated => ({ separator, note: null })
  if (inMost('\t')) return plain('tab')
  if (inMost(';')) return plain('semicolon')
  return inMost(',') ? ofCommas(lines) : plain('none')
}

/** A comma in most lines: separator, or decimal mark of the only number in the line? */
function ofCommas(lines: readonly string[]): Separated {
  const data = lines.filter((line) => oneDecimal.test(line) || asWritten(first(line)) !== undefined)
  const alone = data.filter((line) => oneDecimal.test(line) || asWritten(line) !== undefined)
  // A decimal point beside the comma proves that the comma separates; one bad cell proves nothing.
  const pointed = data.some((line) => line.split(',').some((piece) => asWritten(piece)?.mark === 'point'))
  if (pointed || alone.length * 2 < data.length || data.length === 0)
    return { separator: 'comma', note: null }
  const above = lines.slice(0, lines.indexOf(data[0] ?? ''))
  const columnsNamed = above.some((line) => line.split(',').filter((name) => name.trim() !== '').length === 2)
  if (columnsNamed || counts(data.map(first))) return { separator: 'comma', note: asSeparator }
  return { separator: 'none', note: asDecimal }
}

/** Whether the texts count 1, 2, 3, … as a column of numbers of readings does. */
export const counts = (texts: readonly string[], fewest = 3): boolean =>
  texts.length >= fewest && texts.every((text, at) => text.trim() === String(at + 1))
