import type { Role } from '../../contract/access'

/**
 * The demonstration's organisations and people. Everything here is invented. `subject` is the person's name at
 * the local sign-in provider (fakes/oidc/people.json).
 */
export interface DemoPerson {
  subject: string
  name: string
  email: string
}
export interface DemoOrganisation {
  key: OrganisationKey
  name: string
  timeZone: string
  sites: string[]
  members: { person: DemoPerson; roles: Role[] }[]
}
export type OrganisationKey = 'brackwell' | 'norvane' | 'tarnfield' | 'osmere' | 'velloy' | 'quillmark'

const person = (name: string, organisation: string): DemoPerson => {
  const handle = name.toLowerCase().replace(' ', '-')
  return { subject: `demo-${handle}`, name, email: `${handle.replace('-', '.')}@${organisation}.example` }
}

export const organisations: DemoOrganisation[] = [
  {
    key: 'brackwell',
    name: 'Brackwell Drivelines',
    timeZone: 'Europe/Berlin',
    sites: ['Incoming inspection'],
    members: [
      { person: person('Mara Lindqvist', 'brackwell'), roles: ['quality-representative'] },
      { person: person('Joren Vask', 'brackwell'), roles: ['customer-approver'] },
      { person: person('Adaeze Holm', 'brackwell'), roles: ['admin'] },
      { person: person('Sanna Reve', 'brackwell'), roles: ['quality-representative', 'customer-approver'] },
    ],
  },
  {
    key: 'norvane',
    name: 'Norvane Mobility',
    timeZone: 'Europe/Berlin',
    sites: ['Plant 2'],
    members: [
      { person: person('Leo Sandmark', 'norvane'), roles: ['quality-representative', 'admin'] },
      { person: person('Birte Ahl', 'norvane'), roles: ['customer-approver'] },
    ],
  },
  {
    key: 'tarnfield',
    name: 'Tarnfield Turned Parts',
    timeZone: 'Europe/Berlin',
    sites: ['Turning shop', 'Grinding shop', 'Measuring room'],
    members: [
      { person: person('Ines Calder', 'tarnfield'), roles: ['gauge-engineer'] },
      { person: person('Tomas Brandl', 'tarnfield'), roles: ['supplier-approver'] },
      { person: person('Ruth Okafor', 'tarnfield'), roles: ['admin'] },
      { person: person('Piet Maas', 'tarnfield'), roles: ['reader'] },
    ],
  },
  {
    key: 'osmere',
    name: 'Osmere Castings',
    timeZone: 'Europe/Berlin',
    sites: ['Machining line 1', 'Machining line 2'],
    members: [
      { person: person('Kofi Brandt', 'osmere'), roles: ['gauge-engineer', 'admin'] },
      {
        person: person('Elin Tor', 'osmere'),
        roles: ['supplier-approver', 'quality-representative', 'customer-approver'],
      },
    ],
  },
  {
    key: 'velloy',
    name: 'Velloy Springs',
    timeZone: 'Europe/Berlin',
    sites: ['Coiling', 'Testing'],
    members: [
      { person: person('Nadia Ferro', 'velloy'), roles: ['gauge-engineer', 'supplier-approver', 'admin'] },
      { person: person('Ulf Rask', 'velloy'), roles: ['supplier-approver'] },
    ],
  },
  {
    key: 'quillmark',
    name: 'Quillmark Tools',
    timeZone: 'Europe/Berlin',
    sites: [],
    members: [{ person: person('Ada Pell', 'quillmark'), roles: ['admin', 'gauge-engineer'] }],
  },
]

export const relationships: {
  supplier: OrganisationKey
  customer: OrganisationKey
  supplierNumber: string
}[] = [
  { supplier: 'tarnfield', customer: 'brackwell', supplierNumber: 'B-40112' },
  { supplier: 'osmere', customer: 'brackwell', supplierNumber: 'B-40230' },
  { supplier: 'velloy', customer: 'brackwell', supplierNumber: 'B-40377' },
  { supplier: 'tarnfield', customer: 'norvane', supplierNumber: 'NM 2207' },
  { supplier: 'velloy', customer: 'norvane', supplierNumber: 'NM 2241' },
  { supplier: 'tarnfield', customer: 'osmere', supplierNumber: '7001' },
]
