export { inSentence } from '../../format'

/** What a form sends for an optional field: null where nothing is entered. */
export const orNull = (text: string | null | undefined): string | null => text?.trim() || null
