import type { AcceptHindrance, OpenedInvitation } from '../../../contract/invitations'
import { invitationState } from '../../../contract/moves/invitation'
import { dayIn } from '../../calendar'
import type { Database, Transaction } from '../../db/database'
import { withPerson } from '../../db/tenant'
import { ProblemError } from '../../errors'
import type { SignedIn } from '../../http/session'
import type { Services } from '../../services'
import { logSecurityEvent, membershipsOf, selectOwnAddress } from '../sign-in/sign-in.repository'
import { maskedAddress, sameAddress } from './invitations.address'
import { anotherAddress, unknownInvitation, unverifiedAddress } from './invitations.errors'
import { selectByToken, type FoundInvitation } from './invitations.token.repository'
import { hashOf, isTokenOf } from './invitations.token'

export interface InvitationDependencies {
  database: Database
  /** Derives the tokens of links. */
  invitationSecret: string
}

/**
 * The invitation of a token, for the person whose verified address it was sent to; to anybody else only why not, with
 * the address masked. `lock` makes all who accept an invitation of that organisation wait for one another.
 */
export async function invitationFor(
  { invitationSecret }: Pick<InvitationDependencies, 'invitationSecret'>,
  tx: Transaction,
  userId: string,
  { token, lock }: { token: string; lock: boolean },
): Promise<FoundInvitation> {
  const found = await selectByToken(tx, hashOf(token), lock)
  if (!found || !isTokenOf(invitationSecret, found, token)) throw unknownInvitation()
  const { email, verified } = await selectOwnAddress(tx, userId)
  if (!sameAddress(email, found.email)) throw anotherAddress(maskedAddress(found.email), email)
  if (!verified) throw unverifiedAddress(email)
  return found
}

/** What an invitation says, and for which of their organisations the person can accept it. */
export async function openInvitationOf(
  dependencies: InvitationDependencies,
  services: Services,
  { userId }: SignedIn,
  token: string,
): Promise<OpenedInvitation> {
  const { database } = dependencies
  const found = await withPerson(database, userId, (tx) =>
    invitationFor(dependencies, tx, userId, { token, lock: false }),
  )
  const now = services.clock().toISOString()
  const own = found.kind === 'supplier' ? await membershipsOf(database, userId, now) : []
  return {
    ...found,
    invitedBy: found.inviter,
    state: invitationState(found, dayIn(found.timeZone, now)),
    choices: own.map(({ org_id: id, org_name: name, roles }) => ({
      ...{ id, name },
      hindrance: hindranceOf(found, id, roles.includes('admin')),
    })),
    acceptedFor: found.acceptedBy === userId ? found.acceptedFor : null,
  }
}

function hindranceOf(found: FoundInvitation, id: string, isAdmin: boolean): AcceptHindrance | null {
  if (id === found.orgId) return 'inviter-itself'
  if (found.supplying.includes(id)) return 'supplies-already'
  return isAdmin ? null : 'not-admin'
}

/** Refusals that somebody meets who holds no link, or not their own. */
const suspicious = ['invitation-unknown', 'invitation-for-another-address', 'address-not-verified']

/** Runs what a person does with a link, and writes refusals to the security log, without the token. */
export async function refusalsLogged<T>(
  { database }: InvitationDependencies,
  services: Services,
  { userId }: SignedIn,
  work: () => Promise<T>,
): Promise<T> {
  try {
    return await work()
  } catch (error) {
    if (error instanceof ProblemError && suspicious.includes(error.code))
      await logSecurityEvent(database, {
        kind: 'invitation-refused',
        at: services.clock().toISOString(),
        userId,
        detail: { problem: error.code },
      })
    throw error
  }
}
