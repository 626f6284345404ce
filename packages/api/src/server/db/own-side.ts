import { eq, type AnyColumn, type SQL } from 'drizzle-orm'
import type { Tenant } from './tenant'

/**
 * Rows of the relationships in which this organisation stands on the side it acts on. Row security lets both parties
 * see them; an organisation that supplies and buys must not meet in one app what belongs to the other.
 */
export const ownSide = (
  { side, organisationId }: Pick<Tenant, 'side' | 'organisationId'>,
  table: { supplierOrgId: AnyColumn; customerOrgId: AnyColumn },
): SQL => eq(side === 'supplier' ? table.supplierOrgId : table.customerOrgId, organisationId)
