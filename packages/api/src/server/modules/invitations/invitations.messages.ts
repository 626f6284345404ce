import type { Role } from '../../../contract/access'
import type { InvitationKind } from '../../../contract/moves/invitation'
import { dayInWords } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectMember } from '../organisations/members.repository'
import type { FoundInvitation } from './invitations.token.repository'

/** Roles as a sentence names them. */
const roleNames: Record<Role, string> = {
  'gauge-engineer': 'gauge engineer',
  'supplier-approver': 'supplier approver',
  'quality-representative': 'quality representative',
  'customer-approver': 'customer approver',
  admin: 'organisation admin',
  reader: 'reader',
}
const rolesInWords = (roles: readonly Role[]): string => roles.map((role) => roleNames[role]).join(', ')
const until = (endsOn: string | null): string => (endsOn ? `, until ${dayInWords(endsOn)}` : '')

const paragraphs = (...parts: string[]): string => parts.filter((part) => part !== '').join('\n\n')

/** Tells the admins, the inviter among them, that somebody has joined. */
export async function tellOfMember(tenant: Tenant, { roles, endsOn, side }: FoundInvitation): Promise<void> {
  const member = await selectMember(tenant, tenant.userId)
  const name = member?.name ?? ''
  tenant.notify({
    organisationId: tenant.organisationId,
    side,
    roles: ['admin'],
    kind: 'invitation',
    subject: `${name} has joined`,
    body: `${name} has accepted the invitation and is a member now: ${rolesInWords(roles)}${until(endsOn)}.`,
    path: 'members',
  })
}

/** Tells the customer's admins, the inviter among them, that the supplier has accepted. */
export function tellOfSupplier(tenant: Tenant, found: FoundInvitation, supplier: string): void {
  const called = found.supplierName === supplier ? '' : `You invited it as ${found.supplierName ?? ''}.`
  tenant.notify({
    organisationId: found.orgId,
    side: 'customer',
    roles: ['admin'],
    kind: 'invitation',
    subject: `${supplier} is your supplier now`,
    body: paragraphs(
      `${supplier} has accepted your invitation. Your people can enter part numbers, agree criteria and ask for proof now.`,
      called,
    ),
    path: 'relationships',
  })
}

/** What the mail of an invitation is written from. */
export interface MailedInvitation {
  kind: InvitationKind
  organisation: string
  /** Null where the person may not be named any more. */
  inviter: string | null
  supplierName: string | null
  roles: readonly Role[]
  endsOn: string | null
  message: string
  email: string
  expiresOn: string
}

/** The mail of an invitation: who asks whom to do what, how, and until when. */
export function invitationMail(
  invitation: MailedInvitation,
  link: string,
): { subject: string; text: string } {
  const { kind, organisation, inviter, supplierName, roles, endsOn, message, email, expiresOn } = invitation
  const who = inviter ? `${inviter} of ${organisation}` : organisation
  const asked =
    kind === 'member'
      ? {
          subject: `Join ${organisation} in Evenrule`,
          asks: `${who} invites you to work in Evenrule as a member of ${organisation}: ${rolesInWords(roles)}${until(endsOn)}.`,
        }
      : {
          subject: `${organisation} invites you to Evenrule as a supplier`,
          asks: `${who} invites ${supplierName ?? 'your company'} to supply proof of its measuring systems in Evenrule: both sides agree the criteria beforehand, and read the same figures afterwards. You accept for your company; if it is not in Evenrule yet, you enter it on the way and become its admin.`,
        }
  const text = paragraphs(
    asked.asks,
    message === '' ? '' : `${inviter ?? organisation} writes:\n\n${quoted(message)}`,
    `Open this link and sign in as ${email}:`,
    link,
    `The link works once, until ${dayInWords(expiresOn)}, and only for ${email}. If you did not expect it, leave it: nothing happens without you.`,
  )
  return { subject: asked.subject, text: `${text}\n` }
}

/** Somebody's words set apart, so that nobody takes them for the product's. */
const quoted = (text: string): string =>
  text
    .split(/\r?\n/)
    .map((line) => `> ${line}`.trimEnd())
    .join('\n')
