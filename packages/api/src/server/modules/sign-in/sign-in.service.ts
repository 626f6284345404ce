import type { Side } from '../../../contract/access'
import type { SignInProblem } from '../../../contract/sign-in'
import type { Database } from '../../db/database'
import { absoluteLimit, type PendingSignIn, type SignedIn } from '../../http/session'
import { IdentityError, type Identity } from '../../integrations/oidc'
import type { Sessions } from '../../integrations/sessions'
import type { Services } from '../../services'
import { endedMembershipsOf, logSecurityEvent, membershipsOf, personOf } from './sign-in.repository'

export interface SignInDependencies {
  database: Database
  identity: Identity
  sessions: Pick<Sessions, 'end' | 'endAllOf'>
  origins: Record<Side, string>
}

/** How long a sign-in may stay open at the provider, milliseconds. */
const patience = 30 * 60_000
/** Windows of one browser that may be signing in at the same time. */
const windows = 5
/** The provider's clock may be this far from ours, milliseconds. */
const clockSkew = 5_000

/** A sign-in that did not come about: the page to go back to, and why. */
export class SignInRefused extends Error {
  constructor(
    readonly problem: SignInProblem,
    readonly returnTo = '/',
    readonly fresh = false,
    options: { cause?: unknown } = {},
  ) {
    super(problem, options)
    this.name = 'SignInRefused'
  }
}

/**
 * A path of this app, or `/`: where a person goes after signing in must never be another site, nor the
 * interface itself.
 */
export function ownPath(returnTo: string | undefined, origin: string): string {
  // Browsers read a backslash as a slash and drop tabs and line ends, so a path may hold none of them.
  if (!returnTo || !/^\/(?![/\\])[^\\\s]*$/.test(returnTo)) return '/'
  const address = new URL(returnTo, origin)
  if (address.origin !== origin || /^\/(api|sign-in|signed-out)(\/|$)/.test(address.pathname)) return '/'
  return address.pathname + address.search + address.hash
}

export interface Begun {
  address: string
  pending: PendingSignIn[]
}

/** Begins a sign-in: the provider's address, and what the session must remember until the callback. */
export async function beginSignIn(
  { identity, origins }: SignInDependencies,
  services: Services,
  input: {
    side: Side
    returnTo: string | undefined
    fresh: boolean
    person: SignedIn | undefined
    pending: readonly PendingSignIn[]
  },
): Promise<Begun> {
  const { side, fresh, person } = input
  const returnTo = ownPath(input.returnTo, origins[side])
  try {
    const { address, secrets } = await identity.begin(side, {
      fresh,
      ...(person ? { hint: person.email } : {}),
    })
    const startedAt = services.clock().toISOString()
    const pending = [...input.pending, { ...secrets, returnTo, fresh, startedAt }].slice(-windows)
    return { address, pending }
  } catch (cause) {
    if (!(cause instanceof IdentityError)) throw cause
    throw new SignInRefused(cause.problem, returnTo, fresh, { cause })
  }
}

/**
 * Ends a sign-in with a person, or refuses it. Without the transaction this browser began (`pending`) a callback
 * is worth nothing: somebody else may have made the link.
 */
export async function finishSignIn(
  { database, identity }: SignInDependencies,
  services: Services,
  input: { side: Side; callback: URL; pending: PendingSignIn | undefined; person: SignedIn | undefined },
): Promise<{ person: SignedIn; returnTo: string }> {
  const { side, callback, pending } = input
  if (!pending) throw new SignInRefused('not-begun-here')
  const { returnTo, fresh } = pending
  const refuse = (problem: SignInProblem, cause?: unknown) =>
    new SignInRefused(problem, returnTo, fresh, { cause })
  const now = services.clock()
  if (now.getTime() - Date.parse(pending.startedAt) > patience) throw refuse('took-too-long')

  const identified = await identity.finish(side, callback, pending).catch((cause: unknown) => {
    throw cause instanceof IdentityError ? refuse(cause.problem, cause) : cause
  })
  const provedAt = identified.authTime === undefined ? undefined : identified.authTime * 1000
  // The provider rounds down to seconds.
  const asked = Math.floor(Date.parse(pending.startedAt) / 1000) * 1000
  if (fresh && (provedAt === undefined || provedAt < asked - clockSkew)) throw refuse('not-afresh')

  const userId = await personOf(database, identified, now.toISOString())
  // A signature is begun by the person signed in; nobody else may finish it in their window.
  if (fresh && input.person && input.person.userId !== userId) throw refuse('another-person')
  await logSecurityEvent(database, {
    kind: 'sign-in',
    at: now.toISOString(),
    userId,
    detail: { side, fresh: String(fresh) },
  })
  const person: SignedIn = {
    userId,
    name: identified.name,
    email: identified.email,
    // Without the provider's word the proof is as old as it can be known to be: this sign-in.
    authenticatedAt: new Date(Math.min(provedAt ?? now.getTime(), now.getTime())).toISOString(),
    signedInAt: now.toISOString(),
    ...(identified.idToken ? { idToken: identified.idToken } : {}),
  }
  return { person, returnTo }
}

/** Writes a refused sign-in to the security log and says where to go: always a page, never raw data. */
export async function refusedSignIn(
  { database }: SignInDependencies,
  services: Services,
  side: Side,
  refused: SignInRefused,
): Promise<string> {
  const { problem, returnTo, fresh, cause } = refused
  services.logger.warn({ problem, err: cause }, 'sign-in refused')
  await logSecurityEvent(database, {
    kind: 'sign-in-refused',
    at: services.clock().toISOString(),
    detail: { side, problem },
  }).catch((error: unknown) => services.logger.error({ err: error }, 'security event not written'))
  const query = new URLSearchParams({
    problem,
    ...(returnTo === '/' ? {} : { returnTo }),
    ...(fresh ? { fresh: '1' } : {}),
  })
  return `/sign-in?${query.toString()}`
}

/** Who is signed in, with their organisations. */
export async function readSessionOf(
  { database, origins }: SignInDependencies,
  services: Services,
  person: SignedIn,
) {
  const now = services.clock().toISOString()
  const memberships = await membershipsOf(database, person.userId, now)
  return {
    person: { ...person, id: person.userId },
    endsAt: new Date(Date.parse(person.signedInAt) + absoluteLimit).toISOString(),
    organisations: memberships.map((row) => ({
      id: row.org_id,
      name: row.org_name,
      timeZone: row.time_zone,
      roles: row.roles,
      sides: [...(row.supplies ? (['supplier'] as const) : []), ...(row.buys ? (['customer'] as const) : [])],
    })),
    ended: await endedMembershipsOf(database, person.userId, now),
    apps: { supplier: origins.supplier, customer: origins.customer },
  }
}

/** Where to go after signing out; when the provider does not answer, its own session is left to run out. */
export async function endAtProvider(
  { identity }: SignInDependencies,
  services: Services,
  side: Side,
  person: SignedIn,
): Promise<string> {
  try {
    return (await identity.endSession(side, person.idToken)) ?? '/signed-out'
  } catch (error) {
    services.logger.warn({ err: error }, 'the provider’s session was not ended')
    return '/signed-out'
  }
}
