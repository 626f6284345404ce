import type { BrokenCell } from './table'

/** Characters that the database cannot hold: U+0000 and halves of a pair. */
const unstorable = /\u0000|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/ // eslint-disable-line no-control-regex -- it is what is refused

/** Where the first character that cannot be stored stands; −1 where there is none. */
export const unstorableAt = (text: string): number => text.search(unstorable)

/** A cell with a character that cannot be stored, by what stands before that character. */
export const unstorableCell = (code: number, before: string): Pick<BrokenCell, 'text' | 'message'> => ({
  text: `${before.slice(-50)}\ufffd`,
  message: `This cell holds the character U+${code.toString(16).toUpperCase().padStart(4, '0')}, which cannot be stored. Remove it, or export the table anew.`,
})
