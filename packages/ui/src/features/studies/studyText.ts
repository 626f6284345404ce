import type { studies } from '@evenrule/api/contract'
import type { Verdict } from '@evenrule/metrology'
import { formatCount, formatDate, inSentence } from '../../format'
import { attemptText, collectWords, studyResultWords } from '../../strings/studies'
import { taskWords } from '../../strings/tasks'
import { characteristicText } from '../parts/tolerance'
import { resultOf, type ClauseResult } from '../results'

type Study = studies.Study
export type StudyTask = Study['tasks'][number]

/** "bore gauge BG-14" */
export const gaugeText = ({ gauge }: Pick<Study, 'gauge'>): string =>
  `${inSentence(gauge.name)} ${gauge.code}`

/** The question a study answers, for one characteristic or several. */
export function studyQuestion(study: Study): string {
  const [only, ...others] = study.tasks
  if (only && others.length === 0)
    return taskWords.question(gaugeText(study), inSentence(characteristicText(only.characteristic)))
  return studyResultWords.question(gaugeText(study), study.tasks.length)
}

/** The results of every task of a study, each clause with the agreement it was frozen from. */
export function resultsByTask(study: Study): { task: StudyTask; results: ClauseResult[] }[] {
  return study.tasks.map((task) => ({
    task,
    results: task.criteria.flatMap((frozen) => {
      const evaluation = study.evaluations.find(
        (each) => each.taskId === task.taskId && each.clauseKey === frozen.clauseKey,
      )
      return evaluation ? [resultOf(evaluation, frozen)] : []
    }),
  }))
}

/** The revision whose readings count: the one computed, else the newest. */
export const countingData = (study: Study): studies.StudyRevision | undefined =>
  study.data.find(({ id }) => id === study.evaluatedDataId) ?? study.data[0]

/** Readings kept so far, while more may follow. */
export const keptReadings = (study: Study): number => study.data[0]?.texts.length ?? 0

/** "agreement 3", "agreements 3 and 5", or nothing where none was in force. */
function agreementsText(study: Study): string {
  const numbers = [
    ...new Set(study.tasks.flatMap(({ criteria }) => criteria.map(({ agreementNumber }) => agreementNumber))),
  ].sort((a, b) => a - b)
  return numbers.length ? studyResultWords.agreements(numbers) : ''
}

const attemptOf = ({ tasks }: Study): string => {
  const [first, ...others] = tasks
  return first && others.every(({ attempt }) => attempt === first.attempt) ? attemptText(first.attempt) : ''
}

/** The quiet line under a computed study's answer. */
export function resultMeta(study: Study): string {
  const data = countingData(study)
  const files = new Set(study.data.flatMap(({ file }) => (file ? [file.sha256] : []))).size
  return [
    [studyResultWords.registered(formatDate(study.registeredAt), agreementsText(study)), attemptOf(study)]
      .filter(Boolean)
      .join(', '),
    study.registeredBeforehand ? '' : collectWords.notBeforehand,
    data && studyResultWords.taken(data.texts.length, data.appraiser, formatDate(data.collectedOn)),
    data && data.reason ? studyResultWords.revision(data.revision) : '',
    files ? `${formatCount(files, 'file')} kept` : '',
  ]
    .filter(Boolean)
    .join(' · ')
}

/** The quiet line of a study that still waits for readings. */
export function collectMeta(study: Study): string {
  const [only, ...others] = study.tasks
  return [
    only && others.length === 0
      ? collectWords.gaugeFor(
          `${study.gauge.name} ${study.gauge.code}`,
          inSentence(characteristicText(only.characteristic)),
        )
      : `${study.gauge.name} ${study.gauge.code}`,
    collectWords.on(study.standard.code),
    [collectWords.registered(formatDate(study.registeredAt), study.registeredBy.name), attemptOf(study)]
      .filter(Boolean)
      .join(', '),
    study.registeredBeforehand ? '' : collectWords.notBeforehand,
  ]
    .filter(Boolean)
    .join(' · ')
}

/** The verdict of the whole study in a list, from how many clauses have which; null where none was agreed. */
export function verdictOf(counts: Partial<Record<Verdict, number>> | null): {
  verdict: Verdict
  met: number
  total: number
} | null {
  if (!counts) return null
  const total = Object.values(counts).reduce((sum, count) => sum + count, 0)
  if (total === 0) return null
  const order = ['falls-short', 'not-shown', 'meets-with-conditions'] as const
  return {
    verdict: order.find((verdict) => counts[verdict]) ?? 'meets',
    met: (counts.meets ?? 0) + (counts['meets-with-conditions'] ?? 0),
    total,
  }
}
