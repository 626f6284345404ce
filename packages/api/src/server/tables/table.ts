import type { Encoding, Separator, Sheet, TableKind } from '../../contract/tables'

/** What is particular about a cell of a workbook beside its text. */
export interface CellMark {
  /** Stored as a number: the text is its shortest decimal, with a point, whatever the sheet shows. */
  number?: true
  /** Stored as a day or a time: the text is 2026-10-14, 2026-10-14 08:30 or 08:30. */
  date?: true
  /** An error value such as #DIV/0!. */
  error?: true
  /** Computed by a formula; the text is the result the file was saved with, and empty where it holds none. */
  formula?: true
}

export interface TableRow {
  /** As the spreadsheet numbers it, from 1. */
  row: number
  /** From column A on, without empty ones at the end. */
  cells: string[]
  /** By the index of the column; only where something is particular. */
  marks?: Readonly<Record<number, CellMark>>
  hidden?: true
}

/** A place in a table that keeps the whole of it from being read. */
export interface BrokenCell {
  code: 'broken-quotes' | 'unstorable-character'
  row: number
  column: string
  text: string
  message: string
}

export interface SeparatorNote {
  code: 'comma-read-as-decimal' | 'comma-read-as-separator'
  message: string
}

/** How a text was taken apart. */
export interface TextDialect {
  encoding: Encoding
  byteOrderMark: boolean
  separator: Separator
  /** Said where the comma could have been meant otherwise. */
  note: SeparatorNote | null
}

/** A table as rows of text, whatever kind of file it came from. */
export interface Table {
  kind: TableKind
  contentType: string
  /** `rows[0]` is row 1; empty rows in between are kept, those at the end are not. */
  rows: TableRow[]
  broken: BrokenCell | null
  /** Of a CSV file or a text. */
  dialect: TextDialect | null
  /** Of a workbook: its sheets in their order, and the one that was read. */
  sheets: Sheet[]
  sheet: string | null
  /** Letters of hidden columns that hold cells. */
  hiddenColumns: string[]
}
