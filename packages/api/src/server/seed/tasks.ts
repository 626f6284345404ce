import { createTask } from '../../contract/tasks'
import { memberWith, relationshipOf, type Base, type SeededRelationship } from './base'
import { characteristicName, taskName, type Ids } from './ids'
import { gauges, tasks, type DemoGauge } from './scenario.gauges'
import { parts, type DemoCharacteristic } from './scenario.parts'
import type { Scene } from './scenes'
import type { Stage } from './stage'

/** A measuring task of the scenario with everything it is about. */
export interface DemoTask {
  name: string
  gauge: DemoGauge
  partNumber: string
  limits: DemoCharacteristic
  relationship: SeededRelationship
  processStep: string
}

/** Every measuring task of the scenario. */
export function demoTasks(base: Base): DemoTask[] {
  return tasks.map(([partNumber, number, gaugeCode, processStep]) => {
    const part = parts.find((each) => each.number === partNumber)
    const limits = part?.characteristics.find(([each]) => each === number)
    const gauge = gauges.find((each) => each.code === gaugeCode)
    if (!part || !limits || !gauge) throw new Error(`${partNumber}/${number}/${gaugeCode} names nothing.`)
    return {
      name: taskName(partNumber, number, gaugeCode),
      gauge,
      partNumber,
      limits,
      relationship: relationshipOf(base, part.supplier, part.customer),
      processStep,
    }
  })
}

/** Which gauge measures which characteristic, entered after both. */
export const taskScenes = (stage: Stage, base: Base, ids: Ids): Scene[] =>
  demoTasks(base).map(({ name, gauge, partNumber, limits: [number], processStep }): Scene => ({
    daysAgo: 335,
    play: async () => {
      const owner = base.organisations[gauge.owner]
      const act = stage.as('supplier', owner, memberWith(owner, 'gauge-engineer'))
      const { id } = await act(createTask, {
        body: {
          characteristicId: ids.get('characteristic', characteristicName(partNumber, number)),
          gaugeId: ids.get('gauge', gauge.code),
          site: gauge.site,
          processStep,
        },
      })
      ids.set('task', name, id)
    },
  }))
