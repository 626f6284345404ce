/** What was typed into a form, kept in this tab until it is saved or thrown away. */
const prefix = 'evenrule.form.'

export function readDraft(key: string | undefined): unknown {
  if (!key) return undefined
  try {
    const text = sessionStorage.getItem(prefix + key)
    return text === null ? undefined : (JSON.parse(text) as unknown)
  } catch {
    return undefined
  }
}

export function writeDraft(key: string | undefined, values: unknown): void {
  if (!key) return
  try {
    if (values === undefined) sessionStorage.removeItem(prefix + key)
    else sessionStorage.setItem(prefix + key, JSON.stringify(values))
  } catch {
    // Storage may be closed or full: the form still holds what was typed while the page is open.
  }
}

/** Forgets every draft of this tab: at sign-out and when the organisation is switched. */
export function clearDrafts(): void {
  try {
    const keys = Array.from({ length: sessionStorage.length }, (_, at) => sessionStorage.key(at))
    for (const key of keys) if (key?.startsWith(prefix)) sessionStorage.removeItem(key)
  } catch {
    // Nothing was kept.
  }
}
