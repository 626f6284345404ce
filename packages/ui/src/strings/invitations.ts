import type { InvitationKind, InvitationState, invitations, Role, Side } from '@evenrule/api/contract'
import { formatDate, inSentence } from '../format'
import { roleWords } from './roles'
import { appNames } from './session'

/** Words of the list of invitations, and of the dialogs that send them. */
export const invitationWords = {
  heading: { member: 'Invitations', supplier: 'Invitations' } satisfies Record<InvitationKind, string>,
  caption: { member: 'Invitations of members', supplier: 'Invitations of suppliers' },
  search: { member: 'Search e-mail', supplier: 'Search name or e-mail' },
  invite: { member: 'Invite a member', supplier: 'Invite a supplier' },
  who: { member: 'E-mail', supplier: 'Supplier' },
  as: { member: 'As', supplier: 'Supplier number' },
  state: 'Where it stands',
  sent: 'Sent',
  sentBy: (day: string, by: string | null) => (by ? `${formatDate(day)} by ${by}` : formatDate(day)),
  acts: 'Change',
  show: 'Show',
  any: 'any',
  none: 'none',
  nothing: 'nothing to do',
  resend: 'Send again',
  resendNamed: (email: string) => `Send again: ${email}`,
  resendTitle: (email: string) => `Send the invitation to ${email} again?`,
  resendText: 'A new mail goes out with a new link, good for 14 days. The old link stops working.',
  revoke: 'Revoke',
  revokeNamed: (email: string) => `Revoke: ${email}`,
  revokeTitle: (email: string) => `Revoke the invitation to ${email}?`,
  revokeText: 'Its link stops working at once. You can invite the address anew.',
  emptyTitle: 'No invitation yet',
  emptyText: {
    member: 'An admin invites people by e-mail; until they accept, the invitations are listed here.',
    supplier: 'An admin invites suppliers by e-mail; until they accept, the invitations are listed here.',
  },
  email: 'E-mail',
  memberEmailHint: 'The invitation can be accepted only by who signs in with this address.',
  supplierEmailHint: 'Of somebody at the supplier who may accept for it, such as its quality manager.',
  supplierName: 'Supplier',
  supplierNameHint: 'As you call it. The supplier enters its own name when it accepts.',
  supplierNumber: 'Supplier number',
  supplierNumberHint: 'The number under which you keep it, where you have one.',
  message: 'Message',
  messageHint: 'Stands in the mail, under your name.',
  endsOnHint: 'For an outside auditor. Leave it empty for no end.',
  send: 'Send the invitation',
  memberTitle: 'Whom do you invite as a member?',
  supplierTitle: 'Which supplier do you invite?',
} as const

export const invitationStateWords: Record<InvitationState, string> = {
  pending: 'pending',
  accepted: 'accepted',
  expired: 'expired',
  revoked: 'revoked',
}

/** Where an invitation stands, with its day. */
export function invitationStanding({
  state,
  ...row
}: Pick<invitations.Invitation, 'state' | 'expiresOn' | 'acceptedAt' | 'acceptedBy' | 'revokedAt'>): string {
  if (state === 'pending') return `pending, until ${formatDate(row.expiresOn)}`
  if (state === 'expired') return `expired, was good until ${formatDate(row.expiresOn)}`
  if (state === 'revoked') return `revoked ${formatDate(row.revokedAt ?? '')}`
  const by = row.acceptedBy ? ` by ${row.acceptedBy}` : ''
  return `accepted ${formatDate(row.acceptedAt ?? '')}${by}`
}

/** Roles, and the last day, as a sentence holds them. */
export const offeredRoles = (roles: readonly Role[], endsOn: string | null): string =>
  `${roles.map((role) => inSentence(roleWords[role])).join(', ')}${endsOn ? `, until ${formatDate(endsOn)}` : ''}`

/** Words of the page that a link leads to. */
export const openInvitationWords = {
  enterQuestion: 'Have you been invited?',
  enterAnswer: 'Open the link of the mail, or paste it here.',
  link: 'Link of the invitation',
  linkHint: 'The whole address from the mail, or the characters behind its # sign.',
  linkWrong:
    'This is no link of an invitation. Copy it whole from the newest mail; it ends with # and 43 characters.',
  open: 'Open the invitation',
  strangerQuestion: 'Whom is this invitation for?',
  strangerAnswer:
    'For the address it was sent to. Sign in with that address; then you read what it says, before you accept anything.',
  signIn: 'Sign in and read it',
  firstTime:
    'Is it your first time here? The sign-in page lets you in by your address; nothing else is needed before.',
  memberQuestion: (organisation: string) => `Will you join ${organisation}?`,
  supplierQuestion: (organisation: string) => `Will you supply ${organisation} in Evenrule?`,
  asks: (inviter: string | null, organisation: string) =>
    inviter ? `${inviter} of ${organisation}` : organisation,
  asMember: 'invites you as',
  asSupplier: 'invites you to accept for',
  yourCompany: 'your company',
  until: (day: string) => `You can accept until the end of ${formatDate(day)}.`,
  writes: 'They write:',
  number: (number: string) => `You are kept there as supplier ${number}.`,
  what: 'Both sides agree beforehand which criteria a measuring system must meet; you plan, measure and submit, and both read the same figures. Accepting begins the business relationship and agrees to no criteria yet.',
  acceptFor: 'Which organisation accepts?',
  newOrganisation: 'A new organisation',
  newHint: 'You enter it here and become its admin.',
  choose: 'Choose the organisation that accepts.',
  name: 'Name of the organisation',
  nameHint: 'Your customers see it. You can change it later.',
  nameMissing: 'Enter the name of the organisation.',
  timeZone: 'Time zone',
  timeZoneHint: 'Days, such as when a calibration is due, are judged by the calendar here.',
  site: 'First site',
  siteHint: 'Where you measure, such as Hall 2 or Measuring room. More can follow.',
  siteMissing: 'Enter one place where you measure.',
  accept: { member: 'Accept and join', supplier: 'Accept and begin' } satisfies Record<
    InvitationKind,
    string
  >,
  signedInAs: (email: string) => `You are signed in as ${email}.`,
  another: 'Use another account',
  anotherLink: 'Enter another link',
  front: 'Go to the front page',
  goOn: 'Go to your organisation',
} as const

/** Why an organisation of one's own cannot accept. */
export const hindranceWords: Record<invitations.AcceptHindrance, string> = {
  'not-admin': 'only an admin of it can accept',
  'inviter-itself': 'it sent the invitation',
  'supplies-already': 'it supplies this customer already',
}

/** What is asked above an invitation that cannot be accepted, and the answer. */
export const overWords: Record<
  Exclude<InvitationState, 'pending'>,
  { question: string; answer: (organisation: string, day: string) => string }
> = {
  accepted: {
    question: 'Have you accepted this invitation?',
    answer: (organisation) => `Yes. You work with ${organisation} here now.`,
  },
  expired: {
    question: 'Can this invitation still be accepted?',
    answer: (organisation, day) =>
      `No, it was good until ${formatDate(day)}. Ask an admin of ${organisation} to send it again.`,
  },
  revoked: {
    question: 'Can this invitation still be accepted?',
    answer: (organisation) => `No, ${organisation} has revoked it. Ask an admin there if that was not meant.`,
  },
}

/** Questions above what kept an invitation closed, by the code of the problem. */
export const closedQuestions: Record<string, string> = {
  'invitation-unknown': 'Is this the newest link?',
  'invitation-for-another-address': 'Is this invitation for you?',
  'address-not-verified': 'Is this address yours?',
  'invitation-used': 'Was this invitation used already?',
}

/** For a person who belongs to no organisation, or to none any more. */
export const noOrganisationWords = {
  question: 'Which organisation do you work for?',
  none: 'You belong to no organisation yet.',
  ended: (name: string, day: string) => `Your membership of ${name} ended on ${formatDate(day)}.`,
  what: 'Everything here belongs to an organisation: a supplier or a customer. There are two ways in, and both need an invitation by e-mail.',
  ways: {
    supplier: [
      'Your organisation works here already: ask one of its admins to invite you as a member.',
      'Your customer works here: ask them to invite your company as a supplier. Whoever accepts enters the company and becomes its admin.',
    ],
    customer: [
      'Your organisation works here already: ask one of its admins to invite you as a member.',
      'You make parts for somebody who works here: ask them to invite your company as a supplier.',
    ],
  } satisfies Record<Side, readonly string[]>,
  address: 'Have the invitation sent to the address you are signed in with:',
  paste: 'Do you have an invitation?',
  reload: 'Look again',
  elsewhere: (names: string, side: Side) => `${names}: the work is in the ${appNames[side].toLowerCase()}.`,
  open: (side: Side) => `Open the ${appNames[side].toLowerCase()}`,
  enter: (name: string) => `Go to ${name}`,
  firstSupplier: (name: string) => `Does ${name} buy parts too? Invite its first supplier`,
} as const
