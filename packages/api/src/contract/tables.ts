import { z } from 'zod'

/** What a file with a table may be; told by its content. */
export const tableKinds = ['csv', 'xlsx'] as const
export type TableKind = (typeof tableKinds)[number]

export const encodings = ['utf-8', 'windows-1252', 'utf-16'] as const
export const separators = ['comma', 'semicolon', 'tab', 'none'] as const
export const decimalMarks = ['point', 'comma'] as const
export type Encoding = (typeof encodings)[number]
export type Separator = (typeof separators)[number]
export type DecimalMark = (typeof decimalMarks)[number]

/** What is read of one table at most. */
export const mostTableRows = 200_000
export const mostTableColumns = 500

/** A sheet of a workbook that holds cells; hidden ones can be chosen too. */
export const sheetSchema = z.object({ name: z.string(), hidden: z.boolean() })
export type Sheet = z.output<typeof sheetSchema>

/** Letter of a column as spreadsheets name it. */
export const columnLetter = z.string().regex(/^[A-Z]{1,3}$/, 'Name the column by its letter, such as B.')

const detected = 'Leave it out to have it detected.'
/** How to read a file's table; what is left out is detected and named in the answer. */
export const tableChoice = z.object({
  /** Of a workbook: the sheet's name. */
  sheet: z.string().max(100, 'Choose a sheet of the workbook by its name.').optional(),
  /** Of a text file. */
  encoding: z.enum(encodings, `Choose one of ${encodings.join(', ')}. ${detected}`).optional(),
  separator: z.enum(separators, `Choose one of ${separators.join(', ')}. ${detected}`).optional(),
})
export type TableChoice = z.output<typeof tableChoice>
