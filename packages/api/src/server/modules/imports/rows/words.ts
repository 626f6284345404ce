/** "1 row", "12 rows". */
export const formatCount = (count: number, what: string): string =>
  `${count.toLocaleString('en-GB')} ${what}${count === 1 ? '' : 's'}`

/** The beginning of a text, never with half of a pair of characters at its end. */
export const cut = (text: string, most = 40): string => text.slice(0, most).replace(/[\ud800-\udbff]$/, '')
