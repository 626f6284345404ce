import { randomInt } from 'node:crypto'
import { areCompatible, convert, studyKinds } from '@evenrule/metrology'
import { registration } from '../../../contract/moves/study'
import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { planStudy, readStudy, registerStudy } from '../../../contract/studies'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { invalidInput, type FieldError } from '../../errors'
import { criteriaFor, criteriaSince } from '../agreements/agreements.apply.service'
import { gaugeById } from '../gauges/gauges.lookup.service'
import type { GaugeRow } from '../gauges/gauges.repository'
import { selectStandard, type StandardRow } from '../gauges/standards.repository'
import { isArchived } from '../parts/parts.errors'
import { frozenCharacteristic, toCharacteristic } from '../parts/parts.lookup.service'
import { selectTask, type TaskRow } from '../parts/tasks.repository'
import { canonicalText, sha256 } from '../record/record.append'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import { readStudyOf } from './studies.read.service'
import { insertStudy, insertStudyTasks, nextAttempts, type StudyRow } from './studies.repository'
import { attemptsOn } from './studies.results.service'
import type { FrozenCharacteristic, FrozenClause } from './studies.table'

type Entered = BodyOf<typeof registerStudy>
type Planned = AnswerInputOf<typeof planStudy>

interface Served {
  task: TaskRow
  characteristic: FrozenCharacteristic
  criteria: FrozenClause[]
  /** First day since which criteria are in force; attempts count from it. */
  since: string | null
}

const taken = {
  studies_org_code: {
    path: 'body.code',
    message: 'Another study has this code. Look among the abandoned ones too, or enter another code.',
  },
}

/** How many readings give the wanted chance to meet the clauses in force today; nothing is stored. */
export async function planOf(
  tenant: Tenant,
  { taskIds, unit, chance, ...assumed }: BodyOf<typeof planStudy>,
): Promise<Planned> {
  const { served, gauge } = await servedBy(tenant, taskIds, unit)
  const tasks: Planned['tasks'] = []
  for (const { task, characteristic, criteria, since } of served) {
    const inUnit = (text: string) => convert(Number(text), unit, characteristic.unit) ?? Number(text)
    const truth = { bias: inUnit(assumed.bias), standardDeviation: inUnit(assumed.standardDeviation) }
    const plan = studyKinds.bias.plan(
      criteria.map(({ clause }) => clause),
      toCharacteristic(characteristic, { resolution: gauge.resolution, gaugeUnit: gauge.unit }),
      truth,
      chance,
    )
    tasks.push({
      taskId: task.id,
      readings: plan.readings,
      characteristic,
      attempts: (await attemptsOn(tenant, task.id, since)).length,
      clauses: criteria.map((frozen) => ({
        ...frozen,
        ...(plan.byClause.find(({ clauseKey }) => clauseKey === frozen.clauseKey) ?? notAboutSize),
      })),
    })
  }
  const { fewestReadings, mostReadings } = studyKinds.bias
  return { readings: readingsForAll(tasks), fewestReadings, mostReadings, tasks }
}

const notAboutSize = { readings: null, chance: null, reason: 'not-about-size' } as const

/** The most that any task needs; none where a clause has no size, or where no clause asks for one. */
function readingsForAll(tasks: Planned['tasks']): number | null {
  const impossible = tasks.some(({ clauses }) => clauses.some(({ reason }) => reason === 'no-size-suffices'))
  const sizes = tasks.flatMap(({ readings }) => (readings === null ? [] : [readings]))
  return impossible || sizes.length === 0 ? null : Math.max(...sizes)
}

/** Registers a study: criteria and limits of every task are frozen as they stand today. */
export async function registerStudyOf(
  tenant: Tenant,
  body: Entered,
): Promise<AnswerInputOf<typeof readStudy>> {
  return readStudyOf(tenant, (await storeStudy(tenant, body)).id)
}

/** The same where many are registered and nobody reads each answer. */
export async function storeStudy(tenant: Tenant, body: Entered): Promise<StudyRow> {
  const { taskIds, unit, standardId } = body
  const { served, gauge } = await servedBy(tenant, taskIds, unit)
  if (gauge.archivedAt) throw isArchived('gauge')
  const standard = await standardFor(tenant, standardId, unit)
  const { code: gaugeCode, name, resolution, unit: gaugeUnit } = gauge
  const study = await uniqueOr409(taken, () =>
    insertStudy(tenant, {
      code: body.code,
      kind: 'bias',
      gaugeId: gauge.id,
      gauge: { code: gaugeCode, name, resolution, unit: gaugeUnit },
      standardId: standard.id,
      state: registration.to,
      registeredAt: tenant.now,
      registeredBy: tenant.userId,
      registeredBeforehand: body.registeredBeforehand,
      plannedReadings: body.plannedReadings,
      plan: body.plan,
      runSheetSeed: randomInt(2 ** 31 - 1),
      slots: body.slots,
      unit,
      measuredAs: body.measuredAs,
    }),
  )
  const attempts = await nextAttempts(tenant, taskIds)
  const tasks = served.map(({ task, characteristic, criteria }) => ({
    studyId: study.id,
    taskId: task.id,
    relationshipId: task.relationshipId,
    customerOrgId: task.customerOrgId,
    attempt: attempts.get(task.id) ?? 1,
    criteria,
    characteristic,
  }))
  await insertStudyTasks(tenant, tasks)
  tenant.record({
    type: registration.event,
    subject: { type: 'study', id: study.id },
    data: {
      ...{ code: study.code, kind: study.kind, gaugeId: gauge.id, standardId: standard.id },
      ...{ plannedReadings: study.plannedReadings, unit, measuredAs: study.measuredAs },
      registeredBeforehand: study.registeredBeforehand,
      tasks: tasks.map(({ taskId, attempt, criteria, characteristic }) => ({
        taskId,
        attempt,
        criteriaSha256: sha256(canonicalText(criteria)),
        characteristicSha256: sha256(canonicalText(characteristic)),
      })),
    },
  })
  return study
}

/** Tasks that one study can serve: of this supplier, active, of one gauge, in units of the study's quantity. */
async function servedBy(
  tenant: Tenant,
  taskIds: readonly string[],
  unit: string,
): Promise<{ served: Served[]; gauge: GaugeRow }> {
  const errors: FieldError[] = []
  const served: Served[] = []
  for (const [at, taskId] of taskIds.entries()) {
    const refuse = (message: string) => void errors.push({ path: `body.taskIds.${at}`, message })
    const task = await selectTask(tenant, taskId)
    const [first] = served
    if (!task || task.archivedAt) refuse('Choose an active measuring task from the list.')
    else if (taskIds.indexOf(taskId) < at) refuse('This measuring task is chosen twice.')
    else if (first && first.task.gaugeId !== task.gaugeId)
      refuse(
        `${task.gaugeCode} measures this one, but a study is made on one gauge, here ${first.task.gaugeCode}. Register a study of its own for it.`,
      )
    else served.push(await servedTask(tenant, task))
  }
  const other = served.find(({ characteristic }) => !areCompatible(unit, characteristic.unit))
  if (other)
    errors.push({
      path: 'body.unit',
      message: `${other.characteristic.name} is in ${other.characteristic.unit}; choose a unit of the same quantity instead of ${unit}.`,
    })
  const [first] = served
  if (errors.length > 0 || !first) throw invalidInput(errors)
  return { served, gauge: await gaugeById(tenant, first.task.gaugeId) }
}

async function servedTask(tenant: Tenant, task: TaskRow): Promise<Served> {
  const { relationshipId, partId, characteristicId } = task
  const on = todayIn(await relationshipById(tenant, relationshipId), tenant)
  const scope = { relationshipId, partId, characteristicId, on }
  return {
    task,
    characteristic: await frozenCharacteristic(tenant, characteristicId),
    criteria: await criteriaFor(tenant, scope),
    since: await criteriaSince(tenant, scope),
  }
}

async function standardFor(tenant: Tenant, standardId: string, unit: string): Promise<StandardRow> {
  const refuse = (message: string) => invalidInput([{ path: 'body.standardId', message }])
  const standard = await selectStandard(tenant, standardId)
  if (!standard || standard.archivedAt) throw refuse('Choose an active reference standard from the list.')
  if (!areCompatible(standard.unit, unit))
    throw refuse(
      `${standard.code} is certified in ${standard.unit}, but the readings are in ${unit}. Choose a standard of the same quantity.`,
    )
  return standard
}
