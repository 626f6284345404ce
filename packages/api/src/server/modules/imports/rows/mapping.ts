import type { Field } from './fields'

/** A name as it is compared: small letters and digits, without accents, brackets and what stands in them. */
export const normalised = (name: string): string =>
  name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/[([{][^)\]}]*[)\]}]/g, ' ')
    .replace(/[^\p{L}\p{N}±]+/gu, ' ')
    .trim()

/** Columns by field, as their places in the row counted from 0. */
export type Mapping = Record<string, number[]>

/** "Reading 3", "Messwert 3", "x3" and "3" are of one row of names. */
const counted = /^(.*?) ?(\d{1,4})$/

/**
 * Guesses from the names of the columns which field each holds. The exact name wins over another one, and the first
 * column over later ones; a field of several columns takes every column of its name that is counted.
 */
export function guessMapping(fields: readonly Field[], header: readonly string[]): Mapping {
  const names = header.map(normalised)
  const mapping: Mapping = {}
  const taken = new Set<number>()
  const exact = (field: Field) => [normalised(field.label), ...field.names]
  // The names of the template first, then the others in the order in which they are listed.
  const depth = Math.max(...fields.map((field) => exact(field).length))
  for (let at = 0; at < depth; at += 1)
    for (const field of fields) {
      if (mapping[field.key]) continue
      const place = names.findIndex((name, index) => !taken.has(index) && name === exact(field)[at])
      if (exact(field)[at] === undefined || place < 0) continue
      mapping[field.key] = [place]
      taken.add(place)
    }
  for (const field of fields.filter(({ type }) => type === 'decimals')) {
    const stems = new Set(['', 'x', 'r', 'm', 'n', ...exact(field)])
    const places = names.flatMap((name, index) => {
      const [, stem] = counted.exec(name) ?? []
      return !taken.has(index) && stem !== undefined && stems.has(stem) ? [index] : []
    })
    if (places.length > 0)
      mapping[field.key] = [...(mapping[field.key] ?? []), ...places].sort((a, b) => a - b)
  }
  return mapping
}

/** The row that names the columns: of the first ones that in which most fields are known; the first where none is. */
export function findHeader(fields: readonly Field[], rows: readonly (readonly string[])[]): number {
  const scores = rows.slice(0, 30).map((row) => Object.keys(guessMapping(fields, row)).length)
  const best = Math.max(...scores, 0)
  return best < 2 ? 0 : scores.indexOf(best)
}
