import { createCharacteristic, confirmCharacteristic } from '../../contract/characteristics'
import { createPart } from '../../contract/parts'
import { memberWith, type Base, type SeededRelationship } from './base'
import type { DemoCharacteristic } from './scenario.parts'
import { parts, unconfirmed } from './scenario.parts'
import type { OrganisationKey } from './scenario.organisations'
import type { Stage } from './stage'

export interface SeededCharacteristic {
  id: string
  partId: string
  partNumber: string
  number: number
  relationship: SeededRelationship
  limits: DemoCharacteristic
}

/** Characteristics by `part number/drawing number`. */
export type SeededCharacteristics = ReadonlyMap<string, SeededCharacteristic>

export const characteristicKey = (partNumber: string, number: number): string => `${partNumber}/${number}`

export function relationshipOf(
  base: Base,
  supplier: OrganisationKey,
  customer: OrganisationKey,
): SeededRelationship {
  const found = base.relationships.find((each) => each.supplier === supplier && each.customer === customer)
  if (!found) throw new Error(`${supplier} does not supply ${customer}.`)
  return found
}

/** Part numbers with their characteristics: entered by the supplier, confirmed by the customer. */
export async function seedParts(stage: Stage, base: Base): Promise<SeededCharacteristics> {
  const seeded = new Map<string, SeededCharacteristic>()
  for (const [at, part] of parts.entries()) {
    const relationship = relationshipOf(base, part.supplier, part.customer)
    const supplier = base.organisations[part.supplier]
    const customer = base.organisations[part.customer]
    stage.daysAgo(360 - at, 8, 10)
    const enter = stage.as('supplier', supplier, memberWith(supplier, 'gauge-engineer'))
    const confirm = stage.as('customer', customer, memberWith(customer, 'quality-representative'))
    const { id: partId, currentRevision } = await enter(createPart, {
      body: {
        relationshipId: relationship.id,
        number: part.number,
        supplierNumber: part.supplierNumber,
        name: part.name,
        revision: part.revision,
      },
    })
    for (const limits of part.characteristics) {
      const [number, name, nominal, lowerLimit, upperLimit, unit, characteristicClass] = limits
      stage.pass(3)
      const characteristic = await enter(createCharacteristic, {
        params: { partId, revisionId: currentRevision.id },
        body: {
          number,
          name,
          nominal: nominal || null,
          lowerLimit: lowerLimit || null,
          upperLimit: upperLimit || null,
          unit,
          class: characteristicClass,
        },
      })
      const key = characteristicKey(part.number, number)
      seeded.set(key, {
        id: characteristic.id,
        partId,
        partNumber: part.number,
        number,
        relationship,
        limits,
      })
      if (unconfirmed.includes(key)) continue
      stage.pass(90)
      await confirm(confirmCharacteristic, {
        params: { characteristicId: characteristic.id },
        body: { expectedVersion: characteristic.rowVersion },
      })
    }
  }
  return seeded
}
