import type { RowProblem } from './fields'

/** A row of something that several rows make, with the rows whose cells it takes over. */
export interface SettledRow {
  row: number
  takesFrom: readonly number[]
}

/**
 * The rows that cannot be taken because another one cannot: whatever takes a cell over from a bad row is bad too, and
 * names it. Goes through the rows from above, so that it reaches every row that depends on one that depends.
 */
export function dependentsOf(rows: readonly SettledRow[], bad: ReadonlySet<number>): RowProblem[] {
  const found: RowProblem[] = []
  const all = new Set(bad)
  for (const { row, takesFrom } of rows) {
    const on = takesFrom.find((each) => each !== row && all.has(each))
    if (on === undefined || all.has(row)) continue
    all.add(row)
    found.push({ row, field: null, message: dependsOn(on) })
  }
  return found
}

export const dependsOn = (row: number): string =>
  `This row rests on row ${row}, which has to be mended first.`
