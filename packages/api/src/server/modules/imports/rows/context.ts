import { setImmediate as nextTurn } from 'node:timers/promises'
import type { DecimalMark } from '../../../../contract/tables'
import { asWritten } from '../../../tables/numbers'
import type { CellMark, Table } from '../../../tables/table'
import { orderOfDays, type DayOrder } from './days'
import type { Field, FieldRow } from './fields'
import type { Mapping } from './mapping'

/** How cells of the whole file are written: one row alone could be read in two ways. */
export interface Writing {
  decimal: DecimalMark
  /** By the key of each field of days. */
  days: Readonly<Record<string, DayOrder>>
}

export interface MappedRows {
  rows: FieldRow[]
  writing: Writing
}

/** Rows taken at once before others get their turn. */
const chunk = 500

/** Lets the requests of others in between, now and then, while one thing after the other is worked at. */
export async function turn(): Promise<void> {
  turns = (turns + 1) % 50
  if (turns === 0) await nextTurn()
}
let turns = 0

/** Things by a key, in their order. */
export function groupBy<T>(items: readonly T[], key: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const item of items) {
    const own = groups.get(key(item))
    if (own) own.push(item)
    else groups.set(key(item), [item])
  }
  return groups
}

/** Goes through many things and lets the requests of others in between. */
export async function inChunks<T>(items: readonly T[], each: (item: T, at: number) => void): Promise<void> {
  for (const [at, item] of items.entries()) {
    each(item, at)
    if (at % chunk === chunk - 1) await nextTurn()
  }
}

/** The rows below the header with the cells of each field; rows without a cell of any field are passed over. */
export async function mapRows(
  table: Table,
  headerRow: number,
  fields: readonly Field[],
  mapping: Mapping,
): Promise<MappedRows> {
  const below = table.rows.filter(({ row }) => row > headerRow)
  const isNumber = ({ type }: Field) => type === 'decimal' || type === 'decimals'
  const columnsOf = (wanted: (field: Field) => boolean) =>
    fields.filter(wanted).flatMap(({ key }) => mapping[key] ?? [])
  const numbers = columnsOf(isNumber)
  const votes = { point: 0, comma: 0 }
  await inChunks(below, ({ cells, marks }) => {
    for (const at of numbers) {
      const mark = marks?.[at]?.number ? null : asWritten(cells[at] ?? '')?.mark
      if (mark) votes[mark] += 1
    }
  })
  const decimal = votes.comma > votes.point ? 'comma' : 'point'
  const isDay = ({ type }: Field) => type === 'day'
  const days = Object.fromEntries(
    fields
      .filter(isDay)
      .map(({ key }) => [key, orderOfDays(below.map(({ cells }) => cells[mapping[key]?.[0] ?? -1] ?? ''))]),
  )
  const numeric = new Set(numbers)
  const singles = fields.flatMap(({ type, key }) => {
    const [place] = mapping[key] ?? []
    return type === 'decimals' || place === undefined ? [] : [[key, place] as const]
  })
  const several = columnsOf(({ type }) => type === 'decimals')
  /** Every place with its field; of several columns which of them. */
  const placed = [...singles, ...severalPlaces(fields, mapping)]
  const rows: FieldRow[] = []
  await inChunks(below, ({ row, cells, marks }) => {
    // A cell stored as a number has a point, whatever the rest of the file marks decimals by.
    const textOf = (at: number): string => {
      const text = (cells[at] ?? '').trim()
      return decimal === 'comma' && marks?.[at]?.number && numeric.has(at) ? text.replace('.', ',') : text
    }
    const read = singles.map(([key, place]) => [key, textOf(place)] as const)
    const readings = several.map(textOf)
    const faults = marks
      ? placed.flatMap(([field, place]) => faultOf(field, cells[place] ?? '', marks[place]))
      : []
    if (faults.length > 0 || read.some(([, text]) => text !== '') || readings.some((text) => text !== ''))
      rows.push({ row, cells: Object.fromEntries(read), several: readings, faults })
  })
  return { rows, writing: { decimal, days } }
}

const severalPlaces = (fields: readonly Field[], mapping: Mapping): (readonly [string, number])[] =>
  fields
    .filter(({ type }) => type === 'decimals')
    .flatMap(({ key }) => (mapping[key] ?? []).map((place, at) => [`${key}.${at}`, place] as const))

/** A formula that failed, or whose result the file does not hold. */
function faultOf(field: string, text: string, mark: CellMark | undefined): FieldRow['faults'] {
  if (mark?.error)
    return [
      { field, message: `The formula of this cell failed (${text}). Mend it, or enter the value itself.` },
    ]
  if (mark?.formula && text === '')
    return [
      {
        field,
        message:
          'The file holds no result of this formula. Open it in a spreadsheet program and save it again, or enter the value itself.',
      },
    ]
  return []
}
