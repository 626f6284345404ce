import type { Request, Response } from 'express'
import { readSession, signIn, signInCallback, signOut, signOutEverywhere } from '../../../contract/sign-in'
import { personRoute, publicRoute, type PublicCall, type Route } from '../../http/route'
import { regenerate, save, type PendingSignIn } from '../../http/session'
import { logSecurityEvent } from './sign-in.repository'
import {
  beginSignIn,
  endAtProvider,
  finishSignIn,
  readSessionOf,
  refusedSignIn,
  SignInRefused,
  type SignInDependencies,
} from './sign-in.service'

/** Takes the sign-in that the callback answers out of the session: each is good for one use. */
function takePending(request: Request, state: string | null): PendingSignIn | undefined {
  const all = request.session.pendingSignIns ?? []
  const found = all.find((pending) => pending.state === state)
  if (found) request.session.pendingSignIns = all.filter((pending) => pending !== found)
  return found
}

export const signInRoutes = (dependencies: SignInDependencies): Route[] => {
  const { database, sessions, origins } = dependencies

  /** Runs one half of a sign-in; a refusal leads to the sign-in page, which says why. */
  async function orBack(
    { side, services, response }: Pick<PublicCall<typeof signIn>, 'side' | 'services' | 'response'>,
    work: () => Promise<string>,
  ): Promise<void> {
    const address = await work().catch((error: unknown) => {
      if (error instanceof SignInRefused) return refusedSignIn(dependencies, services, side, error)
      throw error
    })
    redirect(response, address)
  }

  return [
    personRoute(readSession, ({ person, services }) => readSessionOf(dependencies, services, person)),

    publicRoute(signIn, (call) =>
      orBack(call, async () => {
        const { request, side, services, query } = call
        const { address, pending } = await beginSignIn(dependencies, services, {
          side,
          returnTo: query.returnTo,
          fresh: query.fresh === '1',
          person: request.session.person,
          pending: request.session.pendingSignIns ?? [],
        })
        request.session.pendingSignIns = pending
        await save(request)
        return address
      }),
    ),

    publicRoute(signInCallback, (call) =>
      orBack(call, async () => {
        const { request, side, services } = call
        const callback = new URL(request.originalUrl, origins[side])
        const { person, returnTo } = await finishSignIn(dependencies, services, {
          side,
          callback,
          pending: takePending(request, callback.searchParams.get('state')),
          person: request.session.person,
        })
        await regenerate(request)
        request.session.person = person
        await save(request)
        return returnTo
      }),
    ),

    personRoute(signOut, async ({ person, side, services, request, response }) => {
      const next = await endAtProvider(dependencies, services, side, person)
      await sessions.end(request, response, side)
      await logSecurityEvent(database, {
        kind: 'sign-out',
        at: services.clock().toISOString(),
        userId: person.userId,
        detail: { side },
      })
      return { next }
    }),

    personRoute(signOutEverywhere, async ({ person, side, services, request, response }) => {
      const next = await endAtProvider(dependencies, services, side, person)
      const ended = await sessions.endAllOf(person.userId)
      await sessions.end(request, response, side)
      await logSecurityEvent(database, {
        kind: 'sign-out-everywhere',
        at: services.clock().toISOString(),
        userId: person.userId,
        detail: { side, sessions: String(ended) },
      })
      return { next, sessions: ended }
    }),
  ]
}

const redirect = (response: Response, address: string): void => response.redirect(303, address)
