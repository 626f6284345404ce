import type { Role, Side } from '../../contract/access'
import type { OrganisationKey } from './scenario.organisations'

interface Invited {
  by: OrganisationKey
  email: string
  daysAgo: number
  message: string
}

/** Suppliers that were asked in and have not accepted: the person of the first can sign in, the second ran out. */
export const invitedSuppliers: (Invited & { supplierName: string; supplierNumber: string | null })[] = [
  {
    by: 'brackwell',
    email: 'orla.thane@dunmere.example',
    supplierName: 'Dunmere Gears',
    supplierNumber: 'B-40415',
    daysAgo: 2,
    message:
      'From the spring you make a pinion for us. Please take the proof of your gauges through Evenrule; our criteria are waiting there.',
  },
  {
    by: 'brackwell',
    email: 'quality@halden-forge.example',
    supplierName: 'Halden Forge',
    supplierNumber: null,
    daysAgo: 40,
    message: '',
  },
]

/** A person without an organisation who was asked to look in from outside; `lastDay` days after the seeding. */
export const invitedMembers: (Invited & { side: Side; roles: Role[]; lastDay: number })[] = [
  {
    by: 'brackwell',
    side: 'customer',
    email: 'wren.idle@idle.example',
    roles: ['reader'],
    lastDay: 60,
    daysAgo: 1,
    message: 'For the audit of our supplier approvals.',
  },
]
