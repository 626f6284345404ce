import { z } from 'zod'
import { line } from './common'
import {
  columnLetter,
  decimalMarks,
  encodings,
  mostTableColumns,
  mostTableRows,
  separators,
  sheetSchema,
  tableChoice,
  tableKinds,
} from './tables'

/** Largest file of readings, in bytes, and the most readings one study holds. */
export const largestReadingsFile = 10_000_000
export const mostReadings = 100_000

/** Long: all readings in one column. Wide: several in each row, taken row by row from left to right. */
export const layouts = ['long', 'wide'] as const

/** How a text or a file was read: all that is needed to read the kept file again in the same way. */
export const readAsSchema = z.object({
  kind: z.enum(tableKinds),
  /** Of a workbook. */
  sheet: z.string().nullable(),
  /** Of a text. */
  encoding: z.enum(encodings).nullable(),
  byteOrderMark: z.boolean(),
  separator: z.enum(separators).nullable(),
  /** Of cells that are text; numbers of a workbook need none. */
  decimal: z.enum(decimalMarks),
  layout: z.enum(layouts),
  /** Rows above the first reading that name the columns or tell something else. */
  headerRows: z.number().int(),
  /** The columns with the readings, from left to right, and what they are called. */
  columns: z.array(columnLetter),
  columnNames: z.array(z.string().nullable()),
})
export type ReadAs = z.output<typeof readAsSchema>

const detected = 'Leave it out to have it detected.'
/** What to read and how; every part of the how that is left out is detected and named in the answer. */
export const readingsInput = tableChoice.extend({
  /** Typed readings (one per line) or what was pasted; left out when a file is sent. */
  text: z
    .string()
    .max(4_000_000, 'This is too much to paste. Save it as a CSV file and upload it.')
    .optional(),
  /** How the text came about. Typed lines hold one reading each and are never split at commas. */
  source: z.enum(['typed', 'pasted', 'uploaded']),
  decimal: z.enum(decimalMarks, `Choose point or comma. ${detected}`).optional(),
  layout: z.enum(layouts, `Choose long or wide. ${detected}`).optional(),
  /** Rows to pass over at the top. */
  headerRows: z.number().int().min(0).max(mostTableRows).optional(),
  /** The column that holds the readings, or the columns of the wide layout. */
  columns: z
    .array(columnLetter)
    .min(1, 'Name at least one column.')
    .max(mostTableColumns, `Name at most ${mostTableColumns} columns.`)
    .optional(),
})
export type ReadingsInput = z.output<typeof readingsInput>

export const cellProblems = [
  'empty',
  'not-a-number',
  'thousands-separator',
  'other-decimal-mark',
  'unit-in-cell',
  'too-long',
  'too-large',
  'unstorable-character',
  'broken-quotes',
  /** A mean or a sum below the readings. */
  'summary-row',
  /** Of a workbook: computed instead of entered, an error such as #DIV/0!, a day or a time. */
  'formula',
  'error-value',
  'date-in-cell',
] as const
export type CellProblem = (typeof cellProblems)[number]

export const cellErrorSchema = z.object({
  code: z.enum(cellProblems),
  row: z.number().int(),
  column: z.string(),
  /** The cell as it stands there. */
  text: z.string(),
  /** What is wrong and how to mend it. */
  message: z.string(),
})
export type CellError = z.output<typeof cellErrorSchema>

export const noteCodes = [
  /** About how it was read. */
  'comma-read-as-decimal',
  'comma-read-as-separator',
  'comma-both',
  'column-chosen',
  'read-across',
  'read-wide',
  'sheet-chosen',
  /** Rows or columns that the workbook hides hold readings. */
  'hidden-cells',
  /** The rows of a run sheet do not stand in its order. */
  'run-sheet-order',
  'rows-passed-over',
  /** Rows at the end whose reading is not taken yet, as on a run sheet half filled. */
  'empty-at-end',
  'read-as-latin-1',
  /** About the readings against the study. */
  'more-than-planned',
  'fewer-than-planned',
  'finer-than-resolution',
  'far-from-reference',
  'looks-like-values',
  'looks-like-deviations',
] as const

export const readingsNoteSchema = z.object({
  code: z.enum(noteCodes),
  message: z.string(),
  /** Numbers of the readings it is about, counted from 1 (the first few); empty where it is about all. */
  readings: z.array(z.number().int()),
})
export type ReadingsNote = z.output<typeof readingsNoteSchema>

export const readingsPreviewSchema = z.object({
  readAs: readAsSchema,
  /** Whether a table with the same headings was read so before, and is read as then. */
  remembered: z.boolean(),
  /** Of a workbook: its sheets in their order. */
  sheets: z.array(sheetSchema),
  /** How many columns hold numbers, and which was taken. */
  columns: z.array(
    z.object({
      letter: z.string(),
      name: z.string().nullable(),
      numbers: z.number().int(),
      chosen: z.boolean(),
    }),
  ),
  /** The first rows as they were split, headers included. */
  firstRows: z.array(z.object({ row: z.number().int(), cells: z.array(z.string()) })),
  rows: z.number().int(),
  readings: z.array(
    z.object({ row: z.number().int(), column: z.string(), text: z.string(), value: z.number() }),
  ),
  /** Cells without a number where a reading belongs: the first 200, and how many there are. */
  errors: z.array(cellErrorSchema),
  errorCount: z.number().int(),
  /** Whether what is wrong is only cells that may be left out. */
  mayLeaveOut: z.boolean(),
  notes: z.array(readingsNoteSchema),
  warnings: z.array(readingsNoteSchema),
  file: z.object({ name: z.string(), size: z.number().int(), sha256: z.string() }).nullable(),
})
export type ReadingsPreview = z.output<typeof readingsPreviewSchema>

/** Code of the person who took the readings, as the other side sees it. */
export const appraiserCode = line(20)
