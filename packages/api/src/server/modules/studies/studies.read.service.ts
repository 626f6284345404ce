import { whatWouldSettle, type ClauseInput, type ClauseOutput } from '@evenrule/metrology'
import type { AnswerInputOf } from '../../../contract/define'
import type { readStudy } from '../../../contract/studies'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { Download } from '../../http/route'
import { downloadOf, fileById } from '../files/files.service'
import { standardById } from '../gauges/gauges.lookup.service'
import { namesOfPeople } from '../organisations/people.repository'
import { taskById } from '../parts/parts.lookup.service'
import { selectNames } from '../relationships/relationships.repository'
import { readAsStored } from './readings/stored'
import { runSheetCsv, runSheetOf, runSheetXlsx } from './run-sheet'
import { figuresWithoutCriteria } from './studies.evaluate.service'
import { noFile } from './studies.errors'
import {
  selectAttempts,
  selectEvaluations,
  selectRevisions,
  selectStudy,
  selectTasksOf,
  type StudyDataRow,
  type StudyEvaluationRow,
  type StudyRow,
  type StudyTaskRow,
} from './studies.repository'
import { asStudyOfTask, calibrationsOn } from './studies.results.service'

type StudyAnswer = AnswerInputOf<typeof readStudy>

/** One study of this organisation; 404 for those of others. */
export async function studyById(tenant: Tenant, studyId: string): Promise<StudyRow> {
  const row = await selectStudy(tenant, studyId)
  if (!row) throw notFound('study')
  return row
}

/** Everything the page of a study shows. */
export async function readStudyOf(tenant: Tenant, studyId: string): Promise<StudyAnswer> {
  const study = await studyById(tenant, studyId)
  const tasks = await selectTasksOf(tenant, studyId)
  const revisions = await selectRevisions(tenant, studyId)
  const [newest] = revisions
  const judged = study.state === 'computed' ? revisions.find(({ complete }) => complete) : undefined
  const names = await namesOfPeople(tenant, [
    study.registeredBy,
    ...revisions.flatMap(({ takenBy, createdBy }) => [...takenBy, createdBy]),
  ])
  const person = (id: string) => ({ id, name: names.get(id) ?? null })
  const { gaugeId, gauge, ...own } = study
  return {
    ...own,
    gauge: { id: gaugeId, ...gauge },
    standard: await standardOf(tenant, study, newest),
    registeredBy: person(study.registeredBy),
    runSheet: runSheetOf(study),
    tasks: await tasksOf(tenant, study, tasks, judged),
    calibration: newest
      ? await calibrationsOn(tenant, study, newest.collectedOn)
      : { gauge: null, standard: null },
    data: await Promise.all(
      revisions.map(async ({ fileId, ...row }) => ({
        ...row,
        readAs: readAsStored(row.readAs),
        file: fileId === null ? null : await fileById(tenant, fileId),
        takenBy: row.takenBy.map(person),
        createdBy: person(row.createdBy),
      })),
    ),
    evaluatedDataId: judged?.id ?? null,
    evaluations: judged ? (await selectEvaluations(tenant, judged.id)).map(withSettling) : [],
  }
}

/** The file a revision of the readings was uploaded as. */
export async function readingsFileOf(tenant: Tenant, studyId: string, revision: number): Promise<Download> {
  const study = await studyById(tenant, studyId)
  const row = (await selectRevisions(tenant, study.id)).find((each) => each.revision === revision)
  if (!row) throw notFound('revision of the readings')
  if (row.fileId === null) throw noFile()
  return downloadOf(tenant, row.fileId)
}

/** The run sheet of a study as CSV. */
export async function runSheetCsvOf(
  tenant: Tenant,
  studyId: string,
  separator: 'comma' | 'semicolon' | 'tab',
): Promise<Download> {
  const { study, kept } = await toFillIn(tenant, studyId)
  return runSheetCsv(study, kept, separator)
}

/** The same as XLSX. */
export async function runSheetXlsxOf(tenant: Tenant, studyId: string): Promise<Download> {
  const { study, kept } = await toFillIn(tenant, studyId)
  return runSheetXlsx(study, kept)
}

/** A study with the readings that stand on its sheet already. */
async function toFillIn(tenant: Tenant, studyId: string): Promise<{ study: StudyRow; kept: string[] }> {
  const study = await studyById(tenant, studyId)
  const [newest] = await selectRevisions(tenant, studyId)
  return { study, kept: newest?.texts ?? [] }
}

async function standardOf(
  tenant: Tenant,
  study: StudyRow,
  newest: StudyDataRow | undefined,
): Promise<StudyAnswer['standard']> {
  const row = { ...(await standardById(tenant, study.standardId)), ...newest?.standard }
  return { ...row, coverageFactor: row.expandedUncertainty === null ? null : row.coverageFactor }
}

async function tasksOf(
  tenant: Tenant,
  study: StudyRow,
  tasks: readonly StudyTaskRow[],
  judged: StudyDataRow | undefined,
): Promise<StudyAnswer['tasks']> {
  const customers = await selectNames(
    tenant,
    tasks.map(({ customerOrgId }) => customerOrgId),
  )
  const attempts = await selectAttempts(
    tenant,
    tasks.map(({ taskId }) => taskId),
  )
  const answers: StudyAnswer['tasks'] = []
  for (const task of tasks) {
    const { partId, site, processStep } = await taskById(tenant, task.taskId)
    answers.push({
      ...task,
      ...{ partId, site, processStep },
      customerName: customers.get(task.customerOrgId) ?? '',
      figuresText:
        judged && task.criteria.length === 0
          ? await figuresWithoutCriteria(tenant, await asStudyOfTask(tenant, { study, task, data: judged }))
          : null,
      attempts: attempts
        .filter((each) => each.task.taskId === task.taskId)
        .map((each) => ({ ...each.study, studyId: each.study.id, attempt: each.task.attempt }))
        .reverse(),
    })
  }
  return answers
}

/** What would likely settle a clause that is not shown, from the evaluation as stored. */
const withSettling = (row: StudyEvaluationRow): StudyAnswer['evaluations'][number] => ({
  ...row,
  settling:
    row.verdict === 'not-shown'
      ? whatWouldSettle(JSON.parse(row.inputText) as ClauseInput, JSON.parse(row.outputText) as ClauseOutput)
      : null,
})
