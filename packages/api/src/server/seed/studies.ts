import { abandonStudy, registerStudy, storeReadings, type Study } from '../../contract/studies'
import { memberWith, type Base } from './base'
import { standardName } from './gauges'
import { taskName, type Ids } from './ids'
import { asBrought } from './readings-file'
import { demoReadings } from './readings'
import { abandonReason, studies, type DemoEnd } from './scenario.studies'
import type { Scene } from './scenes'
import type { Stage } from './stage'
import { standardFor } from './scenario.standards'
import { submissionScenes } from './submissions'
import { demoTasks, type DemoTask } from './tasks'

/** The scenes of every study and of the submissions that rest on them. */
export function studyScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  const tasks = new Map(demoTasks(base).map((task) => [task.name, task]))
  const counts = new Map<string, number>()
  return studies.flatMap(([part, number, gauge, row], at) => {
    const task = tasks.get(taskName(part, number, gauge))
    if (!task) throw new Error(`${part}/${number}/${gauge} is no measuring task.`)
    return row.flatMap(([daysAgo, readings, end], nth) =>
      scenesOfStudy(stage, base, ids, {
        task,
        code: nextCode(counts, gauge),
        dialect: at + nth,
        daysAgo,
        readings,
        end,
      }),
    )
  })
}

/** `BG-14 S1`, `BG-14 S2` …: people number the studies of a gauge. */
function nextCode(counts: Map<string, number>, gauge: string): string {
  const count = (counts.get(gauge) ?? 0) + 1
  counts.set(gauge, count)
  return `${gauge} S${count}`
}

interface Planned {
  task: DemoTask
  code: string
  dialect: number
  daysAgo: number
  readings: number
  end: DemoEnd
}

function scenesOfStudy(stage: Stage, base: Base, ids: Ids, planned: Planned): Scene[] {
  const { task, code, daysAgo, end } = planned
  const owner = base.organisations[task.gauge.owner]
  const engineer = memberWith(owner, 'gauge-engineer')
  const act = stage.as('supplier', owner, engineer)
  let study: Study | undefined
  const known = (): Study => {
    if (!study) throw new Error(`${code} was not registered.`)
    return study
  }
  const register: Scene = {
    daysAgo,
    play: async () => {
      study = await act(registerStudy, {
        body: {
          code,
          taskIds: [ids.get('task', task.name)],
          standardId: ids.get('standard', standardName(task)),
          plannedReadings: planned.readings,
          unit: task.gauge.unit,
          measuredAs: 'value',
          plan: {
            bias: '0',
            standardDeviation: String(task.gauge.standardDeviation),
            chance: 0.9,
          },
        },
      })
    },
  }
  if (end === 'registered') return [register]
  if (end === 'abandoned') {
    const abandon = async () => {
      const { id, rowVersion } = known()
      await act(abandonStudy, {
        params: { studyId: id },
        body: { expectedVersion: rowVersion, reason: abandonReason },
      })
    }
    return [register, { daysAgo: daysAgo - 1, play: abandon }]
  }
  const collectedDaysAgo = Math.max(daysAgo - 1, 0)
  const collect: Scene = {
    daysAgo: collectedDaysAgo,
    play: async () => {
      const { id, rowVersion } = known()
      const { input, file } = asBrought(planned.dialect, code, takenReadings(planned), task.gauge.unit)
      await act(storeReadings, {
        params: { studyId: id },
        body: {
          ...input,
          expectedVersion: rowVersion,
          complete: end !== 'collecting',
          collectedOn: stage.day(collectedDaysAgo),
          appraiser: 'A1',
          takenBy: [engineer.id],
        },
        ...(file && { file }),
      })
    },
  }
  return [register, collect, ...submissionScenes(stage, base, ids, { task, end, collectedDaysAgo })]
}

/** Readings of the gauge's known bias and spread; half of them where more will follow. */
const takenReadings = ({ task, code, readings, end }: Planned): string[] =>
  demoReadings({
    name: code,
    count: end === 'collecting' ? Math.ceil(readings / 2) : readings,
    reference: standardFor(task).certifiedValue,
    resolution: task.gauge.resolution,
    bias: task.gauge.bias,
    standardDeviation: task.gauge.standardDeviation,
  })
