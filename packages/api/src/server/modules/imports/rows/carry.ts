import type { RowCells } from './cells'

/** A text that a row says itself, or that an earlier row of the same thing said; `row` is the one that says it. */
export interface Carried {
  value: string
  row: number
}

/**
 * Texts that belong to the thing rather than to the row (the name of a part) may be left empty below the first row.
 * They are taken from the nearest row above that says them, and another text in a later row contradicts.
 */
export class CarriedTexts {
  readonly #said = new Map<string, Carried>()

  /**
   * What counts for this row; null where no row said it so far. A cell that could not be read counts as said, so that
   * the rows that rest on it are known. `changing` allows another text further down.
   */
  take(cells: RowCells, field: string, text: string | null, { changing = false } = {}): Carried | null {
    const before = this.#said.get(field) ?? null
    if (text === null && cells.text(field) === null) return before
    const own = { value: text ?? unread, row: cells.row }
    if (changing || !before || before.value === unread) {
      this.#said.set(field, own)
      return own
    }
    if (before.value === own.value || own.value === unread) return before
    cells.refuse(
      field,
      `Row ${before.row} says “${before.value}” here. One of the two is wrong; write the same in both.`,
    )
    return before
  }
}

const unread = ''
