import { addGaugeCalibration, addStandardCalibration } from '../../contract/calibrations'
import { createGauge } from '../../contract/gauges'
import { createStandard } from '../../contract/standards'
import { memberWith, type Base } from './base'
import { certificate } from './certificate'
import { characteristicName, type Ids } from './ids'
import type { OrganisationKey } from './scenario.organisations'
import { gauges, type DemoGauge } from './scenario.gauges'
import { standardFor } from './scenario.standards'
import type { Scene } from './scenes'
import type { Act, Stage } from './stage'
import { demoTasks, type DemoTask } from './tasks'

const laboratory = 'Harrowgate Calibration Laboratory'
/** Gauges and standards are entered on this day with the calibrations they had; later ones when they come. */
const entered = 345

const engineerOf = (stage: Stage, base: Base, key: OrganisationKey): Act => {
  const owner = base.organisations[key]
  return stage.as('supplier', owner, memberWith(owner, 'gauge-engineer'))
}

/** Gauges with their calibrations and certificates. */
export const gaugeScenes = (stage: Stage, base: Base, ids: Ids): Scene[] =>
  gauges.flatMap((gauge) => {
    const act = engineerOf(stage, base, gauge.owner)
    const { code, name, resolution, unit, site } = gauge
    const register = async () => {
      const { id } = await act(createGauge, { body: { code, name, resolution, unit, site } })
      ids.set('gauge', code, id)
    }
    return [
      { daysAgo: entered, play: register },
      ...calibrations(stage, code, calibratedDaysAgo(gauge), gauge.intervalDays, (input) =>
        act(addGaugeCalibration, { params: { gaugeId: ids.get('gauge', code) }, ...input }),
      ),
    ]
  })

/** As many as reach back to the first study, so that what was measured in between was in calibration too. */
function calibratedDaysAgo({ calibratedDaysAgo: last, intervalDays }: DemoGauge): number[] {
  const all = [last]
  while ((all[0] ?? 0) < entered) all.unshift((all[0] ?? 0) + intervalDays)
  return all
}

/** One reference standard for each characteristic that is measured, with its calibrations. */
export function standardScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  const byCharacteristic = new Map(demoTasks(base).map((task) => [standardName(task), task]))
  return [...byCharacteristic].flatMap(([name, task]): Scene[] => {
    const act = engineerOf(stage, base, task.gauge.owner)
    const standard = standardFor(task)
    const register = async () => {
      const { id } = await act(createStandard, { body: standard })
      ids.set('standard', name, id)
    }
    return [
      { daysAgo: entered, play: register },
      ...calibrations(stage, standard.code, [700, 180], 730, (input) =>
        act(addStandardCalibration, { params: { standardId: ids.get('standard', name) }, ...input }),
      ),
    ]
  })
}

export const standardName = ({ partNumber, limits: [number] }: DemoTask): string =>
  characteristicName(partNumber, number)

/** Calibrations, each with a certificate of one page, entered on the day they came back. */
const calibrations = (
  stage: Stage,
  code: string,
  daysAgo: readonly number[],
  intervalDays: number,
  enter: (input: { body: unknown; file: { name: string; bytes: Buffer } }) => Promise<unknown>,
): Scene[] =>
  daysAgo.map((ago) => ({
    daysAgo: Math.min(ago, entered),
    play: async () => {
      const certificateNumber = `HCL ${stage.day(ago).replaceAll('-', '')} ${code}`
      const body = {
        certificateNumber,
        laboratory,
        calibratedOn: stage.day(ago),
        dueOn: stage.day(ago - intervalDays),
        foundWithinLimits: true,
      }
      await enter({
        body,
        file: { name: `certificate ${code}.pdf`, bytes: certificate(certificateNumber, laboratory, body) },
      })
    },
  }))
