const storageKey = 'evenrule.invitation'
/** Where storage is closed the token lives as long as the page. */
let inMemory: string | undefined

/** Path of the page that a link leads to. */
export const invitationPath = '/invitation'

/** The token in what somebody pasted, a link or a whole mail, or the bare characters; undefined where there is none. */
export function tokenIn(text: string): string | undefined {
  return (/#([\w-]{43})(?![\w-])/.exec(text) ?? /^\s*([\w-]{43})\s*$/.exec(text))?.[1]
}

/** Keeps the token in this tab, so that it survives the way to the sign-in page and back. */
export function keepInvitation(token: string): void {
  inMemory = token
  try {
    sessionStorage.setItem(storageKey, token)
  } catch {
    // Without storage the link of the mail is opened again after signing in.
  }
}

/** The token of the invitation that was opened in this tab last, and not accepted yet. */
export function keptInvitation(): string | undefined {
  try {
    return sessionStorage.getItem(storageKey) ?? inMemory
  } catch {
    return inMemory
  }
}

export function forgetInvitation(): void {
  inMemory = undefined
  try {
    sessionStorage.removeItem(storageKey)
  } catch {
    // Nothing was kept.
  }
}

/**
 * Takes the token out of the address the app was opened with, before anything else sees it: it must not stay in the
 * history of the browser, in a screenshot, or in what an error reports.
 */
export function takeInvitation(from: Location = location, past: History = history): void {
  if (from.pathname !== invitationPath || !from.hash) return
  const token = tokenIn(from.hash)
  if (token) keepInvitation(token)
  past.replaceState(past.state, '', invitationPath)
}
