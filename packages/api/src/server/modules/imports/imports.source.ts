import {
  mostImportReadings,
  mostImportRows,
  type ImportInput,
  type ImportKind,
  type ImportPreview,
} from '../../../contract/imports'
import { cut } from './rows/words'
import type { Side } from '../../../contract/access'
import { invalidInput } from '../../errors'
import { columnOf, letterOf } from '../../tables/letters'
import { refuseBroken, refusedFile } from '../../tables/refuse'
import type { Table } from '../../tables/table'
import { sha256 } from '../record/record.append'
import { gaugeFields } from './kinds/gauges.fields'
import { partFields } from './kinds/parts.fields'
import { studyFields } from './kinds/studies.fields'
import { mapRows, type MappedRows } from './rows/context'
import type { Field } from './rows/fields'
import { findHeader, guessMapping, normalised, type Mapping } from './rows/mapping'

export const fieldsOf = (kind: ImportKind, side: Side): Field[] =>
  kind === 'parts' ? partFields(side) : kind === 'gauges' ? gaugeFields : studyFields

/** A file with what its columns mean. */
export interface Source {
  table: Table
  fields: Field[]
  headerRow: number
  mapping: Mapping
  /** Labels of fields without which nothing of the file can be read. */
  missing: string[]
  mapped: MappedRows
  /** How the file was read, so that it is read the same way once more. */
  input: ImportInput
  /** SHA-256 of the names of the columns, by which the next file like it is known. */
  signature: string
}

/** Columns by field that a file with the same names was imported with before. */
export type Remembered = (signature: string) => Promise<ImportInput['columns']>

/** Finds the names of the columns, what they mean, and the rows below; refuses what is too much. */
export async function sourceOf(
  kind: ImportKind,
  side: Side,
  table: Table,
  input: ImportInput,
  remembered: Remembered = () => Promise.resolve(undefined),
): Promise<Source> {
  refuseBroken(table)
  const fields = fieldsOf(kind, side)
  const rows = table.rows.map(({ cells }) => cells)
  const headerRow = input.headerRow ?? findHeader(fields, rows) + 1
  const header = rows[headerRow - 1] ?? []
  const signature = sha256(JSON.stringify(header.map(normalised)))
  const chosen = input.columns ?? (await remembered(signature))
  const mapping = chosen ? mappingOf(fields, chosen) : guessMapping(fields, header)
  const missing = fields.filter(({ key, required }) => required && !mapping[key]).map(({ label }) => label)
  const mapped = await mapRows(table, headerRow, fields, mapping)
  if (mapped.rows.length === 0 && missing.length === 0)
    throw refusedFile(
      'There are no rows below the names of the columns. Fill in the file, or name another row as the one with the names.',
    )
  const most = kind === 'studies' ? mostImportReadings : mostImportRows
  if (mapped.rows.length > most)
    throw refusedFile(
      `This file has ${mapped.rows.length.toLocaleString('en-GB')} rows; one import takes at most ${most.toLocaleString('en-GB')}. Split it into several files.`,
    )
  const columns = Object.fromEntries(
    Object.entries(mapping).map(([key, places]) => [key, places.map(letterOf)]),
  )
  const used = { ...input, headerRow, columns }
  return { table, fields, headerRow, mapping, missing, mapped, input: used, signature }
}

/** The columns that the sender chose; each may serve one field. */
function mappingOf(fields: readonly Field[], chosen: Readonly<Record<string, string[]>>): Mapping {
  const taken = new Map<string, string>()
  const mapping: Mapping = {}
  for (const { key, label, type } of fields) {
    const letters = chosen[key] ?? []
    const refuse = (message: string) => invalidInput([{ path: `body.columns.${key}`, message }])
    if (letters.length > 1 && type !== 'decimals') throw refuse(`Choose one column for ${label}.`)
    for (const letter of letters) {
      const other = taken.get(letter)
      if (other) throw refuse(`Column ${letter} is chosen for ${other} already. Choose another one.`)
      taken.set(letter, label)
    }
    if (letters.length > 0) mapping[key] = letters.map(columnOf).sort((a, b) => a - b)
  }
  return mapping
}

/** The columns of the file as the preview shows them. */
export function columnsOf({ table, headerRow, mapping }: Source): ImportPreview['columns'] {
  const names = table.rows[headerRow - 1]?.cells ?? []
  const below = table.rows.slice(headerRow, headerRow + 5)
  const width = Math.max(names.length, ...below.map(({ cells }) => cells.length))
  const byPlace = new Map(
    Object.entries(mapping).flatMap(([key, places]) => places.map((place) => [place, key] as const)),
  )
  return Array.from({ length: width }, (_, at) => ({
    letter: letterOf(at),
    name: cut(names[at] ?? '', 80),
    samples: below.flatMap(({ cells }) => (cells[at] ? [cut(cells[at], 40)] : [])).slice(0, 3),
    field: byPlace.get(at) ?? null,
  }))
}
