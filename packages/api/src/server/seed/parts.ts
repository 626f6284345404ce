import { confirmCharacteristic, createCharacteristic } from '../../contract/characteristics'
import { createPart } from '../../contract/parts'
import { memberWith, relationshipOf, type Base } from './base'
import { characteristicName, type Ids } from './ids'
import { lately, parts, type DemoCharacteristic, type DemoPart } from './scenario.parts'
import type { Scene } from './scenes'
import type { Stage } from './stage'

/** Part numbers with their characteristics: entered by the supplier, confirmed by the customer. */
export const partScenes = (stage: Stage, base: Base, ids: Ids): Scene[] => [
  ...parts.map((part, at): Scene => ({ daysAgo: 360 - at, play: () => enterPart(stage, base, ids, part) })),
  ...lately.map(({ number, characteristic, daysAgo }): Scene => {
    const part = parts.find((each) => each.number === number)
    if (!part) throw new Error(`${number} is no part of the demonstration.`)
    return { daysAgo, play: async () => void (await enter(stage, base, ids, part, characteristic)) }
  }),
]

async function enterPart(stage: Stage, base: Base, ids: Ids, part: DemoPart): Promise<void> {
  const supplier = base.organisations[part.supplier]
  const customer = base.organisations[part.customer]
  const { id, currentRevision } = await stage.as(
    'supplier',
    supplier,
    memberWith(supplier, 'gauge-engineer'),
  )(createPart, {
    body: {
      relationshipId: relationshipOf(base, part.supplier, part.customer).id,
      number: part.number,
      supplierNumber: part.supplierNumber,
      name: part.name,
      revision: part.revision,
    },
  })
  ids.set('part', part.number, id)
  ids.set('revision', part.number, currentRevision.id)
  const confirm = stage.as('customer', customer, memberWith(customer, 'quality-representative'))
  for (const characteristic of part.characteristics) {
    stage.pass(3)
    const { id: characteristicId, rowVersion } = await enter(stage, base, ids, part, characteristic)
    stage.pass(20)
    await confirm(confirmCharacteristic, {
      params: { characteristicId },
      body: { expectedVersion: rowVersion },
    })
  }
}

/** The supplier enters one characteristic; it waits for the customer's confirmation. */
async function enter(
  stage: Stage,
  base: Base,
  ids: Ids,
  part: DemoPart,
  [number, name, nominal, lowerLimit, upperLimit, unit, characteristicClass]: DemoCharacteristic,
): Promise<{ id: string; rowVersion: number }> {
  const supplier = base.organisations[part.supplier]
  const act = stage.as('supplier', supplier, memberWith(supplier, 'gauge-engineer'))
  const entered = await act(createCharacteristic, {
    params: { partId: ids.get('part', part.number), revisionId: ids.get('revision', part.number) },
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
  ids.set('characteristic', characteristicName(part.number, number), entered.id)
  return entered
}
