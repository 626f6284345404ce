/** The letter of a column as spreadsheets name it, from zero: A, B, …, Z, AA. */
export function letterOf(column: number): string {
  const rest = column >= 26 ? letterOf(Math.floor(column / 26) - 1) : ''
  return rest + String.fromCharCode(65 + (column % 26))
}

/** The column of a letter, from zero. */
export const columnOf = (letter: string): number =>
  [...letter].reduce((sum, each) => sum * 26 + each.charCodeAt(0) - 64, 0) - 1
