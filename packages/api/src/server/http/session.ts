import type { Request } from 'express'
import 'express-session'

/** A signed-in person, as the session keeps them. */
export interface SignedIn {
  userId: string
  name: string
  email: string
  /** When the person last proved who they are to the provider, ISO 8601. */
  authenticatedAt: string
  signedInAt: string
  /** For ending the provider's session too. */
  idToken?: string
}

/** A sign-in on its way to the provider and back; gone after one use. */
export interface PendingSignIn {
  state: string
  nonce: string
  codeVerifier: string
  returnTo: string
  fresh: boolean
  startedAt: string
}

declare module 'express-session' {
  interface SessionData {
    person?: SignedIn
    /** One per window that signs in; the newest last. */
    pendingSignIns?: PendingSignIn[]
  }
}

/** How long a fresh sign-in counts for a signature, milliseconds. */
export const freshFor = 5 * 60_000
/** A session ends after this long without a request, milliseconds. */
export const idleLimit = 8 * 3_600_000
/** A session ends this long after the sign-in, however busy it is, milliseconds. */
export const absoluteLimit = 12 * 3_600_000

/** Puts the session under a new id, so that one set before the sign-in is worth nothing after it. */
export const regenerate = (request: Request): Promise<void> =>
  new Promise((resolve, reject) =>
    request.session.regenerate((error: unknown) => (error ? reject(error as Error) : resolve())),
  )

/** Stores the session now: a redirect may come back before the end of the answer would store it. */
export const save = (request: Request): Promise<void> =>
  new Promise((resolve, reject) =>
    request.session.save((error: unknown) => (error ? reject(error as Error) : resolve())),
  )
