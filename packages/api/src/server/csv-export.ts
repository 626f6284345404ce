const characters = { comma: ',', semicolon: ';', tab: '\t' } as const

/** Spreadsheets take cells that begin so for formulas; numbers they leave alone. */
// eslint-disable-next-line no-control-regex -- control characters are among what is defused
const formula = /^[=+\-@\u0000-\u001f]/
const number = /^[+-]?\d+([.,]\d+)?(e[+-]?\d+)?$/i

/** One cell of a CSV file: defused where a spreadsheet would run it, quoted where it must be. */
function cellOf(value: string, separator: string): string {
  const text = formula.test(value) && !number.test(value) ? `'${value}` : value
  return /["\r\n]/.test(text) || text.includes(separator) ? `"${text.replaceAll('"', '""')}"` : text
}

/** Rows as CSV in UTF-8 with a byte order mark, by which spreadsheets know the encoding. */
export function csvText(
  rows: readonly (readonly string[])[],
  separator: keyof typeof characters = 'comma',
): string {
  const character = characters[separator]
  const lines = rows.map((row) => row.map((cell) => cellOf(cell, character)).join(character))
  return `\ufeff${lines.join('\r\n')}\r\n`
}
