/** What a form sends for an optional field: null where nothing is entered. */
export const orNull = (text: string | null | undefined): string | null => text?.trim() || null

/** A name inside a sentence: "Bore gauge" as "bore gauge", but "CMM" and "BG-14" as they are. */
export const inSentence = (name: string): string =>
  /^\p{Lu}\p{Ll}/u.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name
