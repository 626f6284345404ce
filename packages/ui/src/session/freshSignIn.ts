import { ApiProblem } from '@evenrule/api/client'

const signInAddress = '/api/v1/sign-in'

/** The address that signs a person in and brings them back to a path of this app. */
export function signInUrl(returnTo: string, { fresh = false } = {}): string {
  const query = new URLSearchParams({ ...(fresh ? { fresh: '1' } : {}), returnTo })
  return `${signInAddress}?${query.toString()}`
}

/** Whether the server refused because a signature needs a fresh sign-in. */
export const needsFreshSignIn = (error: unknown): boolean =>
  error instanceof ApiProblem && error.code === 'sign-in-afresh'

/** Sends what has to be signed; a refusal for want of a fresh sign-in is told to `afresh`, and thrown as any other. */
export async function sendSigned<T>(send: () => Promise<T>, afresh: () => void): Promise<T> {
  try {
    return await send()
  } catch (thrown) {
    if (needsFreshSignIn(thrown)) afresh()
    throw thrown
  }
}

/** Leaves for the provider, to come back to the same page; forms with a `storageKey` come back as typed. */
export function signInAfresh(returnTo = location.pathname + location.search + location.hash): void {
  location.assign(signInUrl(returnTo, { fresh: true }))
}
