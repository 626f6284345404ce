/** Cells of a pasted column, row or block, in reading order; empty ends are dropped. */
export function pastedCells(text: string): string[] {
  const cells = text
    .replace(/\r\n?/g, '\n')
    .split(/[\n\t]/)
    .map((cell) => cell.trim())
  while (cells.length && cells.at(-1) === '') cells.pop()
  return cells
}

/** The grid after several cells were pasted at one: they fill it downwards, and it grows where they need room. */
export function spreadPaste(cells: readonly string[], at: number, text: string): string[] {
  const next = [...cells]
  pastedCells(text).forEach((cell, offset) => (next[at + offset] = cell))
  return Array.from(next, (cell) => cell ?? '')
}

/** Typed cells as the text that is sent, one reading a line; cells left empty at the end are no readings. */
export function typedText(cells: readonly string[]): string {
  const filled = [...cells]
  while (filled.length && filled.at(-1)?.trim() === '') filled.pop()
  return filled.join('\n')
}

const mostRows = 200

/** Empty cells to start typing into: as many as are planned and not kept yet, within reason. */
export const emptyGrid = (planned: number, kept: number): string[] =>
  Array.from({ length: Math.min(Math.max(planned - kept, 1), mostRows) }, () => '')
