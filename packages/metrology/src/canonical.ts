/**
 * The text of a JSON value in the JSON Canonicalization Scheme (RFC 8785): members ordered by UTF-16 code units of
 * their names, no white space, numbers in their shortest form. Two equal outputs have the same bytes. Throws on what
 * JSON cannot hold (numbers that are not finite, lone surrogates, functions, BigInt); undefined members are left out.
 */
export function canonicalText(value: unknown): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError('A number that is not finite has no canonical text.')
    return JSON.stringify(value)
  }
  if (typeof value === 'string') {
    if (/\p{Surrogate}/u.test(value)) throw new TypeError('Text with a lone surrogate has no canonical text.')
    return JSON.stringify(value)
  }
  if (Array.isArray(value)) return `[${Array.from(value as unknown[], canonicalText).join(',')}]`
  if (typeof value === 'object') {
    const members = Object.entries(value).filter(([, item]) => item !== undefined)
    members.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
    return `{${members.map(([name, item]) => `${canonicalText(name)}:${canonicalText(item)}`).join(',')}}`
  }
  throw new TypeError(`A ${typeof value} has no canonical text.`)
}
