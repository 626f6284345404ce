/** What a cell of a field holds. */
export type FieldType = 'text' | 'decimal' | 'decimals' | 'whole' | 'day' | 'yes-no' | 'choice'

/** One field of an import: its column in the template, and the names by which a column of others is known. */
export interface Field {
  key: string
  /** Heads the column of the template. */
  label: string
  type: FieldType
  /** Without its column nothing of the file can be read. */
  required?: boolean
  /** For the sheet that explains the template. */
  hint: string
  example: string
  /** Names in other files and languages, as `normalised` makes them. */
  names: readonly string[]
}

/** A row with the cells of its fields as text; fields without a column are absent. */
export interface FieldRow {
  row: number
  cells: Readonly<Record<string, string>>
  /** Where a field lies in several columns: every cell of it in their order. */
  several: readonly string[]
  /** Cells that hold no text at all, such as an error of a formula. */
  faults: readonly Omit<RowProblem, 'row'>[]
}

/** What is wrong with a row or with one of its cells, with the mend. */
export interface RowProblem {
  row: number
  /** Key of the field; null where it is about the row as a whole. */
  field: string | null
  message: string
}
