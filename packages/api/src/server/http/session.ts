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

declare module 'express-session' {
  interface SessionData {
    person?: SignedIn
    /** A sign-in on its way to the provider and back; gone after one use. */
    pendingSignIn?: {
      state: string
      nonce: string
      codeVerifier: string
      returnTo: string
      fresh: boolean
      startedAt: string
    }
  }
}

/** How long a fresh sign-in counts for a signature, milliseconds. */
export const freshFor = 5 * 60_000
