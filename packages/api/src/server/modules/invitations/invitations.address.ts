/** Addresses that differ by case alone are the same. */
export const sameAddress = (a: string, b: string): boolean => a.toLowerCase() === b.toLowerCase()

/**
 * An address for somebody who may not know it: who owns it recognises it, nobody else learns it. Such as
 * `a•••@q•••.example` for `ada.pell@quillmark.example`.
 */
export function maskedAddress(address: string): string {
  const at = address.lastIndexOf('@')
  const [name, domain] = [address.slice(0, at), address.slice(at + 1)]
  const ending = domain.includes('.') ? domain.slice(domain.lastIndexOf('.')) : ''
  return `${firstOf(name)}•••@${firstOf(domain)}•••${ending}`
}

const firstOf = (text: string): string => [...text][0] ?? ''
