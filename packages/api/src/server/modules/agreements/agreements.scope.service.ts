import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { selectCharacteristic, type ScopeOfCharacteristics } from '../parts/characteristics.repository'
import { selectPart } from '../parts/parts.repository'
import { selectRelationship, type RelationshipRow } from '../relationships/relationships.repository'

/**
 * The scope that a person chose, with its relationship: a characteristic brings its part along. Refused at its field
 * where this organisation does not have it on this side, where one does not belong to the other, or where it is
 * archived.
 */
export async function scopeAsEntered(
  tenant: Tenant,
  { relationshipId, partId, characteristicId }: ScopeOfCharacteristics,
): Promise<ScopeOfCharacteristics & { relationship: RelationshipRow }> {
  const relationship = await selectRelationship(tenant, relationshipId)
  if (!relationship)
    throw refused('relationshipId', 'Choose one of your customers or suppliers from the list.')
  if (characteristicId !== null) {
    const found = await selectCharacteristic(tenant, characteristicId)
    const fits =
      found?.characteristic.relationshipId === relationshipId && (partId ?? found.part.id) === found.part.id
    if (!found || !fits || found.characteristic.archivedAt || found.part.archivedAt)
      throw refused('characteristicId', 'Choose an active characteristic of this part from the list.')
    return { relationship, relationshipId, partId: found.part.id, characteristicId }
  }
  if (partId !== null) {
    const found = await selectPart(tenant, partId)
    if (found?.part.relationshipId !== relationshipId || found.part.archivedAt)
      throw refused('partId', 'Choose an active part number of this relationship from the list.')
  }
  return { relationship, relationshipId, partId, characteristicId }
}

const refused = (field: keyof ScopeOfCharacteristics, message: string) =>
  invalidInput([{ path: `body.${field}`, message }])
