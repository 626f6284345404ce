const storageKey = 'evenrule.organisation'

/** The organisation that was open last in this browser; undefined where none is known or storage is closed. */
export function lastOrganisation(): string | undefined {
  try {
    return localStorage.getItem(storageKey) ?? undefined
  } catch {
    return undefined
  }
}

/** Remembers the organisation for the next visit of `/`. */
export function rememberOrganisation(id: string): void {
  try {
    localStorage.setItem(storageKey, id)
  } catch {
    // Without storage the next visit opens the first organisation.
  }
}
