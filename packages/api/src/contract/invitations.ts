import { z } from 'zod'
import type { Permission } from './access'
import {
  calendarDate,
  emailAddress,
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paragraph,
  roleSchema,
  sideSchema,
  sortBy,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import { invitationKinds, invitationStates } from './moves/invitation'
import { chosenRoles, organisationName, timeZone } from './organisations'

const kind = z.enum(invitationKinds)

export const invitationSchema = z.object({
  id: uuid,
  kind,
  email: z.string(),
  /** The supplier as the customer calls it, and the number under which it is kept; null for a member. */
  supplierName: z.string().nullable(),
  supplierNumber: z.string().nullable(),
  /** What the member will be, and until when; empty for a supplier. */
  roles: z.array(roleSchema),
  endsOn: calendarDate.nullable(),
  message: z.string(),
  state: z.enum(invitationStates),
  createdAt: instant,
  /** When it was sent last, and the last day on which it can be accepted, by the calendar of who sent it. */
  sentAt: instant,
  expiresOn: calendarDate,
  /** Null where the person may not be named any more. */
  invitedBy: z.string().nullable(),
  acceptedAt: instant.nullable(),
  acceptedBy: z.string().nullable(),
  revokedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type Invitation = z.output<typeof invitationSchema>

export const invitationSorts = ['createdAt', 'email', 'expiresOn'] as const

const listQuery = pageQuery.extend({
  sort: sortBy(invitationSorts, '-createdAt'),
  state: z.enum(invitationStates).optional(),
})
const message = paragraph(1000).default('')

const member = { read: 'invitations.read', act: 'members.invite' } as const satisfies Record<
  string,
  Permission
>
const supplier = { read: 'supplier-invitations.read', act: 'suppliers.invite' } as const satisfies Record<
  string,
  Permission
>
const memberPath = '/organisations/:organisationId/invitations'
const supplierPath = '/organisations/:organisationId/supplier-invitations'
const memberParams = organisationParams.extend({ invitationId: uuid })
const supplierParams = organisationParams.extend({ supplierInvitationId: uuid })

export const listInvitations = defineEndpoint({
  method: 'get',
  path: memberPath,
  access: member.read,
  params: organisationParams,
  query: listQuery,
  response: pageOf(invitationSchema),
  summary: 'Invitations of members, the newest first, searched by e-mail.',
})

export const inviteMember = defineEndpoint({
  method: 'post',
  path: memberPath,
  access: member.act,
  params: organisationParams,
  body: z.object({
    email: emailAddress,
    roles: chosenRoles,
    /** Last day of the membership, as for an outside auditor. */
    endsOn: calendarDate.nullable().default(null),
    message,
  }),
  response: invitationSchema,
  summary: 'Invites a person by e-mail to be a member; the link leads to the app it was sent from.',
})

export const resendInvitation = defineEndpoint({
  method: 'post',
  path: `${memberPath}/:invitationId/resend`,
  access: member.act,
  params: memberParams,
  body: z.object({ expectedVersion }),
  response: invitationSchema,
  summary: 'Sends an invitation of a member again with a new link; the old link is dead.',
})

export const revokeInvitation = defineEndpoint({
  method: 'post',
  path: `${memberPath}/:invitationId/revoke`,
  access: member.act,
  params: memberParams,
  body: z.object({ expectedVersion }),
  response: invitationSchema,
  summary: 'Revokes an invitation of a member; its link is dead.',
})

export const listSupplierInvitations = defineEndpoint({
  method: 'get',
  path: supplierPath,
  access: supplier.read,
  params: organisationParams,
  query: listQuery,
  response: pageOf(invitationSchema),
  summary: 'Invitations of suppliers, the newest first, searched by e-mail and name.',
})

export const inviteSupplier = defineEndpoint({
  method: 'post',
  path: supplierPath,
  access: supplier.act,
  params: organisationParams,
  body: z.object({
    email: emailAddress,
    supplierName: organisationName,
    supplierNumber: line(60).nullable().default(null),
    message,
  }),
  response: invitationSchema,
  summary: 'Invites a company by e-mail to supply this organisation; the link leads to the supplier app.',
})

export const resendSupplierInvitation = defineEndpoint({
  method: 'post',
  path: `${supplierPath}/:supplierInvitationId/resend`,
  access: supplier.act,
  params: supplierParams,
  body: z.object({ expectedVersion }),
  response: invitationSchema,
  summary: 'Sends an invitation of a supplier again with a new link; the old link is dead.',
})

export const revokeSupplierInvitation = defineEndpoint({
  method: 'post',
  path: `${supplierPath}/:supplierInvitationId/revoke`,
  access: supplier.act,
  params: supplierParams,
  body: z.object({ expectedVersion }),
  response: invitationSchema,
  summary: 'Revokes an invitation of a supplier; its link is dead.',
})

/** The secret of the link, posted from its fragment: never part of an address that anybody logs. */
const token = z.string().trim().max(200)

/** Why an organisation of the person cannot accept. */
export const acceptHindrances = ['not-admin', 'inviter-itself', 'supplies-already'] as const
export type AcceptHindrance = (typeof acceptHindrances)[number]

export const openedInvitationSchema = z.object({
  kind,
  state: z.enum(invitationStates),
  /** The app in which the work will be. */
  side: sideSchema,
  organisation: z.string(),
  /** Null where the person may not be named any more. */
  invitedBy: z.string().nullable(),
  supplierName: z.string().nullable(),
  supplierNumber: z.string().nullable(),
  roles: z.array(roleSchema),
  endsOn: calendarDate.nullable(),
  message: z.string(),
  expiresOn: calendarDate,
  /** For which of the person's organisations a supplier's invitation can be accepted; empty for a member's. */
  choices: z.array(z.object({ id: uuid, name: z.string(), hindrance: z.enum(acceptHindrances).nullable() })),
  /** Where it led, once the person has accepted it; null otherwise. */
  acceptedFor: uuid.nullable(),
})
export type OpenedInvitation = z.output<typeof openedInvitationSchema>

export const openInvitation = defineEndpoint({
  method: 'post',
  path: '/invitations/open',
  access: 'signed-in',
  body: z.object({ token }),
  response: openedInvitationSchema,
  summary: 'What an invitation says, to the person it was sent to; changes nothing.',
})

export const acceptInvitation = defineEndpoint({
  method: 'post',
  path: '/invitations/accept',
  access: 'signed-in',
  body: z
    .object({
      token,
      /** The organisation that accepts a supplier's invitation, or what is founded to accept it. */
      organisationId: uuid.optional(),
      newOrganisation: z.object({ name: organisationName, timeZone, site: line(80) }).optional(),
    })
    .refine(({ organisationId, newOrganisation }) => !organisationId || !newOrganisation, {
      path: ['organisationId'],
      message: 'Choose one of your organisations, or enter a new one; not both.',
    }),
  response: z.object({
    organisationId: uuid,
    side: sideSchema,
    /** The business relationship that has begun; null for a member. */
    relationshipId: uuid.nullable(),
  }),
  summary: 'Accepts an invitation in the name of the person signed in; it can be used once.',
})
