import type { StudyState } from '../../../contract/moves/study'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { calibrationOn, standardById, type CalibrationOnDay } from '../gauges/gauges.lookup.service'
import type { StandardRow } from '../gauges/standards.repository'
import { taskById } from '../parts/parts.lookup.service'
import { relationshipById } from '../relationships/relationships.lookup.service'
import {
  selectAttempts,
  selectResults,
  type StudyDataRow,
  type StudyRow,
  type StudyTaskRow,
} from './studies.repository'

/** A study with its readings as they bear on one of its tasks. */
export interface StudyOfTask {
  study: StudyRow
  task: StudyTaskRow
  data: StudyDataRow
  /** With the values it had when the readings were stored, whatever was entered since. */
  standard: StandardRow
  /** What counted on the day the readings were taken. */
  calibration: { gauge: CalibrationOnDay | null; standard: CalibrationOnDay | null }
}

/** A study registered on a task, as it is told to the other side. */
export interface Attempt {
  code: string
  registeredAt: string
  registeredBeforehand: boolean
  state: StudyState
  collectedOn: string | null
  abandonReason: string | null
}

/** Computed studies of a task with their newest complete readings, the newest study first. */
export async function resultsForTask(tenant: Tenant, taskId: string): Promise<StudyOfTask[]> {
  const rows = await selectResults(tenant, taskId)
  const results: StudyOfTask[] = []
  for (const row of rows) results.push(await asStudyOfTask(tenant, row))
  return results
}

/** Adds standard and calibrations to a study's rows. */
export async function asStudyOfTask(
  tenant: Tenant,
  { study, task, data }: Pick<StudyOfTask, 'study' | 'task' | 'data'>,
): Promise<StudyOfTask> {
  return {
    study,
    task,
    data,
    standard: { ...(await standardById(tenant, study.standardId)), ...data.standard },
    calibration: await calibrationsOn(tenant, study, data.collectedOn),
  }
}

/** The calibrations of a study's gauge and reference standard that counted on a day. */
export const calibrationsOn = async (
  tenant: Tenant,
  { gaugeId, standardId }: Pick<StudyRow, 'gaugeId' | 'standardId'>,
  day: string,
): Promise<StudyOfTask['calibration']> => ({
  gauge: await calibrationOn(tenant, { gaugeId }, day),
  standard: await calibrationOn(tenant, { standardId }, day),
})

/**
 * Every study registered on a task on or after a day of the relationship's calendar, abandoned ones included, in the
 * order of registration; without a day all of them.
 */
export async function attemptsOn(tenant: Tenant, taskId: string, since: string | null): Promise<Attempt[]> {
  const rows = await selectAttempts(tenant, [taskId])
  const { timeZone } = await relationshipById(tenant, (await taskById(tenant, taskId)).relationshipId)
  return rows
    .filter(({ study }) => since === null || dayIn(timeZone, study.registeredAt) >= since)
    .map(({ study }) => ({
      code: study.code,
      registeredAt: study.registeredAt,
      registeredBeforehand: study.registeredBeforehand,
      state: study.state,
      collectedOn: study.collectedOn,
      abandonReason: study.abandonReason,
    }))
}
