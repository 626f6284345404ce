import { createHash } from 'node:crypto'

/** By which a table is known again: its headings, whatever their case and spacing. */
export const signatureOf = (names: readonly string[]): string =>
  createHash('sha256')
    .update(JSON.stringify(names.map((name) => name.trim().replace(/\s+/g, ' ').toLowerCase())))
    .digest('hex')
