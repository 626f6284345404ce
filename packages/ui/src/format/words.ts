const small = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten']

/** A small count as a word, for running text: "two", "ten", "11". */
export const countWord = (count: number): string => small[count] ?? String(count)

/** The first letter as a capital, to begin a sentence. */
export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

/** Names as a list in a sentence: "bias", "bias and resolution", "bias, resolution and design". */
export function joinWords(names: readonly string[]): string {
  const last = names.at(-1) ?? ''
  return names.length > 1 ? `${names.slice(0, -1).join(', ')} and ${last}` : last
}

/** A name inside a sentence: "Bore gauge" as "bore gauge", but "CMM" and "BG-14" as they are. */
export const inSentence = (name: string): string =>
  /^\p{Lu}\p{Ll}/u.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name
