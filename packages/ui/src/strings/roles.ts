import type { Role } from '@evenrule/api/contract'
import type { Side } from '../theme/tokens'

export const roleWords: Record<Role, string> = {
  'gauge-engineer': 'Gauge engineer',
  'supplier-approver': 'Supplier approver',
  'quality-representative': 'Quality representative',
  'customer-approver': 'Customer approver',
  admin: 'Organisation admin',
  reader: 'Reader',
}

export const sideWords: Record<Side, string> = { supplier: 'Supplier', customer: 'Customer' }
