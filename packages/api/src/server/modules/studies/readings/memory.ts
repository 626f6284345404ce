import { z } from 'zod'
import { layouts, type ReadingsInput } from '../../../../contract/readings'
import { columnLetter } from '../../../../contract/tables'
import { signatureOf } from '../../../tables/signature'
import type { Table } from '../../../tables/table'

/** What is remembered of a table: of a workbook with these sheets which one, of these headings which columns. */
export const purposes = { sheet: 'readings.sheet', columns: 'readings.columns' } as const

export const rememberedSheet = z.object({ sheet: z.string() })
export const rememberedColumns = z.object({
  layout: z.enum(layouts),
  columns: z.array(columnLetter).min(1),
  headerRows: z.number().int().min(0),
})
type Columns = z.output<typeof rememberedColumns>

/** By signature. */
export interface Remembered {
  sheets: Readonly<Record<string, z.output<typeof rememberedSheet>>>
  columns: Readonly<Record<string, Columns>>
}
export const nothingRemembered: Remembered = { sheets: {}, columns: {} }

/** What storing these readings teaches: null forgets, because it is found without help. */
export type Lesson =
  | { purpose: typeof purposes.sheet; signature: string; mapping: { sheet: string } | null }
  | { purpose: typeof purposes.columns; signature: string; mapping: Columns | null }

const ofSheets = ({ sheets }: Table): string | null =>
  sheets.length > 1 ? signatureOf(sheets.map(({ name }) => name)) : null

/** The headings of a table in one text; null where it has none to be known again by. */
export const ofHeadings = (names: readonly (string | null)[]): string | null =>
  names.filter((name) => name !== null).length > 1 ? signatureOf(names.map((name) => name ?? '')) : null

/** The sheet to read instead of the first, where this workbook's sheets were seen before. */
export function recalledSheet(table: Table, { sheets }: Remembered): string | undefined {
  const signature = ofSheets(table)
  const recalled = signature === null ? undefined : sheets[signature]?.sheet
  return recalled !== table.sheet && table.sheets.some(({ name }) => name === recalled) ? recalled : undefined
}

/** What naming a sheet teaches. */
export function sheetLesson(table: Table, { sheet }: Pick<ReadingsInput, 'sheet'>): Lesson[] {
  const signature = ofSheets(table)
  if (signature === null || sheet === undefined) return []
  const found = table.sheets.find(({ hidden }) => !hidden)?.name
  return [{ purpose: purposes.sheet, signature, mapping: sheet === found ? null : { sheet } }]
}

/** What naming columns teaches, beside what would have been found. */
export function columnsLesson(names: readonly (string | null)[], said: Columns, found: Columns): Lesson[] {
  const signature = ofHeadings(names)
  if (signature === null) return []
  const same = said.layout === found.layout && said.columns.join() === found.columns.join()
  return [{ purpose: purposes.columns, signature, mapping: same ? null : said }]
}
