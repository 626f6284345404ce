import { dayInWords } from '../../calendar'
import { alreadyTaken } from '../../db/unique'
import { defineError, type ProblemError } from '../../errors'

export const unknownInvitation = defineError(
  'invitation-unknown',
  404,
  'There is no invitation for this link. It may have been cut short, or a newer mail has replaced it: open the link of the newest mail, or ask whoever invited you to send it again.',
)
export const anotherAddress = defineError(
  'invitation-for-another-address',
  403,
  (invited: string, own: string) =>
    `This invitation was sent to ${invited}, and you are signed in as ${own}. Sign in with the address that was invited, or ask whoever invited you to invite ${own}. The invitation stays good.`,
)
export const unverifiedAddress = defineError(
  'address-not-verified',
  403,
  (own: string) =>
    `Your sign-in has not confirmed yet that ${own} is yours. Confirm the address where you have your sign-in (it sends a mail for that), sign out here, sign in again and open the invitation once more. The invitation stays good.`,
)
export const expiredInvitation = defineError(
  'invitation-expired',
  409,
  (organisation: string, expiresOn: string) =>
    `This invitation was good until ${dayInWords(expiresOn)}. Ask an admin of ${organisation} to send it again.`,
)
export const revokedInvitation = defineError(
  'invitation-revoked',
  409,
  (organisation: string) =>
    `${organisation} has revoked this invitation. Ask an admin there if that was not meant.`,
)
export const usedInvitation = defineError(
  'invitation-used',
  409,
  'This invitation was accepted already, perhaps in another window. It can be used once; go to the front page, or ask for a new one.',
)
export const memberAlready = defineError(
  'member-already',
  409,
  (organisation: string) =>
    `You are a member of ${organisation} already. Ask an admin there to change your roles; the invitation was not used.`,
)
export const supplierItself = defineError(
  'supplier-itself',
  409,
  (organisation: string) =>
    `${organisation} sent this invitation and cannot be its own supplier. Accept it for another organisation.`,
)
export const suppliesAlready = defineError(
  'supplies-already',
  409,
  (supplier: string, customer: string) =>
    `${supplier} supplies ${customer} here already. Accept the invitation for another organisation, or leave it.`,
)
export const lastDayOver = defineError(
  'last-day-over',
  409,
  (endsOn: string) =>
    `The membership offered would end on ${dayInWords(endsOn)}, which is over. Revoke this invitation and send one with a later day.`,
)

const atEmail = (message: string) => ({ path: 'body.email', message })

export const ownMember = (): ProblemError =>
  alreadyTaken(atEmail('This is your own address, and you are a member. Enter the address of somebody else.'))
export const ownSupplier = (): ProblemError =>
  alreadyTaken(
    atEmail(
      'This is your own address, and an organisation cannot be its own supplier. Enter the address of somebody at the supplier.',
    ),
  )
export const isMember = (name: string): ProblemError =>
  alreadyTaken(atEmail(`${name} is a member with this address. Change the roles in the list of members.`))

/** What the database refuses when two invitations of one kind to one address would be open. */
export const openAlready = {
  invitations_open: atEmail(
    'This address is invited already. Send that invitation again from the list below, or revoke it first.',
  ),
}
