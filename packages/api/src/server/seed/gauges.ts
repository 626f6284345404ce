import { addGaugeCalibration, addStandardCalibration } from '../../contract/calibrations'
import { createGauge } from '../../contract/gauges'
import { createStandard } from '../../contract/standards'
import { createTask } from '../../contract/tasks'
import { memberWith, type Base, type SeededOrganisation } from './base'
import { certificate } from './certificate'
import { characteristicKey, type SeededCharacteristic, type SeededCharacteristics } from './parts'
import { gauges, tasks, type DemoGauge } from './scenario.gauges'
import { standardFor } from './scenario.standards'
import type { Stage } from './stage'

export interface SeededTask {
  id: string
  characteristic: SeededCharacteristic
  gauge: DemoGauge & { id: string }
  /** The reference standard that studies of this task use. */
  standard: { id: string; certifiedValue: string }
}

/** Tasks by `part number/drawing number/gauge code`. */
export type SeededTasks = ReadonlyMap<string, SeededTask>

const laboratory = 'Harrowgate Calibration Laboratory'

/** Gauges and reference standards with calibrations and certificates, and the measuring tasks they serve. */
export async function seedGauges(
  stage: Stage,
  base: Base,
  characteristics: SeededCharacteristics,
): Promise<SeededTasks> {
  const ids = new Map<string, DemoGauge & { id: string }>()
  for (const gauge of gauges) ids.set(gauge.code, { ...gauge, id: await seedGauge(stage, base, gauge) })
  const seeded = new Map<string, SeededTask>()
  const standards = new Map<string, { id: string; certifiedValue: string }>()
  for (const [partNumber, number, gaugeCode, processStep] of tasks) {
    const characteristic = characteristics.get(characteristicKey(partNumber, number))
    const gauge = ids.get(gaugeCode)
    if (!characteristic || !gauge) throw new Error(`${partNumber}/${number}/${gaugeCode} names nothing.`)
    const owner = base.organisations[gauge.owner]
    const act = stage.as('supplier', owner, memberWith(owner, 'gauge-engineer'))
    stage.daysAgo(320, 10)
    const { id } = await act(createTask, {
      body: {
        characteristicId: characteristic.id,
        gaugeId: gauge.id,
        site: owner.name === 'Tarnfield Turned Parts' ? 'Turning shop' : null,
        processStep,
      },
    })
    const key = `${owner.id}/${characteristicKey(partNumber, number)}`
    const standard = standards.get(key) ?? (await seedStandard(stage, owner, characteristic))
    standards.set(key, standard)
    seeded.set(taskKey(partNumber, number, gaugeCode), { id, characteristic, gauge, standard })
  }
  return seeded
}

export const taskKey = (partNumber: string, number: number, gaugeCode: string): string =>
  `${characteristicKey(partNumber, number)}/${gaugeCode}`

async function seedGauge(stage: Stage, base: Base, gauge: DemoGauge): Promise<string> {
  const owner = base.organisations[gauge.owner]
  const act = stage.as('supplier', owner, memberWith(owner, 'gauge-engineer'))
  stage.daysAgo(350, 9)
  const { id } = await act(createGauge, {
    body: {
      code: gauge.code,
      name: gauge.name,
      resolution: gauge.resolution,
      unit: gauge.unit,
      site: Object.keys(owner.sites)[0] ?? null,
    },
  })
  // The one before, so that what was measured in between was in calibration too, and the one that counts.
  for (const ago of [gauge.calibratedDaysAgo + gauge.intervalDays, gauge.calibratedDaysAgo])
    await act(addGaugeCalibration, {
      params: { gaugeId: id },
      ...calibration(stage, gauge.code, ago, gauge.intervalDays),
    })
  return id
}

async function seedStandard(
  stage: Stage,
  owner: SeededOrganisation,
  characteristic: SeededCharacteristic,
): Promise<{ id: string; certifiedValue: string }> {
  const act = stage.as('supplier', owner, memberWith(owner, 'gauge-engineer'))
  const standard = standardFor(characteristic)
  const { id } = await act(createStandard, { body: standard })
  for (const ago of [700, 180])
    await act(addStandardCalibration, {
      params: { standardId: id },
      ...calibration(stage, standard.code, ago, 730),
    })
  return { id, certifiedValue: standard.certifiedValue }
}

/** A calibration with a certificate of one page. */
function calibration(stage: Stage, code: string, daysAgo: number, intervalDays: number) {
  const number = `HCL ${stage.day(daysAgo).replaceAll('-', '')} ${code}`
  // Entered on the day it came back, or with the gauge where that was earlier.
  stage.daysAgo(Math.min(daysAgo, 340), 15)
  const body = {
    certificateNumber: number,
    laboratory,
    calibratedOn: stage.day(daysAgo),
    dueOn: stage.day(daysAgo - intervalDays),
    foundWithinLimits: true,
  }
  return { body, file: { name: `certificate ${code}.pdf`, bytes: certificate(number, laboratory, body) } }
}
