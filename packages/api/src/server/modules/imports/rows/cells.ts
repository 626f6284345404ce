import { findUnit } from '@evenrule/metrology'
import type { z } from 'zod'
import { readCell } from '../../../tables/numbers'
import type { Writing } from './context'
import { readDay } from './days'
import type { FieldRow, RowProblem } from './fields'
import { normalised } from './mapping'
import { unitOf } from './units'
import { cut } from './words'

const yes = new Set([
  'yes',
  'y',
  'true',
  '1',
  'ja',
  'j',
  'oui',
  'si',
  'pass',
  'passed',
  'ok',
  'io',
  'i o',
  'within',
  'conform',
  'conforme',
  'bestanden',
])
const no = new Set([
  'no',
  'n',
  'false',
  '0',
  'nein',
  'non',
  'fail',
  'failed',
  'nok',
  'nio',
  'n i o',
  'outside',
  'not ok',
  'not conform',
  'non conforme',
  'nicht bestanden',
])

/** The cells of one row, read by the type that each is wanted as; collects what is wrong with them. */
export class RowCells {
  readonly problems: RowProblem[]

  constructor(
    private readonly source: FieldRow,
    private readonly writing: Writing,
  ) {
    this.problems = source.faults.map((fault) => ({ row: source.row, ...fault }))
  }

  get row(): number {
    return this.source.row
  }

  /** The text of a cell; null where it is empty or the file has no such column. */
  text(field: string): string | null {
    return this.source.cells[field]?.trim() || null
  }

  refuse(field: string | null, message: string): null {
    this.problems.push({ row: this.row, field, message })
    return null
  }

  /** Decimal text with a point, with every digit as entered. */
  decimal(field: string): string | null {
    const text = this.text(field)
    if (text === null) return null
    const read = readCell(text, this.writing.decimal)
    if (!('value' in read))
      return this.refuse(field, read.code === 'not-a-number' ? noNumber(text) : read.message)
    return text.replace(/^[\u2212\u2013]/, '-').replace(',', '.')
  }

  whole(field: string): number | null {
    const text = this.text(field)
    if (text === null) return null
    // Spreadsheets give whole numbers decimals: 5 and 5.0 are the same number on a drawing.
    if (/^\d{1,9}([.,]0+)?$/.test(text)) return Math.trunc(Number(text.replace(',', '.')))
    return this.refuse(field, `“${cut(text)}” is no whole number. Enter it without decimals or letters.`)
  }

  /** A unit of the list, however it is spelt. */
  unit(field: string): string | null {
    const text = this.text(field)
    if (text === null || findUnit(unitOf(text))) return text && unitOf(text)
    return this.refuse(
      field,
      `“${cut(text)}” is no unit of the list. Write one of it, such as mm, µm, °, N·m or bar.`,
    )
  }

  day(field: string): string | null {
    const text = this.text(field)
    if (text === null) return null
    const read = readDay(text, this.writing.days[field] ?? 'unknown')
    return 'value' in read ? read.value : this.refuse(field, read.message)
  }

  yesNo(field: string): boolean | null {
    const text = this.text(field)
    if (text === null) return null
    const word = normalised(text)
    if (yes.has(word)) return true
    if (no.has(word)) return false
    return this.refuse(field, `“${cut(text)}” is neither yes nor no. Write yes or no.`)
  }

  /** One of several choices by its word or another name of it. */
  choice<T extends string>(field: string, names: Readonly<Record<T, readonly string[]>>): T | null {
    const text = this.text(field)
    if (text === null) return null
    const word = normalised(text)
    const choices = Object.keys(names) as T[]
    const found = choices.find((each) => normalised(each) === word || names[each].includes(word))
    return found ?? this.refuse(field, `“${cut(text)}” is not known here. Write ${choices.join(' or ')}.`)
  }

  /** The readings of the row with their texts: empty cells after the last one say nothing. */
  decimals(field: string): { text: string; value: number }[] {
    const { several } = this.source
    const last = several.findLastIndex((text) => text !== '')
    return several.slice(0, last + 1).flatMap((text, at) => {
      const read = readCell(text, this.writing.decimal)
      if ('value' in read) return [{ text, value: read.value }]
      this.refuse(`${field}.${at}`, text === '' ? emptyBetween : read.message)
      return []
    })
  }

  /** Checks what was read with the schema of the single act; its paths are fields of the file by `named`. */
  check<S extends z.ZodType>(
    schema: S,
    value: unknown,
    named: Readonly<Record<string, string>> = {},
  ): z.output<S> | null {
    const result = schema.safeParse(value)
    if (result.success) return result.data
    for (const { path, message } of result.error.issues) {
      const field = String(path[0] ?? '')
      // What was unreadable before is told once.
      if (!this.problems.some((each) => each.field === (named[field] ?? field)))
        this.refuse(named[field] ?? field, message)
    }
    return null
  }
}

const noNumber = (text: string): string =>
  `“${cut(text)}” is no number. Enter the number alone, such as 24.025.`

const emptyBetween =
  'There is no reading here, but later ones follow in this row. Enter it, or move the later ones up.'
