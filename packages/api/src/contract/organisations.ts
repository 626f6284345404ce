import { z } from 'zod'
import {
  calendarDate,
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  roleSchema,
  sortBy,
  uuid,
} from './common'
import { roles } from './access'
import { defineEndpoint } from './define'

/** The roles of one member, in the order of the product. */
export const chosenRoles = z
  .array(roleSchema)
  .min(1, 'Choose at least one role; a reader sees everything and changes nothing.')
  .max(roles.length)
  .transform((chosen) => roles.filter((role) => chosen.includes(role)))

export const memberSchema = z.object({
  /** The person. */
  id: uuid,
  name: z.string(),
  email: z.string(),
  roles: z.array(roleSchema),
  createdAt: instant,
  /** Last day of the membership; null where it has no end. */
  endsOn: calendarDate.nullable(),
  /** Whether it has ended: the person can do nothing here any more, and stays named in the record. */
  ended: z.boolean(),
  rowVersion: z.number().int(),
})
export type Member = z.output<typeof memberSchema>

export const listMembers = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/members',
  access: 'members.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['name', 'email', 'createdAt', 'endsOn']),
    show: z.enum(['current', 'ended', 'all']).default('current'),
    role: roleSchema.optional(),
  }),
  response: pageOf(memberSchema),
  summary: 'Members of this organisation, searched by name and e-mail.',
})

export const changeMember = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/members/:userId',
  access: 'members.change',
  params: paramsWith('userId'),
  body: z.object({
    roles: chosenRoles,
    endsOn: calendarDate.nullable(),
    expectedVersion,
  }),
  response: memberSchema,
  summary: 'Sets the roles of a member and the last day; an admin without a last day must remain.',
})

export const endMember = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/members/:userId/end',
  access: 'members.change',
  params: paramsWith('userId'),
  body: z.object({ expectedVersion }),
  response: memberSchema,
  summary: 'Ends a membership at once; it can be given an end in the future, or none, again.',
})

const isTimeZone = (name: string): boolean => {
  try {
    // Offsets such as +01:00 would ignore summer time.
    return /^[A-Za-z]/.test(name) && Boolean(new Intl.DateTimeFormat('en', { timeZone: name }))
  } catch {
    return false
  }
}

/** An IANA time zone, whose calendar judges days. */
export const timeZone = z.string().max(60).refine(isTimeZone, 'Choose a time zone such as Europe/Berlin.')

/** What an organisation is called; its partners see it too. */
export const organisationName = line(120)

export const organisationSchema = z.object({
  id: uuid,
  name: z.string(),
  /** Calibrations and last days are judged by the calendar here. */
  timeZone: z.string(),
  createdAt: instant,
  rowVersion: z.number().int(),
})
export type OrganisationProfile = z.output<typeof organisationSchema>

export const readOrganisation = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId',
  access: 'organisation.read',
  params: organisationParams,
  response: organisationSchema,
  summary: 'Name and time zone of this organisation.',
})

export const changeOrganisation = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId',
  access: 'organisation.change',
  params: organisationParams,
  body: z.object({
    name: organisationName,
    timeZone,
    expectedVersion,
  }),
  response: organisationSchema,
  summary: 'Changes name and time zone of this organisation; its partners see the new name.',
})
