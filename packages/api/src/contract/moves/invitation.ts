import type { Permission } from '../access'
import type { Move } from './define'

/** Whom an invitation asks in: a person as a member, or a company as a supplier. */
export const invitationKinds = ['member', 'supplier'] as const
export type InvitationKind = (typeof invitationKinds)[number]

export const invitationStates = ['pending', 'accepted', 'expired', 'revoked'] as const
export type InvitationState = (typeof invitationStates)[number]

/** Calendar days that an invitation is good for after the day on which it was sent. */
export const invitationDays = 14

export type InvitationPrecondition =
  /** The address is not the inviter's own, nor that of a member. */
  | 'not-oneself'
  | 'not-a-member'
  /** No other invitation of its kind to the address is open. */
  | 'not-invited-already'
  /** The last day of the membership offered is not over. */
  | 'last-day-to-come'
  /** The person is signed in with the address that was invited, and the provider has verified it. */
  | 'address-proved'
  /** The person is an admin of the organisation that accepts, or founds it with the acceptance. */
  | 'administers'
  /** The organisation that accepts is another than the one that invites, and does not supply it yet. */
  | 'another-organisation'
  | 'no-relationship-yet'

export interface InvitationMove extends Omit<
  Move<InvitationState, InvitationPrecondition>,
  'side' | 'permission'
> {
  name: 'invite' | 'resend' | 'revoke' | 'accept'
  kind: InvitationKind
  /**
   * What the inviter must hold, which says the side too, or who accepts for an organisation; null for a person who joins
   * one and holds no role in it yet.
   */
  permission: Permission | null
}

const inviter = {
  member: { kind: 'member', permission: 'members.invite' },
  supplier: { kind: 'supplier', permission: 'suppliers.invite' },
} as const

/** The acts of an inviter, the same for both kinds but for who may. */
const actsOf = (kind: InvitationKind): InvitationMove[] => [
  {
    name: 'resend',
    from: ['pending', 'expired'],
    to: 'pending',
    ...inviter[kind],
    preconditions: kind === 'member' ? ['last-day-to-come'] : [],
    event: 'invitation.sent-again',
    words: 'Send again',
  },
  {
    name: 'revoke',
    from: ['pending', 'expired'],
    to: 'revoked',
    ...inviter[kind],
    preconditions: [],
    event: 'invitation.revoked',
    words: 'Revoke',
  },
]

/**
 * The life of an invitation. That it was accepted or revoked is stored; that it has expired follows from its last day
 * and the calendar of the organisation that sent it.
 */
export const invitationMoves: readonly InvitationMove[] = [
  {
    name: 'invite',
    from: [],
    to: 'pending',
    ...inviter.member,
    preconditions: ['not-oneself', 'not-a-member', 'not-invited-already', 'last-day-to-come'],
    event: 'invitation.sent',
    words: 'Send the invitation',
  },
  {
    name: 'invite',
    from: [],
    to: 'pending',
    ...inviter.supplier,
    preconditions: ['not-oneself', 'not-invited-already'],
    event: 'invitation.sent',
    words: 'Send the invitation',
  },
  ...actsOf('member'),
  ...actsOf('supplier'),
  {
    name: 'accept',
    from: ['pending'],
    to: 'accepted',
    kind: 'member',
    permission: null,
    preconditions: ['address-proved', 'not-a-member'],
    event: 'member.joined',
    words: 'Accept',
  },
  {
    name: 'accept',
    from: ['pending'],
    to: 'accepted',
    kind: 'supplier',
    permission: 'organisation.change',
    preconditions: ['address-proved', 'administers', 'another-organisation', 'no-relationship-yet'],
    event: 'relationship.begun',
    words: 'Accept',
  },
]

/** The move of that name; undefined where the state does not allow it. */
export const invitationMove = (
  name: InvitationMove['name'],
  kind: InvitationKind,
  state: InvitationState | null,
): InvitationMove | undefined =>
  invitationMoves.find(
    (move) =>
      move.name === name &&
      move.kind === kind &&
      (state === null ? move.from.length === 0 : move.from.includes(state)),
  )

/** Where an invitation stands on a calendar day of the organisation that sent it. */
export function invitationState(
  {
    acceptedAt,
    revokedAt,
    expiresOn,
  }: { acceptedAt: string | null; revokedAt: string | null; expiresOn: string },
  today: string,
): InvitationState {
  if (acceptedAt !== null) return 'accepted'
  if (revokedAt !== null) return 'revoked'
  return today > expiresOn ? 'expired' : 'pending'
}
