import { registerStudy } from '../../../../contract/study-acts'
import type { Tenant } from '../../../db/tenant'
import { selectRevisions, selectTasksOf, type StudyRow } from '../../studies/studies.repository'
import { storeStudy } from '../../studies/studies.register.service'
import { storeRevision } from '../../studies/studies.store.service'
import { groupBy, inChunks, turn, type MappedRows } from '../rows/context'
import { partnersOf } from '../rows/partners'
import type { Plan, Planned } from '../rows/plan'
import { dependsOn } from '../rows/settle'
import { formatCount } from '../rows/words'
import { studyWorld } from './studies.existing'
import { settleStudy, type SettledStudy } from './studies.group'
import { readStudyRow, type StudyRowRead } from './studies.read'

type Stored = Parameters<typeof storeRevision>[3]

/** What every study of the file shares: who took the readings, and the file with how it was read. */
export interface StudySource {
  takenBy: string[]
  readAs: Stored['read']['readAs']
  kept: Stored['kept']
}

/** What a file of past studies would do: each study whole, registered not beforehand, and computed. */
export async function planStudies(
  tenant: Tenant,
  { rows, writing }: MappedRows,
  source: StudySource,
): Promise<Plan> {
  const partners = await partnersOf(tenant)
  const read: StudyRowRead[] = []
  await inChunks(rows, (row) => read.push(readStudyRow(row, writing, partners)))
  const groups = groupBy(
    read.filter(({ code }) => code),
    ({ code }) => code ?? '',
  )
  const world = await studyWorld(tenant, read)
  const things: Planned[] = []
  const problems: Plan['problems'] = []
  for (const [code, group] of groups) {
    await turn()
    const settled = settleStudy(group, world)
    const stands = world.studies.get(code)
    const thing = settled && (await thingOf(tenant, settled, stands, source))
    if (thing) things.push(thing)
    else if (settled) group[0]?.cells.refuse('code', codeTaken)
    const bad = group.filter(({ cells }) => cells.problems.length > 0).map(({ cells }) => cells.row)
    const [on] = bad
    if (on === undefined) continue
    for (const { cells } of group)
      if (cells.problems.length === 0) problems.push({ row: cells.row, field: null, message: dependsOn(on) })
  }
  for (const { cells } of read) problems.push(...cells.problems)
  return { things, problems, rows: rows.length }
}

const codeTaken =
  'Another study has this code, with other readings or of something else. Studies are not changed by an import: correct its readings on its page, or enter another code.'

/** The study as it would be stored; null where one of its code is there that says something else. */
async function thingOf(
  tenant: Tenant,
  settled: SettledStudy,
  stands: StudyRow | undefined,
  source: StudySource,
): Promise<Planned | null> {
  const { code, row, tasks, standard, readings } = settled
  const thing = {
    ...{ row, what: 'study' as const, label: code, differences: [] },
    restsOn: [
      stands?.id ?? null,
      stands?.rowVersion ?? null,
      standard.rowVersion,
      ...tasks.flatMap(({ task, characteristic }) => [task.id, task.rowVersion, characteristic.rowVersion]),
    ],
  }
  if (stands)
    return (await isSame(tenant, settled, stands)) ? { ...thing, outcome: 'unchanged', notes: [] } : null
  const [first] = tasks
  const measured = tasks.map(({ characteristic }) => `no. ${characteristic.number}`).join(', ')
  return {
    ...thing,
    outcome: 'new',
    notes: [
      `${formatCount(readings.length, 'reading')} of ${first?.part.number ?? ''} ${measured} with ${first?.task.gaugeCode ?? ''}, registered not beforehand.`,
    ],
    act: (acting) => storeWhole(acting, settled, source),
  }
}

async function storeWhole(tenant: Tenant, settled: SettledStudy, source: StudySource): Promise<void> {
  const { readings, collectedOn, appraiser } = settled
  const study = await storeStudy(
    tenant,
    registerStudy.body.parse({
      ...{ code: settled.code, unit: settled.unit, measuredAs: settled.measuredAs },
      taskIds: settled.tasks.map(({ task }) => task.id),
      standardId: settled.standard.id,
      plannedReadings: readings.length,
      registeredBeforehand: false,
    }),
  )
  const body = {
    ...{ source: 'uploaded' as const, append: false, complete: true, leaveOutBadRows: false },
    ...{ expectedVersion: study.rowVersion, collectedOn, appraiser, takenBy: source.takenBy, reason: null },
  }
  const read = {
    readAs: source.readAs,
    readings: readings.map(({ text, value }) => ({ row: settled.row, column: '', text, value })),
    ...{ errors: [], runSheet: null, lessons: [] },
  }
  await storeRevision(tenant, study.id, body, { read, kept: source.kept })
}

/** Whether the study of this code holds the very same readings of the same things. */
async function isSame(tenant: Tenant, settled: SettledStudy, stands: StudyRow): Promise<boolean> {
  const [newest] = await selectRevisions(tenant, stands.id)
  const tasks = new Set((await selectTasksOf(tenant, stands.id)).map(({ taskId }) => taskId))
  return (
    newest !== undefined &&
    stands.state === 'computed' &&
    stands.standardId === settled.standard.id &&
    stands.unit === settled.unit &&
    stands.measuredAs === settled.measuredAs &&
    newest.collectedOn === settled.collectedOn &&
    newest.appraiser === settled.appraiser &&
    tasks.size === settled.tasks.length &&
    settled.tasks.every(({ task }) => tasks.has(task.id)) &&
    newest.values.length === settled.readings.length &&
    newest.values.every((value, at) => value === settled.readings[at]?.value)
  )
}
