import type { CellMark } from '../table'
import { dayText } from './dates'
import { unescaped } from './strings'

/** What a sheet says of one cell. */
export interface CellSource {
  type: string
  style: number
  value: string | undefined
  formula: boolean
}

/** What a cell's value is read with: texts and styles it names by number. */
export interface ReadWith {
  strings: readonly string[]
  dateStyles: readonly boolean[]
  from1904: boolean
}

type Kind = 'number' | 'date' | 'error' | 'none'

/** One object for all cells alike: a table of a hundred thousand numbers marks each of them. */
const marks: Record<Kind, { plain: CellMark | undefined; computed: CellMark }> = {
  number: { plain: { number: true }, computed: { number: true, formula: true } },
  date: { plain: { date: true }, computed: { date: true, formula: true } },
  error: { plain: { error: true }, computed: { error: true, formula: true } },
  none: { plain: undefined, computed: { formula: true } },
}

/** The text of a cell and what is particular about it. */
export function cellText(source: CellSource, how: ReadWith): { text: string; mark: CellMark | undefined } {
  const { text, kind } = valueOf(source, how)
  return { text, mark: source.formula ? marks[kind].computed : marks[kind].plain }
}

function valueOf({ type, style, value }: CellSource, how: ReadWith): { text: string; kind: Kind } {
  if (value === undefined || value === '') return { text: '', kind: 'none' }
  switch (type) {
    case 's':
      return { text: sharedText(value, how.strings), kind: 'none' }
    case 'inlineStr':
      return { text: value, kind: 'none' }
    case 'str':
      return { text: unescaped(value), kind: 'none' }
    case 'b':
      return { text: value === '1' ? 'TRUE' : 'FALSE', kind: 'none' }
    case 'e':
      return { text: value, kind: 'error' }
    case 'd':
      return { text: value.replace('T', ' ').replace(/[ T]00:00:00(\.0+)?Z?$/, ''), kind: 'date' }
    default:
      return numberOf(value, how.dateStyles[style] === true, how.from1904)
  }
}

/** A text that cells share; a workbook that names one it does not hold cannot be trusted with the others either. */
function sharedText(number: string, strings: readonly string[]): string {
  const text = strings[Number(number)]
  if (text === undefined) throw new RangeError(`There is no text ${number}.`)
  return text
}

function numberOf(value: string, asDay: boolean, from1904: boolean): { text: string; kind: Kind } {
  const number = /^\s*[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,4})?\s*$/i.test(value) ? Number(value) : NaN
  if (!Number.isFinite(number)) return { text: value, kind: 'none' }
  const day = asDay ? dayText(number, from1904) : undefined
  return day === undefined ? { text: String(number), kind: 'number' } : { text: day, kind: 'date' }
}
