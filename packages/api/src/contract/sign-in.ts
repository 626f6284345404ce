import { z } from 'zod'
import { calendarDate, instant, roleSchema, sideSchema, uuid } from './common'
import { defineEndpoint } from './define'

/** Reasons why a sign-in did not come about; the sign-in page says each in words. */
export const signInProblems = [
  'not-begun-here',
  'took-too-long',
  'left',
  'provider-refused',
  'provider-unreachable',
  'no-email',
  'another-person',
  'not-afresh',
] as const
export type SignInProblem = (typeof signInProblems)[number]

export const organisationOfPerson = z.object({
  id: uuid,
  name: z.string(),
  timeZone: z.string(),
  roles: z.array(roleSchema),
  /** The sides it has in its relationships; empty for one that has none yet. */
  sides: z.array(sideSchema),
})

export const readSession = defineEndpoint({
  method: 'get',
  path: '/session',
  access: 'signed-in',
  response: z.object({
    person: z.object({
      id: uuid,
      name: z.string(),
      email: z.string(),
      authenticatedAt: instant,
      signedInAt: instant,
    }),
    /** When this sign-in ends, however busy the person is. */
    endsAt: instant,
    organisations: z.array(organisationOfPerson),
    /** Memberships that have ended, the latest first, so that a person is told why an organisation is gone. */
    ended: z.array(z.object({ name: z.string(), endsOn: calendarDate })),
    /** Where the app of each side is. */
    apps: z.object({ supplier: z.string(), customer: z.string() }),
  }),
  summary: 'Who is signed in, and the organisations they belong to.',
})

/** Visited by the browser itself: answers with redirects, and leads back to a readable page when it fails. */
export const signIn = defineEndpoint({
  method: 'get',
  path: '/sign-in',
  access: 'public',
  query: z.object({
    returnTo: z.string().optional().catch(undefined),
    fresh: z.string().optional().catch(undefined),
  }),
  summary: 'Sends the browser to the sign-in provider; fresh=1 asks for proof again even when signed in.',
})

export const signInCallback = defineEndpoint({
  method: 'get',
  path: '/sign-in/callback',
  access: 'public',
  summary: 'Where the sign-in provider sends the browser back to.',
})

const ended = z.object({
  /** The address to visit next: it ends the provider's session too. */
  next: z.string(),
})

export const signOut = defineEndpoint({
  method: 'post',
  path: '/sign-out',
  access: 'signed-in',
  response: ended,
  summary: 'Ends this session.',
})

export const signOutEverywhere = defineEndpoint({
  method: 'post',
  path: '/sign-out-everywhere',
  access: 'signed-in',
  response: ended.extend({ sessions: z.number().int() }),
  summary: 'Ends every session of this person, in both apps and on every device.',
})
