import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { characteristics, partRevisions, parts } from './parts.table'

export type CharacteristicRow = typeof characteristics.$inferSelect

/** Rows of the relationships in which this organisation stands on the side it acts on. */
export const ownCharacteristics = (tenant: Tenant) =>
  eq(
    tenant.side === 'supplier' ? characteristics.supplierOrgId : characteristics.customerOrgId,
    tenant.organisationId,
  )

/** A characteristic with the names of what it belongs to. */
export interface CharacteristicInPart {
  characteristic: CharacteristicRow
  part: typeof parts.$inferSelect
  revision: typeof partRevisions.$inferSelect
}

export async function selectCharacteristic(
  tenant: Tenant,
  characteristicId: string,
): Promise<CharacteristicInPart | undefined> {
  const [row] = await tenant.tx
    .select({ characteristic: characteristics, part: parts, revision: partRevisions })
    .from(characteristics)
    .innerJoin(
      parts,
      and(eq(parts.relationshipId, characteristics.relationshipId), eq(parts.id, characteristics.partId)),
    )
    .innerJoin(
      partRevisions,
      and(
        eq(partRevisions.relationshipId, characteristics.relationshipId),
        eq(partRevisions.id, characteristics.revisionId),
      ),
    )
    .where(and(ownCharacteristics(tenant), eq(characteristics.id, characteristicId)))
  return row
}
