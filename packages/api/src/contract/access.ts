/** Which side of a relationship a person acts on; it follows from the app they use. */
export const sides = ['supplier', 'customer'] as const
export type Side = (typeof sides)[number]
export const otherSide = (side: Side): Side => (side === 'supplier' ? 'customer' : 'supplier')

/** Roles are a set per member. */
export const roles = [
  'gauge-engineer',
  'supplier-approver',
  'quality-representative',
  'customer-approver',
  'admin',
  'reader',
] as const
export type Role = (typeof roles)[number]

interface Rule {
  sides: readonly Side[]
  /** Any one of these is enough. */
  roles: readonly Role[]
}

const both = sides
const everybody = roles
const supplierWorkers = ['gauge-engineer', 'supplier-approver'] as const
const customerWorkers = ['quality-representative', 'customer-approver'] as const
const workers = [...supplierWorkers, ...customerWorkers, 'admin'] as const

/**
 * Every named authorisation and who holds it. A route names one; the server checks it before anything else,
 * the apps read it to offer only what is possible.
 */
export const permissions = {
  'organisation.read': { sides: both, roles: everybody },
  'organisation.change': { sides: both, roles: ['admin'] },
  'members.read': { sides: both, roles: everybody },
  'members.change': { sides: both, roles: ['admin'] },
  'members.invite': { sides: both, roles: ['admin'] },
  'invitations.read': { sides: both, roles: everybody },
  'relationships.read': { sides: both, roles: everybody },
  'suppliers.invite': { sides: ['customer'], roles: ['admin'] },
  'supplier-invitations.read': { sides: ['customer'], roles: everybody },
  'messages.read': { sides: both, roles: everybody },
  'front.read': { sides: both, roles: everybody },
  'parts.read': { sides: both, roles: everybody },
  'parts.change': { sides: both, roles: workers },
  'parts.confirm': { sides: ['customer'], roles: [...customerWorkers, 'admin'] },
  'gauges.read': { sides: ['supplier'], roles: everybody },
  'gauges.change': { sides: ['supplier'], roles: [...supplierWorkers, 'admin'] },
  'tasks.read': { sides: both, roles: everybody },
  'tasks.change': { sides: ['supplier'], roles: [...supplierWorkers, 'admin'] },
  'files.read': { sides: both, roles: everybody },
  'files.change': { sides: ['supplier'], roles: [...supplierWorkers, 'admin'] },
  'house-terms.read': { sides: both, roles: everybody },
  'house-terms.change': { sides: ['customer'], roles: customerWorkers },
  'agreements.read': { sides: both, roles: everybody },
  'agreements.propose': { sides: both, roles: [...supplierWorkers, ...customerWorkers] },
  'agreements.sign': { sides: both, roles: ['supplier-approver', 'customer-approver'] },
  'studies.read': { sides: ['supplier'], roles: everybody },
  'studies.change': { sides: ['supplier'], roles: supplierWorkers },
  'submissions.read': { sides: both, roles: everybody },
  'submissions.prepare': { sides: ['supplier'], roles: supplierWorkers },
  'submissions.sign': { sides: ['supplier'], roles: ['supplier-approver'] },
  'reviews.decide': { sides: ['customer'], roles: customerWorkers },
  'reviews.approve': { sides: ['customer'], roles: ['customer-approver'] },
  'reviews.answer': { sides: ['supplier'], roles: supplierWorkers },
  'requests.read': { sides: both, roles: everybody },
  'requests.ask': { sides: ['customer'], roles: customerWorkers },
  'conditions.report': { sides: both, roles: [...supplierWorkers, ...customerWorkers] },
  'imports.read': { sides: both, roles: everybody },
  'attachments.add': { sides: both, roles: [...supplierWorkers, ...customerWorkers] },
  'record.read': { sides: both, roles: everybody },
  'evaluate.run': { sides: both, roles: everybody },
} as const satisfies Record<string, Rule>

export type Permission = keyof typeof permissions

/** Approving takes the approver's role of the side one acts on, never the other side's. */
const rolesOfSide: Record<Side, readonly Role[]> = {
  supplier: ['gauge-engineer', 'supplier-approver', 'admin', 'reader'],
  customer: ['quality-representative', 'customer-approver', 'admin', 'reader'],
}

/** Whether somebody with these roles, acting on this side, holds the permission. */
export function allows(permission: Permission, side: Side, held: readonly Role[]): boolean {
  const rule: Rule = permissions[permission]
  if (!rule.sides.includes(side)) return false
  return held.some(
    (role) => rule.roles.includes(role) && (rolesOfSide[side].includes(role) || isRead(permission)),
  )
}

const isRead = (permission: Permission): boolean => permission.endsWith('.read')
