import { findUnit } from '@evenrule/metrology'
import type { CellProblem } from '../../contract/readings'
import type { DecimalMark } from '../../contract/tables'

/** A cell as a number with the decimal mark it was written with; null for the mark of a whole number. */
export interface Written {
  /** With a point, as `Number` reads it. */
  digits: string
  mark: DecimalMark | null
}

const number = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d{1,3})?$/i
const thousands = /^[+-]?\d{1,3}([.,'’ \u00a0\u2009\u202f]\d{3})+([.,]\d+)?$/
const numberFirst = /^([+-]?(?:\d+(?:[.,]\d+)?|[.,]\d+))(\s*)(\D+)$/
const longest = 40

/** True minus signs and dashes that stand for one. */
const plain = (cell: string): string => cell.trim().replace(/^[\u2212\u2013]/, '-')

/** Reads a cell as a number whatever its decimal mark; undefined where it is none. */
export function asWritten(cell: string): Written | undefined {
  let text = cell
  if (!number.test(text)) {
    text = plain(cell)
    if (text === cell || !number.test(text)) return undefined
  }
  const mark = text.includes(',') ? 'comma' : text.includes('.') ? 'point' : null
  return { digits: text.replace(',', '.'), mark }
}

const dayOrTime = /^\d{1,4}([-./])\d{1,2}\1\d{1,4}\b|^\d{1,2}:\d{2}/

/** Begins with digits and is mostly digits: meant as a number, even where it is none. Days and times are not. */
export function meantAsNumber(cell: string): boolean {
  const text = plain(cell)
  if (dayOrTime.test(text)) return false
  if (!/^[+-]?[.,]?\d/.test(text)) return false
  return (text.match(/\d/g)?.length ?? 0) * 2 >= text.length
}

interface Wrong {
  code: CellProblem
  message: string
}
export type ReadCell = { value: number } | Wrong

const withMark = (digits: string, decimal: DecimalMark): string =>
  decimal === 'comma' ? digits.replace('.', ',') : digits

/** Reads one cell under the decimal mark of the whole text, or says what is wrong with it and how to mend it. */
export function readCell(cell: string, decimal: DecimalMark): ReadCell {
  const text = cell.trim()
  if (text === '')
    return { code: 'empty', message: 'There is no reading here. Enter it, or leave the row out.' }
  if (text.length > longest)
    return {
      code: 'too-long',
      message: `This cell holds more than ${longest} characters. Enter the number alone.`,
    }
  const written = asWritten(text)
  if (!written) return whatElse(text, decimal)
  if (written.mark !== null && written.mark !== decimal) return otherMark(text, written, decimal)
  const value = Number(written.digits)
  if (Number.isFinite(value)) return { value: value === 0 ? 0 : value }
  return { code: 'too-large', message: `“${text}” is too large to be computed with. Check the exponent.` }
}

function otherMark(text: string, { digits }: Written, decimal: DecimalMark): Wrong {
  const [has, others] = decimal === 'comma' ? ['point', 'comma'] : ['comma', 'point']
  return {
    code: 'other-decimal-mark',
    message: `“${text}” has a ${has}, but decimals are marked by a ${others} here. Write ${withMark(digits, decimal)}.`,
  }
}

function whatElse(text: string, decimal: DecimalMark): Wrong {
  const bare = plain(text)
  if (thousands.test(bare))
    return {
      code: 'thousands-separator',
      message: `“${text}” has a separator between thousands. Write ${withoutThousands(bare, decimal)}.`,
    }
  const [, begin, space = '', unit = ''] = numberFirst.exec(bare) ?? []
  if (begin && (space !== '' || findUnit(unit)))
    return {
      code: 'unit-in-cell',
      message: `“${text}” holds more than a number. Write ${begin} alone; the unit is the study’s.`,
    }
  return {
    code: 'not-a-number',
    message: `“${text}” is no number. Enter the reading, such as ${withMark('24.025', decimal)}, or leave the row out.`,
  }
}

/** The number without its separators; the last one marks decimals where it stands there alone of its kind. */
function withoutThousands(bare: string, decimal: DecimalMark): string {
  const separators = bare.replace(/[\d+-]/g, '')
  const last = separators.at(-1) ?? ''
  const digitsOf = (text: string) => text.replace(/[^\d+-]/g, '')
  if (!/[.,]/.test(last) || separators.indexOf(last) < separators.length - 1) return digitsOf(bare)
  const at = bare.lastIndexOf(last)
  return withMark(`${digitsOf(bare.slice(0, at))}.${bare.slice(at + 1)}`, decimal)
}
