import type { Verdict } from '@evenrule/metrology'
import type { Tenant } from '../../db/tenant'
import { dayIn } from '../../calendar'
import type { StoredEvaluation } from '../../integrations/engines'
import { criteriaSince } from '../agreements/agreements.apply.service'
import { taskById } from '../parts/parts.lookup.service'
import { relationshipById } from '../relationships/relationships.lookup.service'
import { clauseInputOf } from './clause-input'
import { asStudyOfTask, attemptsOn, type StudyOfTask } from './studies.results.service'
import type { StudyDataRow, StudyRow, StudyTaskRow } from './studies.repository'

export interface Evaluated {
  taskId: string
  clauseKey: string
  verdict: Verdict
  stored: StoredEvaluation
}

/** Computes every clause of every task of a study from one revision of its readings; stores nothing. */
export async function evaluateStudy(
  tenant: Tenant,
  study: StudyRow,
  tasks: readonly StudyTaskRow[],
  data: StudyDataRow,
): Promise<Evaluated[]> {
  const evaluated: Evaluated[] = []
  for (const task of tasks) {
    const ofTask = await asStudyOfTask(tenant, { study, task, data })
    const attempts = await attemptOf(tenant, ofTask)
    for (const { clauseKey, clause } of task.criteria) {
      const input = clauseInputOf({
        clause,
        characteristic: task.characteristic,
        gauge: study.gauge,
        study: ofTask,
        attempts,
      })
      const { output, stored } = await tenant.services.engines.evaluateClause(input)
      evaluated.push({ taskId: task.taskId, clauseKey, verdict: output.verdict, stored })
    }
  }
  return evaluated
}

/** Which attempt the study is since criteria came into force, as they stood when it was registered. */
async function attemptOf(tenant: Tenant, { study, task }: StudyOfTask): Promise<number> {
  const { partId, characteristicId, relationshipId } = await taskById(tenant, task.taskId)
  const { timeZone } = await relationshipById(tenant, relationshipId)
  const on = dayIn(timeZone, study.registeredAt)
  const since = await criteriaSince(tenant, { relationshipId, partId, characteristicId, on })
  const attempts = await attemptsOn(tenant, task.taskId, since)
  return Math.max(attempts.findIndex(({ code }) => code === study.code) + 1, 1)
}

/**
 * Estimates of a study for a task on which no clause was in force: no verdict, but the figures all the same. The
 * canonical text of a BiasOutput.
 */
export async function figuresWithoutCriteria(tenant: Tenant, ofTask: StudyOfTask): Promise<string | null> {
  const { study, task } = ofTask
  const { data, unit, tolerance, processStandardDeviation, resolution } = clauseInputOf({
    clause: { type: 'design-minimum', parameters: { readings: 2, registeredBeforehand: false } },
    characteristic: task.characteristic,
    gauge: study.gauge,
    study: ofTask,
    attempts: 1,
  })
  if (!data) return null
  const { readings, reference } = data
  const output = await tenant.services.engines.evaluate({
    ...{ kind: 'bias', unit, readings, reference },
    ...(tolerance && { tolerance }),
    ...(processStandardDeviation !== undefined && { processStandardDeviation }),
    ...(resolution !== undefined && { resolution }),
  })
  if ('error' in output) throw new Error(`The computation refused readings: ${JSON.stringify(output.error)}`)
  return JSON.stringify(output)
}
