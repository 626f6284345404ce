import type { Role } from '@evenrule/api/contract'
import { formatCount, formatDate } from '../format'

/** What each role lets a person do. */
export const roleHints: Record<Role, string> = {
  'gauge-engineer': 'Supplier side: gauges, studies, submissions, answers to challenges.',
  'supplier-approver': 'Supplier side: signs criteria and submissions.',
  'quality-representative': 'Customer side: proposes criteria, reviews, accepts or challenges.',
  'customer-approver': 'Customer side: signs criteria and acceptances with conditions.',
  admin: 'Members, roles and the details of the organisation.',
  reader: 'Sees everything here and changes nothing. For auditors, with a last day.',
}

export const memberWords = {
  question: (organisation: string) => `Who may do what at ${organisation}?`,
  answer: (members: number, admins: number) =>
    `${formatCount(members, 'member')}, ${formatCount(admins, 'admin')} among them.`,
  notYours: 'Only an admin changes roles.',
  caption: 'Members',
  search: 'Search name or e-mail',
  name: 'Name',
  email: 'E-mail',
  roles: 'Roles',
  createdAt: 'Member since',
  access: 'Access',
  noEnd: 'no end',
  until: (day: string) => `until ${formatDate(day)}`,
  ended: (day: string) => `ended ${formatDate(day)}`,
  acts: 'Change',
  you: 'you',
  show: 'Show',
  shown: { current: 'current', ended: 'ended', all: 'all' },
  role: 'Role',
  anyRole: 'any',
  edit: 'Change',
  editNamed: (name: string) => `Change ${name}`,
  editTitle: (name: string) => `What may ${name} do?`,
  rolesLegend: 'Roles',
  rolesMissing: 'Choose at least one role; a reader sees everything and changes nothing.',
  endsOn: 'Last day',
  endsOnHint: 'Leave it empty for no end. The person stays named in the record.',
  save: 'Save roles',
  end: 'End at once',
  endNamed: (name: string) => `End at once: ${name}`,
  endTitle: (name: string) => `End the membership of ${name}?`,
  endText:
    'The very next request of this person is refused. What they signed and did stays in the record under their name. You can give the membership back.',
  emptyTitle: 'No member here',
  emptyText: 'No membership has ended so far.',
  organisation: 'Organisation',
  organisationName: 'Name',
  organisationNameHint: 'Your customers and suppliers see it too.',
  timeZone: 'Time zone',
  timeZoneHint: 'Days, such as when a calibration is due, are judged by the calendar here.',
  judged: (zone: string) => `Days are judged by the calendar of ${zone.replaceAll('_', ' ')}.`,
  editOrganisation: 'Change name or time zone',
  editOrganisationTitle: 'Change the organisation',
  saveOrganisation: 'Save changes',
} as const
